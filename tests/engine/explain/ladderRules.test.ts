import { describe, expect, test } from 'vitest';
import { type Demand, demandInWords, type Order, type ShareRule, type Stock } from '../../../src/index';
import { demo, without } from '../optimum/consistency';
import { demoStock, plainOrder } from '../order/plainOrder';
import { expectIrreducible, ladderOf } from './ladderChecks';

const KV_AT_LEAST_10: Demand = { kind: 'limit', limit: 0, end: 'min' };

/** A thin and a thick oil in a mix that needs a good deal of the thick one. */
function thick(changes: Partial<Stock>, more: Partial<Order> = {}): Order {
  return {
    stocks: [demoStock('PAO 4'), { ...demoStock('PAO 40'), ...changes }],
    limits: [{ property: 'kv', celsius: 100, min: 10 }],
    ...more,
  };
}

function ruled(...shares: ShareRule[]): Order {
  return {
    stocks: [demoStock('PAO 4'), demoStock('PAO 40'), demoStock('polyol ester')],
    limits: thick({}).limits,
    shares,
  };
}

const PAO_40 = { stockIds: ['PAO 40'] };
const share = (place: number): Demand => ({ kind: 'share', share: place });

describe('a rule that stands in the way is the conflict, together with the limit', () => {
  test.each<[string, Order, Demand[]]>([
    [
      'PAO 40: 1 t on hand for a batch of 20 t',
      thick({ availableTonnes: 1 }, { batchTonnes: 20 }),
      [KV_AT_LEAST_10, { kind: 'amount on hand', stockId: 'PAO 40' }],
    ],
    [
      'PAO 40: 1 t on hand for a batch of 20 t',
      thick({ availableTonnes: 1 }, { batchTonnes: { min: 20, max: 30 } }),
      [KV_AT_LEAST_10, { kind: 'amount on hand', stockId: 'PAO 40' }],
    ],
    [
      'PAO 40 at most 5 % of the mix (its greatest dose)',
      thick({ greatestDose: 0.05 }),
      [KV_AT_LEAST_10, { kind: 'greatest dose', stockId: 'PAO 40' }],
    ],
    [
      'PAO 40 at most 5 % of the mix',
      thick({}, { doses: [{ stockId: 'PAO 40', max: 0.05 }] }),
      [KV_AT_LEAST_10, { kind: 'dose', dose: 0 }],
    ],
    [
      'PAO 40 absent or at least 99 % of the mix',
      thick({ leastDoseIfUsed: 0.99 }, { limits: [{ property: 'kv', celsius: 100, min: 10, max: 20 }] }),
      [KV_AT_LEAST_10, { kind: 'limit', limit: 0, end: 'max' }, { kind: 'least dose', stockId: 'PAO 40' }],
    ],
    [
      'only 1 stock in the mix',
      thick({}, { mostStocks: 1, limits: [{ property: 'kv', celsius: 100, min: 10, max: 20 }] }),
      [KV_AT_LEAST_10, { kind: 'limit', limit: 0, end: 'max' }, { kind: 'most stocks' }],
    ],
    [
      'PAO 40 at most 5 % of the mix',
      ruled({ kind: 'share', set: { families: ['ester'] }, max: 0.9 }, { kind: 'share', set: PAO_40, max: 0.05 }),
      [KV_AT_LEAST_10, share(1)],
    ],
    [
      'PAO 40 to PAO 4 in a ratio of at most 0.05',
      ruled({ kind: 'ratio', set: PAO_40, to: { stockIds: ['PAO 4'] }, max: 0.05 }),
      [KV_AT_LEAST_10, share(0)],
    ],
    ['at most 0 of PAO 40', ruled({ kind: 'count', set: PAO_40, max: 0 }), [KV_AT_LEAST_10, share(0)]],
    [
      'PAO 40 not together with PAO 4, polyol ester',
      {
        ...ruled({ kind: 'excludes', stockId: 'PAO 40', set: { stockIds: ['PAO 4', 'polyol ester'] } }),
        limits: [{ property: 'kv', celsius: 100, min: 10, max: 20 }],
      },
      [KV_AT_LEAST_10, { kind: 'limit', limit: 0, end: 'max' }, share(0)],
    ],
  ])('%s', async (words, order, conflict) => {
    const ladder = await ladderOf(order);
    expect(ladder.conflict).toEqual(conflict);
    expect(demandInWords(conflict[conflict.length - 1], order)).toBe(words);
    await expectIrreducible(order, ladder);
  });

  test('drums that do not fit', async () => {
    // Whole drums of 8 t make 0, 40 or 80 % of 20 t; 10 to 25 % is asked for.
    const order: Order = {
      ...thick({ lotTonnes: 8 }, { batchTonnes: 20 }),
      limits: [],
      doses: [{ stockId: 'PAO 40', min: 0.1, max: 0.25 }],
    };
    const ladder = await ladderOf(order);
    expect(ladder.conflict).toEqual([
      { kind: 'dose', dose: 0 },
      { kind: 'whole drums', stockId: 'PAO 40' },
    ]);
    expect(ladder.conflict.map((demand) => demandInWords(demand, order))).toEqual([
      'PAO 40 10 % to 25 % of the mix',
      'PAO 40 in whole drums of 8 t',
    ]);
    expect(ladder).toMatchObject({ conflictProven: true, reach: [], relaxations: [] });
  });

  test('a flag that no stock carries: the one reason there is', async () => {
    const order: Order = { ...plainOrder(), shares: [{ kind: 'flag', flag: 'food contact' }] };
    const ladder = await ladderOf(order);
    expect(ladder.conflict).toEqual([share(0)]);
    expect(demandInWords(share(0), order)).toBe('every stock carries "food contact"');
    expect(ladder.reach.every(({ reachable, proven }) => reachable === undefined && proven)).toBe(true);
    expect(ladder.relaxations).toEqual([]);
  });

  test('doses of more than the whole', async () => {
    const order: Order = {
      ...plainOrder(),
      doses: [
        { stockId: 'PAO 40', max: 0.9 },
        { stockId: 'PAO 4', exactly: 0.6 },
        { stockId: 'PAO 6', exactly: 0.5 },
      ],
    };
    const ladder = await ladderOf(order);
    expect(ladder.conflict).toEqual([
      { kind: 'dose', dose: 1 },
      { kind: 'dose', dose: 2 },
    ]);
    await expectIrreducible(order, ladder);
  });

  test('greatest doses of less than the whole', async () => {
    const order = thick({ greatestDose: 0.4 }, { limits: [] });
    order.stocks[0].greatestDose = 0.5;
    const ladder = await ladderOf(order);
    expect(ladder.conflict).toEqual([
      { kind: 'greatest dose', stockId: 'PAO 4' },
      { kind: 'greatest dose', stockId: 'PAO 40' },
    ]);
    await expectIrreducible(order, ladder);
  });
});

