import { describe, expect, test } from 'vitest';
import { demoWorkbook } from '../../app/demo/demoWorkbook';
import { emptyWorkbook, restoreWorkbook, serialiseWorkbook, type Workbook } from '../../src';
import { type Migration, migrate } from '../../src/workbook/migrations';
import { LONGEST_DOCUMENT } from '../../src/workbook/restoreWorkbook';

function messageOf(text: string, migrations?: Record<number, Migration>): string {
  const result = restoreWorkbook(text, migrations);
  return result.ok ? 'read' : result.message;
}

/** The message for the demo with one thing changed. */
function messageWith(change: (document: ReturnType<typeof JSON.parse>) => void): string {
  const document = JSON.parse(serialiseWorkbook(demoWorkbook('demo-1')));
  change(document);
  return messageOf(JSON.stringify(document));
}

describe('what is no workbook', () => {
  test.each([
    ['', 'This file is empty. Pick a workbook exported from Basewright.'],
    ['  \n', 'This file is empty. Pick a workbook exported from Basewright.'],
    ['not json', 'This file is not JSON, or was cut short. Pick a workbook exported from Basewright.'],
    [
      '{"format": "basewright-workbook", "version": 1, "id": "a"',
      'This file is not JSON, or was cut short. Pick a workbook exported from Basewright.',
    ],
    ['[]', 'This file is not a Basewright workbook. Pick a workbook exported from Basewright.'],
    ['null', 'This file is not a Basewright workbook. Pick a workbook exported from Basewright.'],
    ['42', 'This file is not a Basewright workbook. Pick a workbook exported from Basewright.'],
    [
      '{"format": "something-else", "version": 1}',
      'This file is not a Basewright workbook. Pick a workbook exported from Basewright.',
    ],
    // JSON.parse makes "__proto__" a plain key; the format must stand in the document itself.
    [
      '{"__proto__": {"format": "basewright-workbook", "version": 1}}',
      'This file is not a Basewright workbook. Pick a workbook exported from Basewright.',
    ],
  ])('%j', (text, message) => {
    expect(messageOf(text)).toBe(message);
  });

  test('a file beyond all measure is not even parsed', () => {
    expect(messageOf(' '.repeat(LONGEST_DOCUMENT + 1))).toMatch(/^This file is too long for a workbook/);
  });

  test('nesting without end is refused', () => {
    const deep = '['.repeat(200_000) + ']'.repeat(200_000);
    expect(restoreWorkbook(deep).ok).toBe(false);
    expect(messageWith((document) => Object.assign(document, { name: JSON.parse('[[[[]]]]') }))).toMatch(
      /name must be a text; it is a list\./,
    );
  });

  test('a byte order mark in front does not matter', () => {
    expect(restoreWorkbook(`\uFEFF${serialiseWorkbook(emptyWorkbook('a', 'A'))}`).ok).toBe(true);
  });
});

describe('another version', () => {
  test('a newer one is left alone, and the message says what to do', () => {
    expect(messageWith((document) => Object.assign(document, { version: 7 }))).toBe(
      'This workbook was written by a newer Basewright (version 7; this one reads up to 1). ' +
        'Open it there, or bring this program up to date. The file is as it was.',
    );
  });

  test.each(['1', 1.5, null, -1, undefined])('version %j is no version', (version) => {
    expect(messageWith((document) => Object.assign(document, { version }))).toMatch(/version must be a whole number/);
  });

  test('an older one without a way up is refused', () => {
    expect(messageWith((document) => Object.assign(document, { version: 0 }))).toMatch(
      /has version 0, which is not known/,
    );
  });

  test('an older one with a way up is brought up, and that is noted', () => {
    const old = JSON.stringify({ ...emptyWorkbook('a', 'A'), version: 0, name: undefined, title: 'Old name' });
    const result = restoreWorkbook(old, { 0: ({ title, ...rest }) => ({ ...rest, name: title }) });
    expect(result).toEqual({
      ok: true,
      workbook: emptyWorkbook('a', 'Old name'),
      notes: ['Brought up from version 0 to 1.'],
    });
  });

  test('a step that breaks is no half workbook', () => {
    const old = JSON.stringify({ ...emptyWorkbook('a', 'A'), version: 0 });
    const breaking: Migration = () => {
      throw new TypeError('nothing there');
    };
    expect(messageOf(old, { 0: breaking })).toMatch(
      /^This workbook is damaged\. It could not be brought up to the present version\./,
    );
  });

  test('several steps are taken one after another, and the document given is not changed', () => {
    const step =
      (name: string): Migration =>
      (document) => ({ ...document, steps: [...(document.steps as string[]), name] });
    const document = { version: 3, steps: [] };
    expect(migrate(document, 3, 5, { 3: step('three'), 4: step('four') })).toEqual({
      version: 5,
      steps: ['three', 'four'],
    });
    expect(document).toEqual({ version: 3, steps: [] });
    expect(migrate(document, 2, 5, { 3: step('three') })).toBeUndefined();
  });
});

