import { expect, test } from 'vitest';
import type { StoredVersion } from '../../../app/storage/database';
import { MOST_VERSIONS, placeInHistory } from '../../../app/storage/versions';

const START = Date.parse('2026-03-01T08:00:00Z');

function version(seconds: number, text = `text ${seconds}`): StoredVersion {
  return { key: seconds, workbookId: 'w', text, savedAt: new Date(START + seconds * 1000).toISOString() };
}

/** The history after saves at these seconds. */
function after(seconds: number[]): number[] {
  let kept: StoredVersion[] = [];
  for (const second of seconds) {
    const { add, remove } = placeInHistory(kept, version(second));
    kept = kept.filter(({ key }) => !remove.includes(key ?? Number.NaN));
    if (add) kept.push(version(second));
  }
  return kept.map(({ key }) => key ?? Number.NaN);
}

test('states a minute apart are all kept', () => {
  expect(after([0, 60, 120])).toEqual([0, 60, 120]);
});

test('a spell of typing leaves its beginning and its end', () => {
  expect(after([0, 1, 2, 3, 30, 59])).toEqual([0, 59]);
  expect(after([0, 1, 2, 50, 61, 62])).toEqual([0, 50, 62]);
});

test('a long spell leaves one state a minute or so, not one', () => {
  const kept = after(Array.from({ length: 300 }, (_, at) => at));
  expect(kept.length).toBeGreaterThanOrEqual(5);
  expect(kept.at(-1)).toBe(299);
});

test('the same text is not kept twice', () => {
  expect(placeInHistory([version(0, 'same')], version(100, 'same'))).toEqual({ add: false, remove: [] });
});

test('the oldest go where there are too many', () => {
  const kept = after(Array.from({ length: MOST_VERSIONS + 5 }, (_, at) => at * 100));
  expect(kept).toHaveLength(MOST_VERSIONS);
  expect(kept[0]).toBe(500);
});