test('a limit dropped lets in no stock whose figure of it is unknown', async () => {
  // Without the volatility limit the ester, with its volatility unknown, would make the order possible.
  const order = thick(
    {},
    {
      limits: [
        { property: 'noack', max: 50 },
        { property: 'pourPoint', max: -48 },
      ],
    },
  );
  order.stocks = [demoStock('SN 150'), without(demoStock('polyol ester'), 'noack')];
  const ladder = await ladderOf(order);
  expect(ladder.conflict).toEqual([{ kind: 'limit', limit: 1, end: 'max' }]);
  expect(ladder.reach).toMatchObject([
    { limit: 1, reachable: -12, proven: true },
    { limit: 0, proven: true },
  ]);
});

describe('where no demand is at fault it is said why', () => {
  test('the order is possible', async () => {
    const ladder = await ladderOf(plainOrder());
    expect(ladder).toMatchObject({ conflict: [], reach: [], relaxations: [], noConflict: { why: 'possible' } });
  });

  test('the order is no question', async () => {
    const order = plainOrder();
    order.limits = [{ property: 'kv', celsius: 100, min: 7, max: 6 }];
    const { noConflict } = await ladderOf(order);
    expect(noConflict?.why).toBe('refused');
    expect(noConflict?.messages[0]).toMatch(/the least \(7\) is above the most \(6\)/);
  });

  test('no stock is usable for want of figures', async () => {
    const order = plainOrder();
    order.stocks = order.stocks.slice(0, 2).map((stock) => without(stock, 'kv'));
    const { conflict, noConflict } = await ladderOf(order);
    expect(conflict).toEqual([]);
    expect(noConflict?.why).toBe('no mix at all');
    expect(noConflict?.messages[0]).toBe('no stock can be used: every one was left out');
    expect(noConflict?.messages).toHaveLength(3);
  });

  test('stocks that all take the value of the rest', async () => {
    const order = plainOrder();
    order.stocks = order.stocks.slice(0, 2).map((stock) => ({
      ...without(stock, 'noack'),
      figures: [...without(stock, 'noack').figures, { property: 'noack', origin: 'as the rest' as const }],
    }));
    order.limits = [{ property: 'noack', max: 10 }];
    const { noConflict } = await ladderOf(order);
    expect(noConflict?.why).toBe('no mix at all');
    expect(noConflict?.messages.length).toBeGreaterThan(0);
  });
});

test('weights that are no weights are refused', async () => {
  for (const weight of [0, -1, Number.NaN]) {
    await expect(ladderOf(demo('impossible at 10'), { weights: { 1: weight } })).rejects.toThrow(
      /weight of limit 2 must be above 0/,
    );
  }
});

test.each<[string, Demand, Partial<Order>]>([
  ['Viscosity index at least 120', { kind: 'limit', limit: 0, end: 'min' }, { limits: [{ property: 'vi', min: 120 }] }],
  [
    'Flash point, open cup at least 200 °C, inside by 5 °C',
    { kind: 'limit', limit: 0, end: 'min' },
    { limits: [{ property: 'flashPoint', min: 200, insideBy: 5 }] },
  ],
  [
    'Sulphur below 10 mg/kg',
    { kind: 'limit', limit: 0, end: 'max' },
    { limits: [{ property: 'sulphur', max: 50, below: 10 }] },
  ],
  [
    'Sulphur below 10 mg/kg',
    { kind: 'limit', limit: 0, end: 'max' },
    { limits: [{ property: 'sulphur', max: 10, below: true }] },
  ],
  [
    'Sulphur at most 10 mg/kg',
    { kind: 'limit', limit: 0, end: 'max' },
    { limits: [{ property: 'sulphur', max: 10, below: 50 }] },
  ],
  ['PAO 4 in the mix', { kind: 'dose', dose: 0 }, { doses: [{ stockId: 'PAO 4', required: true }] }],
  [
    'PAO 4 at least 5 % of the mix, or none',
    { kind: 'dose', dose: 0 },
    { doses: [{ stockId: 'PAO 4', min: 0.05, required: false }] },
  ],
  ['at most 3 stocks in the mix', { kind: 'most stocks' }, { mostStocks: 3 }],
])('in words: %s', (words, demand, fields) => {
  expect(demandInWords(demand, { ...thick({}), ...fields })).toBe(words);
});