describe('a damaged field is named by its path', () => {
  const damage: [path: string, change: (document: Workbook) => unknown][] = [
    [
      'products[2].pricePerTonne must be a number; it is "1240".',
      ({ products }) => Object.assign(products[2] ?? {}, { pricePerTonne: '1240' }),
    ],
    [
      'products[0].pricePerTonne must be a number; it is null.',
      ({ products }) => Object.assign(products[0] ?? {}, { pricePerTonne: Number.NaN }),
    ],
    [
      'products[0].family must be one of "Group I", ',
      ({ products }) => Object.assign(products[0] ?? {}, { family: 'Group VI' }),
    ],
    [
      'products[0].figures must be a list; it is an object.',
      ({ products }) => Object.assign(products[0] ?? {}, { figures: {} }),
    ],
    [
      'products[0].figures[1].property must be a text that is not empty; it is missing.',
      ({ products }) => Object.assign(products[0]?.figures[1] ?? {}, { property: undefined }),
    ],
    [
      'products[0].lots[0].availableTonnes must be a number; it is true.',
      ({ products }) => Object.assign(products[0]?.lots[0] ?? {}, { availableTonnes: true }),
    ],
    [
      'orders[1].limits[0].min must be a number; it is "5.8".',
      ({ orders }) => Object.assign(orders[1]?.limits[0] ?? {}, { min: '5.8' }),
    ],
    [
      'orders[1].limits[0].below must be a number; it is false.',
      ({ orders }) => Object.assign(orders[1]?.limits[0] ?? {}, { below: false }),
    ],
    [
      'orders[3].shares[1].kind must be one of "share", ',
      ({ orders }) => Object.assign(orders[3]?.shares[1] ?? {}, { kind: 'sum' }),
    ],
    [
      'orders[3].shares[1].set.families[0] must be one of ',
      ({ orders }) => Object.assign(orders[3]?.shares[1] ?? {}, { set: { families: ['oil'] } }),
    ],
    [
      'orders[0].batchTonnes must be a number, or a range with min and max; it is "10".',
      ({ orders }) => Object.assign(orders[0] ?? {}, { batchTonnes: '10' }),
    ],
    [
      'orders[0].batchTonnes.max must be a number; it is missing.',
      ({ orders }) => Object.assign(orders[0] ?? {}, { batchTonnes: { min: 5 } }),
    ],
    [
      'orders[0].viscosityRule must be one of "wright", ',
      ({ orders }) => Object.assign(orders[0] ?? {}, { viscosityRule: 'guess' }),
    ],
    ['settings must be an object; it is missing.', (document) => Object.assign(document, { settings: undefined })],
    ['invented must be true or false; it is "yes".', (document) => Object.assign(document, { invented: 'yes' })],
    [
      'Two products have the id "sn-150"; each needs its own.',
      ({ products }) => Object.assign(products[1] ?? {}, { id: 'sn-150' }),
    ],
    [
      'Two lots have the id "sn-150-lot"; each needs its own.',
      ({ products }) => Object.assign(products[1]?.lots[0] ?? {}, { id: 'sn-150-lot' }),
    ],
    [
      'Two orders have the id "driveline-6"; each needs its own.',
      ({ orders }) => Object.assign(orders[2] ?? {}, { id: 'driveline-6' }),
    ],
    [
      'ownProperties[0].id "noack" is a built-in property.',
      ({ ownProperties }) =>
        ownProperties.push({ id: 'noack', label: 'N', unit: '%', rule: 'linear by mass', digits: 1 }),
    ],
    [
      'ownProperties[0].digits must be a whole number from 0 to 10; it is 400.',
      ({ ownProperties }) =>
        ownProperties.push({ id: 'mine', label: 'N', unit: '%', rule: 'linear by mass', digits: 400 }),
    ],
  ];

  test.each(damage)('%s', (path, change) => {
    const message = messageWith((document) => void change(document));
    expect(message).toContain(`This workbook is damaged. ${path}`);
    expect(message).toMatch(/Correct the file, or take an earlier copy of it\.$/);
  });

  test('a number beyond all numbers is none', () => {
    const text = serialiseWorkbook(demoWorkbook('a')).replace('"pricePerTonne": 880', '"pricePerTonne": 1e999');
    expect(messageOf(text)).toContain('products[0].pricePerTonne must be a number; it is Infinity.');
  });

  test('a long text is quoted in part', () => {
    const message = messageWith((document) => Object.assign(document, { invented: 'x'.repeat(5000) }));
    expect(message.length).toBeLessThan(200);
  });
});

