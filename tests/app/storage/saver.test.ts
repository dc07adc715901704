import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { createSaver, OTHER_TAB } from '../../../app/storage/saver';
import { unguarded, webLock } from '../../../app/storage/writerLock';
import { emptyWorkbook, type Workbook } from '../../../src';
import { fakeLocks } from './fakeLocks';

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

const named = (name: string): Workbook => emptyWorkbook('w', name);

function setUp(save: (workbook: Workbook) => Promise<void> = async () => {}, lock = unguarded()) {
  const saved: string[] = [];
  const reports: string[] = [];
  const saver = createSaver({
    storage: {
      async save(workbook) {
        await save(workbook);
        saved.push(workbook.name);
      },
    },
    lock,
    report: ({ state, message }) => void reports.push(message ? `${state}: ${message}` : state),
  });
  return { saver, saved, reports };
}

describe('saving', () => {
  test('waits for a rest of 400 ms and saves the last state only', async () => {
    const { saver, saved, reports } = setUp();
    for (const name of ['a', 'b', 'c']) {
      saver.schedule(named(name));
      await vi.advanceTimersByTimeAsync(399);
    }
    expect(saved).toEqual([]);
    expect(reports.at(-1)).toBe('saving');
    await vi.advanceTimersByTimeAsync(1);
    expect(saved).toEqual(['c']);
    expect(reports.at(-1)).toBe('saved');
  });

  test('is done at once where the page is left, and not a second time', async () => {
    const { saver, saved } = setUp();
    saver.schedule(named('a'));
    await saver.flush();
    await vi.advanceTimersByTimeAsync(1000);
    await saver.flush();
    expect(saved).toEqual(['a']);
  });

  test('of a page being left starts before anything is waited for', async () => {
    const lock = unguarded();
    let started = false;
    const { saver } = setUp(async () => {
      started = true;
    }, lock);
    await lock.hold('w');
    saver.schedule(named('a'));
    void saver.flush();
    expect(started).toBe(true);
  });

  test('is said to be done only when the last change is in', async () => {
    const releases: (() => void)[] = [];
    const { saver, saved, reports } = setUp(() => new Promise((resolve) => void releases.push(resolve)));
    saver.schedule(named('a'));
    await vi.advanceTimersByTimeAsync(400);
    saver.schedule(named('b'));
    releases[0]?.();
    await vi.advanceTimersByTimeAsync(0);
    expect([saved, reports.at(-1)]).toEqual([['a'], 'saving']);
    await vi.advanceTimersByTimeAsync(400);
    releases[1]?.();
    await vi.advanceTimersByTimeAsync(0);
    expect([saved, reports.at(-1)]).toEqual([['a', 'b'], 'saved']);
  });

  test('of a page being left does not wait for a save that is still under way', async () => {
    const lock = unguarded();
    await lock.hold('w');
    let started = 0;
    const { saver } = setUp(() => {
      started += 1;
      return new Promise(() => {});
    }, lock);
    saver.schedule(named('a'));
    await vi.advanceTimersByTimeAsync(400);
    saver.schedule(named('b'));
    void saver.flush();
    expect(started).toBe(2);
  });
});

describe('trouble', () => {
  test.each([
    [
      new DOMException('no room', 'QuotaExceededError'),
      "failed: The browser's storage is full, so the last change is not saved. Export the workbook to a file to keep it.",
    ],
    [
      new Error('The database connection is closing.'),
      'failed: The last change could not be saved (The database connection is closing). Export the workbook to a file to keep it.',
    ],
    ['odd', 'failed: The last change could not be saved. Export the workbook to a file to keep it.'],
  ])('%s is said, with the way out', async (error, report) => {
    const { saver, reports } = setUp(() => Promise.reject(error));
    saver.schedule(named('a'));
    await vi.advanceTimersByTimeAsync(400);
    expect(reports.at(-1)).toBe(report);
  });

  test('of one save does not stop the next', async () => {
    let full = true;
    const { saver, saved, reports } = setUp(async () => {
      if (full) throw new DOMException('no room', 'QuotaExceededError');
    });
    saver.schedule(named('a'));
    await vi.advanceTimersByTimeAsync(400);
    full = false;
    saver.schedule(named('b'));
    await vi.advanceTimersByTimeAsync(400);
    expect(saved).toEqual(['b']);
    expect(reports.at(-1)).toBe('saved');
  });

  test('of one save is tried again after 5 s, by itself, until it is in or the page ends', async () => {
    let full = true;
    let tries = 0;
    const { saver, saved, reports } = setUp(async () => {
      tries += 1;
      if (full) throw new DOMException('no room', 'QuotaExceededError');
    });
    saver.schedule(named('a'));
    await vi.advanceTimersByTimeAsync(400 + 5_000);
    expect([tries, saved]).toEqual([2, []]);
    expect(reports.at(-1)).toMatch(/^failed/);
    full = false;
    await vi.advanceTimersByTimeAsync(5_000);
    expect(saved).toEqual(['a']);
    expect(reports.at(-1)).toBe('saved');
    full = true;
    saver.schedule(named('b'));
    await saver.stop();
    await vi.advanceTimersByTimeAsync(60_000);
    expect(tries).toBe(4);
  });

  test('a workbook open in another tab is not written over, and that is said', async () => {
    const locks = fakeLocks();
    await webLock(locks).hold('w');
    const { saver, saved, reports } = setUp(async () => {}, webLock(locks));
    saver.schedule(named('a'));
    // The lock is asked for several times, a moment apart.
    vi.useRealTimers();
    await saver.flush();
    expect(saved).toEqual([]);
    expect(reports.at(-1)).toBe(`unavailable: ${OTHER_TAB}`);
    expect(OTHER_TAB).toMatch(/Export the workbook/);
  });

  test('nor later, when the other tab is closed: what it saved is newer', async () => {
    vi.useRealTimers();
    const locks = fakeLocks();
    const other = webLock(locks);
    await other.hold('w');
    const { saver, saved, reports } = setUp(async () => {}, webLock(locks));
    saver.schedule(named('a'));
    await saver.flush();
    other.release();
    saver.schedule(named('b'));
    await saver.flush();
    expect(saved).toEqual([]);
    expect(reports.at(-1)).toBe(`unavailable: ${OTHER_TAB}`);
    // Another workbook in this tab is saved as ever.
    saver.schedule(emptyWorkbook('x', 'c'));
    await saver.flush();
    expect(saved).toEqual(['c']);
  });
});
