import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { demoWorkbook } from '../../app/demo/demoWorkbook';
import { type Restored, restoreWorkbook, serialiseWorkbook, type Workbook } from '../../src';
import { anyWorkbook } from './anyWorkbook';

function restored(text: string): Extract<Restored, { ok: true }> {
  const result = restoreWorkbook(text);
  if (!result.ok) throw new Error(result.message);
  return result;
}

describe('a workbook written and read back', () => {
  test('is the same workbook, with nothing to note', () => {
    fc.assert(
      fc.property(anyWorkbook, (workbook) => {
        expect(restored(serialiseWorkbook(workbook))).toEqual({ ok: true, workbook, notes: [] });
      }),
      { numRuns: 300 },
    );
  });

  test('gives the same text again', () => {
    fc.assert(
      fc.property(anyWorkbook, (workbook) => {
        const text = serialiseWorkbook(workbook);
        expect(serialiseWorkbook(restored(text).workbook)).toBe(text);
      }),
    );
  });

  test('is the demo, where it was the demo', () => {
    expect(restored(serialiseWorkbook(demoWorkbook('demo-1'))).workbook).toEqual(demoWorkbook('demo-1'));
  });

  test('does not depend on the order in which its fields were set', () => {
    const workbook = demoWorkbook('demo-1');
    const turned = Object.fromEntries(Object.entries(workbook).reverse());
    expect(serialiseWorkbook(restored(JSON.stringify(turned)).workbook)).toBe(serialiseWorkbook(workbook));
  });
});

/** Every place in a document, as the keys that lead there. */
function placesIn(value: unknown, path: (string | number)[] = []): (string | number)[][] {
  if (typeof value !== 'object' || value === null) return [path];
  const inner = Object.entries(value).flatMap(([key, entry]) => placesIn(entry, [...path, key]));
  return [path, ...inner];
}

/** Puts something else in one place of the document. */
function damaged(document: unknown, path: readonly (string | number)[], change: unknown): unknown {
  const [key, ...rest] = path;
  if (key === undefined) return change;
  if (Array.isArray(document))
    return document.map((entry, at) => (String(at) === String(key) ? damaged(entry, rest, change) : entry));
  const entries = Object.entries(document as object);
  return Object.fromEntries(
    entries.map(([name, entry]) => [name, name === key ? damaged(entry, rest, change) : entry]),
  );
}

const JUNK = fc.oneof(
  fc.constantFrom(null, 'text', '', Number.MAX_VALUE, -1, true, [], {}, [null], { length: 3 }),
  fc.jsonValue({ maxDepth: 3 }),
);

const REQUIRED: (keyof Workbook)[] = [
  'format',
  'version',
  'id',
  'name',
  'invented',
  'products',
  'orders',
  'ownProperties',
  'settings',
];

/** What is accepted must be whole: it is written and read back without a change, and turned into engine orders. */
function expectWhole(result: Restored): void {
  if (!result.ok) {
    expect(result.message.length).toBeGreaterThan(20);
    return;
  }
  expect(Object.keys(result.workbook)).toEqual(REQUIRED);
  expect(restored(serialiseWorkbook(result.workbook)).workbook).toEqual(result.workbook);
}

describe('a damaged workbook', () => {
  const document: unknown = JSON.parse(serialiseWorkbook(demoWorkbook('demo-1')));
  const places = placesIn(document);

  test('with junk in any place is refused with a message, or read whole', () => {
    fc.assert(
      fc.property(fc.constantFrom(...places), JUNK, (path, junk) => {
        expectWhole(restoreWorkbook(JSON.stringify(damaged(document, path, junk))));
      }),
      { numRuns: 1000 },
    );
  });

  test('cut short anywhere is refused', () => {
    const text = serialiseWorkbook(demoWorkbook('demo-1')).trimEnd();
    fc.assert(
      fc.property(fc.nat(text.length - 1), (length) => {
        expect(restoreWorkbook(text.slice(0, length)).ok).toBe(false);
      }),
    );
  });

  test('with bytes changed anywhere never throws and is never half', () => {
    const text = serialiseWorkbook(demoWorkbook('demo-1'));
    fc.assert(
      fc.property(fc.nat(text.length - 1), fc.string({ maxLength: 3 }), (at, put) => {
        expectWhole(restoreWorkbook(text.slice(0, at) + put + text.slice(at + 1)));
      }),
      { numRuns: 500 },
    );
  });

  test('any text at all never throws', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string({ unit: 'binary' }), fc.json()), (text) => expectWhole(restoreWorkbook(text))),
    );
  });
});