describe('what is not known', () => {
  test('is left out with a note, and the rest is read', () => {
    const document = { ...emptyWorkbook('a', 'A'), colour: 'red', settings: { currency: 'EUR', size: 3 } };
    expect(restoreWorkbook(JSON.stringify(document))).toEqual({
      ok: true,
      workbook: emptyWorkbook('a', 'A'),
      notes: ['colour is not known here and was left out.', 'settings.size is not known here and was left out.'],
    });
  });

  test('is summed up where there is much of it', () => {
    const extra = Object.fromEntries(Array.from({ length: 30 }, (_, at) => [`extra${at}`, at]));
    const result = restoreWorkbook(JSON.stringify({ ...emptyWorkbook('a', 'A'), ...extra }));
    expect(result.ok && result.notes).toHaveLength(21);
    expect(result.ok && result.notes.at(-1)).toBe('… and 10 more fields that are not known here.');
  });

  test('and would reach into JavaScript itself changes nothing there', () => {
    const text = serialiseWorkbook(demoWorkbook('a')).replace(
      '"invented"',
      '"__proto__": {"polluted": 1}, "constructor": {"prototype": {"polluted": 1}}, "invented"',
    );
    const result = restoreWorkbook(text);
    expect(result.ok && result.notes).toEqual([
      '__proto__ is not known here and was left out.',
      'constructor is not known here and was left out.',
    ]);
    expect(result.ok && Object.getPrototypeOf(result.workbook)).toBe(Object.prototype);
    expect({}).not.toHaveProperty('polluted');
  });

  test('as a cell that was never a cell is left out too', () => {
    const workbook = {
      ...emptyWorkbook('a', 'A'),
      products: [{ id: 'p', name: 'P', family: 'PAO', figures: [], lots: [] }],
    };
    const text = JSON.stringify(workbook).replace('"lots":[]', '"lots":[],"unread":{"__proto__":"x","kv@40":"4o"}');
    const result = restoreWorkbook(text);
    expect(result.ok && result.workbook.products[0]?.unread).toEqual({ 'kv@40': '4o' });
    expect(result.ok && result.notes).toEqual(['products[0].unread["__proto__"] is not allowed and was left out.']);
  });
});

test('the file begins with what it is', () => {
  const lines = serialiseWorkbook(demoWorkbook('demo-1')).split('\n');
  expect(lines.slice(0, 5)).toEqual([
    '{',
    '  "format": "basewright-workbook",',
    '  "version": 1,',
    '  "id": "demo-1",',
    '  "name": "Kalverhook Blending (invented plant)",',
  ]);
});
