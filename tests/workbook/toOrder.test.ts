import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  emptyOrder,
  emptyWorkbook,
  type Figure,
  type Lot,
  type Product,
  restoreWorkbook,
  type ShareRule,
  serialiseWorkbook,
  solveBlend,
  toOrder,
  type Workbook,
  type WorkbookOrder,
} from '../../src';
import { anyWorkbook } from './anyWorkbook';

const kv = (celsius: number, value: number): Figure => ({ property: 'kv', celsius, value, origin: 'typical' });

function product(id: string, fields: Partial<Product> = {}): Product {
  return {
    id,
    name: id.toUpperCase(),
    family: 'Group II',
    pricePerTonne: 1000,
    figures: [kv(40, 30), kv(100, 5)],
    lots: [],
    ...fields,
  };
}

const lot = (id: string, fields: Partial<Lot> = {}): Lot => ({ id, name: `L-${id}`, figures: [], ...fields });

function convert(products: Product[], fields: Partial<WorkbookOrder> = {}) {
  const order = { ...emptyOrder('o', 'Order'), ...fields };
  const workbook: Workbook = { ...emptyWorkbook('w', 'W'), products, orders: [order] };
  return toOrder(workbook, order);
}

describe('on products', () => {
  test('a product is one stock with its typical figures', () => {
    const full = product('a', {
      blendWeight: 1.1,
      leastDoseIfUsed: 0.01,
      greatestDose: 0.5,
      lotTonnes: 0.2,
      flags: ['food contact'],
    });
    expect(convert([full]).order.stocks).toEqual([
      {
        id: 'a',
        name: 'A',
        family: 'Group II',
        pricePerTonne: 1000,
        figures: full.figures,
        blendWeight: 1.1,
        leastDoseIfUsed: 0.01,
        greatestDose: 0.5,
        lotTonnes: 0.2,
        flags: ['food contact'],
      },
    ]);
  });

  test('on hand is the sum of the lots, where all are known', () => {
    const known = product('a', { lots: [lot('1', { availableTonnes: 3 }), lot('2', { availableTonnes: 4 })] });
    const unknown = product('b', { lots: [lot('3', { availableTonnes: 3 }), lot('4')] });
    const { stocks } = convert([known, unknown, product('c')]).order;
    expect(stocks.map(({ availableTonnes }) => availableTonnes)).toEqual([7, undefined, undefined]);
  });

  test('the settings of the order go along, and unset ones stay unset', () => {
    expect(
      convert([], { batchTonnes: { min: 5, max: 9 }, mostStocks: 4, depressant: true, greatestDoseAsTheRest: 0.1 })
        .order,
    ).toEqual({
      stocks: [],
      limits: [],
      doses: [],
      shares: [],
      depressant: true,
      viscosityRule: 'wright',
      costBasis: 'tonne',
      batchTonnes: { min: 5, max: 9 },
      mostStocks: 4,
      greatestDoseAsTheRest: 0.1,
    });
    expect(convert([]).order).not.toHaveProperty('batchTonnes');
  });

  test('excluded products are left out without a word: that was the wish', () => {
    const { order, omitted } = convert([product('a'), product('b')], { excludedProductIds: ['b'] });
    expect(order.stocks.map(({ id }) => id)).toEqual(['a']);
    expect(omitted).toEqual([]);
  });
});

describe('what cannot be used is named', () => {
  test('no price', () => {
    const { order, omitted } = convert([product('a', { pricePerTonne: undefined })]);
    expect(order.stocks).toEqual([]);
    expect(omitted).toEqual([{ productId: 'a', name: 'A', message: 'A has no price: give one or exclude it.' }]);
  });

  test('a price of zero, or below (disposal), is a price', () => {
    expect(convert([product('a', { pricePerTonne: 0 }), product('b', { pricePerTonne: -5 })]).omitted).toEqual([]);
  });

  test('a price that is not a number: even where an old one stands behind it', () => {
    const { order, omitted } = convert([product('a', { unread: { pricePerTonne: '9oo' } })]);
    expect(order.stocks).toEqual([]);
    expect(omitted[0]?.message).toBe('A: the price “9oo” is not a number. Type it again or exclude the product.');
  });

  test.each([
    ['greatestDose', 'greatest dose', '1O'],
    ['leastDoseIfUsed', 'least dose', '2 or 3'],
    ['availableTonnes', 'quantity on hand', '4 0'],
  ])(
    'an unread %s is not “no bound”: the product stays out, and the message says what was typed',
    (cell, name, typed) => {
      const odd = product('a', { unread: { [cell]: typed }, lots: [lot('1')] });
      for (const solveOn of ['products', 'lots'] as const) {
        const { order, omitted, unread } = convert([odd, product('b', { lots: [lot('2')] })], { solveOn });
        expect(order.stocks).toHaveLength(1);
        expect(omitted).toEqual([
          {
            productId: 'a',
            name: 'A',
            message: `A: the ${name} “${typed}” is not a number. Type it again or exclude the product.`,
          },
        ]);
        expect(unread).toEqual([]);
      }
    },
  );

  test.each<[Partial<Product>, string]>([
    [{ leastDoseIfUsed: 1.5 }, 'A: the least dose is 150 %, and must be 0 to 100 %.'],
    [{ greatestDose: -0.07 }, 'A: the greatest dose is -7 %, and must be 0 to 100 %.'],
    [{ lots: [lot('1', { availableTonnes: -2 })] }, 'A: the quantity on hand is -2 t, and must not be below zero.'],
  ])('%j leaves that product out by name; the order is solved without it', async (fields, message) => {
    const { order, omitted } = convert([product('a', fields), product('b')]);
    expect(omitted).toEqual([{ productId: 'a', name: 'A', message: `${message} Correct it or exclude the product.` }]);
    expect((await solveBlend(order)).stopped).toBe('finished');
  });

  test('a cell that is not a number: its figure is unknown, and the message says what was typed', () => {
    const { order, unread } = convert([product('a', { unread: { 'kv@40': '3o,4' } })]);
    expect(order.stocks[0]?.figures).toEqual([kv(100, 5)]);
    expect(unread).toEqual([
      {
        productId: 'a',
        cell: 'kv@40',
        message: 'A: “3o,4” is not a number, so the figure counts as unknown. Type it again.',
      },
    ]);
  });

  test('a required product does not vanish: the order is refused, and the message says why', async () => {
    const { order, omitted } = convert([product('a'), product('p', { pricePerTonne: undefined })], {
      doses: [{ stockId: 'p', exactly: 0.1 }],
    });
    expect(omitted[0]?.message).toBe(
      'P has no price: give one or exclude it. The order requires it, so nothing can be solved without it.',
    );
    const outcome = await solveBlend(order);
    expect(outcome.stopped).toBe('refused');
    expect(outcome.problems[0]?.path).toEqual(['doses', 0, 'stockId']);
  });

  test('a product that is required and excluded, or gone', () => {
    const doses = [
      { stockId: 'a', min: 0.1 },
      { stockId: 'gone', exactly: 0.1 },
    ];
    expect(convert([product('a')], { doses, excludedProductIds: ['a'] }).omitted.map(({ message }) => message)).toEqual(
      [
        'A is required and excluded: allow it here or remove its dose.',
        'The order requires a product that is not in the workbook (“gone”): remove the dose.',
      ],
    );
  });

  test('a dose that is no more than a cap goes with its product', async () => {
    const { order, omitted } = convert([product('a'), product('p')], {
      doses: [{ stockId: 'p', max: 0.1 }],
      excludedProductIds: ['p'],
    });
    expect(order.doses).toEqual([]);
    expect(omitted).toEqual([]);
    expect((await solveBlend(order)).stopped).toBe('finished');
  });
});

describe('rules on products that are not there', () => {
  const without = (shares: WorkbookOrder['shares']) =>
    convert([product('a'), product('b'), product('p')], { shares, excludedProductIds: ['p'] }).order.shares;

  test('a set keeps those that are', () => {
    expect(without([{ kind: 'share', set: { stockIds: ['a', 'p'] }, max: 0.5 }])).toEqual([
      { kind: 'share', set: { stockIds: ['a'] }, max: 0.5 },
    ]);
  });

  test('a rule that only caps what is not there is kept by any mix', () => {
    expect(
      without([
        { kind: 'share', set: { stockIds: ['p'] }, max: 0.5 },
        { kind: 'count', set: { stockIds: ['p'] }, max: 1 },
      ]),
    ).toEqual([]);
    expect(without([{ kind: 'excludes', stockId: 'a', set: { stockIds: ['p'] } }])).toEqual([]);
    expect(without([{ kind: 'excludes', stockId: 'p', set: { stockIds: ['a'] } }])).toEqual([]);
  });

  test('a rule that needs what is not there stays, for the engine to refuse', async () => {
    const shares: WorkbookOrder['shares'] = [{ kind: 'share', set: { stockIds: ['p'] }, min: 0.1 }];
    expect(without(shares)).toEqual(shares);
    const { order } = convert([product('a'), product('p')], { shares, excludedProductIds: ['p'] });
    expect((await solveBlend(order)).stopped).toBe('refused');
  });

  test('families and flags speak for themselves', () => {
    const shares: WorkbookOrder['shares'] = [
      { kind: 'share', set: { families: ['ester'] }, min: 0.1 },
      { kind: 'flag', flag: 'food contact' },
    ];
    expect(without(shares)).toEqual(shares);
  });
});

describe('on lots', () => {
  const twoLots = product('a', {
    lots: [
      lot('1', { availableTonnes: 3, figures: [{ ...kv(100, 5.2), origin: 'measured' }] }),
      lot('2', { pricePerTonne: 900 }),
    ],
  });
  const onLots = (products: Product[], fields: Partial<WorkbookOrder> = {}) =>
    convert(products, { solveOn: 'lots', ...fields });

  test('a lot is a stock; its figures and price take the place of the product’s one by one', () => {
    expect(onLots([twoLots]).order.stocks).toEqual([
      {
        id: '1',
        name: 'A · L-1',
        family: 'Group II',
        pricePerTonne: 1000,
        availableTonnes: 3,
        figures: [{ ...kv(100, 5.2), origin: 'measured' }, kv(40, 30)],
      },
      { id: '2', name: 'A · L-2', family: 'Group II', pricePerTonne: 900, figures: [kv(40, 30), kv(100, 5)] },
    ]);
  });

  test('a figure of the certificate counts where the product’s cell cannot be read', () => {
    const odd = product('a', { unread: { 'kv@100': 'five' }, lots: [lot('1', { figures: [kv(100, 5.2)] })] });
    expect(onLots([odd]).order.stocks[0]?.figures).toEqual([kv(100, 5.2), kv(40, 30)]);
  });

  test('a product without lots is named', () => {
    expect(onLots([product('a')]).omitted).toEqual([
      { productId: 'a', name: 'A', message: 'A has no lots: add one, exclude it, or solve on products.' },
    ]);
  });

  test('a lot without any price is named, its neighbours are used', () => {
    const odd = product('a', { pricePerTonne: undefined, lots: [lot('1'), lot('2', { pricePerTonne: 900 })] });
    const { order, omitted } = onLots([odd]);
    expect(order.stocks.map(({ id }) => id)).toEqual(['2']);
    expect(omitted[0]?.message).toBe('A · L-1 has no price: give one or exclude it.');
  });

  test('a dose on a product with one lot is a dose on the lot', () => {
    const one = product('p', { lots: [lot('7')] });
    expect(onLots([one], { doses: [{ stockId: 'p', exactly: 0.02 }] }).order.doses).toEqual([
      { stockId: '7', exactly: 0.02 },
    ]);
  });

  test('a dose on a product with several lots holds for them together', () => {
    const { order } = onLots([twoLots], { doses: [{ stockId: 'a', min: 0.02, max: 0.1, of: 'base oil' }] });
    expect(order.doses).toEqual([]);
    expect(order.shares).toEqual([
      { kind: 'share', set: { stockIds: ['1', '2'] }, min: 0.02, max: 0.1, of: 'base oil' },
    ]);
  });

  test('“absent, or at least so much” is asked of each lot, and that is noted', () => {
    const { order, notes } = onLots([twoLots], { doses: [{ stockId: 'a', min: 0.02, max: 0.1, required: false }] });
    expect(order.shares).toEqual([{ kind: 'share', set: { stockIds: ['1', '2'] }, max: 0.1 }]);
    expect(order.stocks.map(({ leastDoseIfUsed }) => leastDoseIfUsed)).toEqual([0.02, 0.02]);
    expect(notes).toEqual(['A: each lot in use must reach the least dose on its own.']);
  });

  test('rules on products become rules on their lots', () => {
    const shares: WorkbookOrder['shares'] = [
      { kind: 'share', set: { stockIds: ['a'], families: ['ester'] }, max: 0.3 },
      { kind: 'excludes', stockId: 'a', set: { families: ['PAO'] } },
    ];
    expect(onLots([twoLots], { shares }).order.shares).toEqual([
      { kind: 'share', set: { stockIds: ['1', '2'], families: ['ester'] }, max: 0.3 },
      { kind: 'excludes', stockId: '1', set: { families: ['PAO'] } },
      { kind: 'excludes', stockId: '2', set: { families: ['PAO'] } },
    ]);
  });

  test('a greatest dose holds for the lots together', () => {
    expect(onLots([{ ...twoLots, greatestDose: 0.4 }]).order.shares).toEqual([
      { kind: 'share', set: { stockIds: ['1', '2'] }, max: 0.4 },
    ]);
  });

  test('that the number of stocks counts lots is noted', () => {
    expect(onLots([twoLots], { mostStocks: 3 }).notes).toEqual([
      'The greatest number of stocks counts lots: two lots of a product count as two.',
    ]);
  });
});

/** Freezes a value and all in it, so that a change throws. */
function frozen<T>(value: T): T {
  if (typeof value === 'object' && value !== null)
    for (const entry of Object.values(Object.freeze(value))) frozen(entry);
  return value;
}

test('changes neither the workbook nor the order, whatever they hold, and names every product once used or said to be left out', () => {
  fc.assert(
    fc.property(anyWorkbook, (workbook) => {
      frozen(workbook);
      for (const order of workbook.orders) {
        const result = toOrder(workbook, order);
        const accounted = new Set([
          ...result.order.stocks.map(({ id }) => id),
          ...result.omitted.map(({ productId }) => productId),
          ...order.excludedProductIds,
        ]);
        const told = result.notes.join(' ');
        for (const { id, name, family, lots } of workbook.products) {
          const aside = (family === 'package' || family === 'depressant') && told.includes(name);
          expect(aside || accounted.has(id) || lots.some((entry) => accounted.has(entry.id))).toBe(true);
        }
      }
    }),
  );
});

describe('packages and depressants', () => {
  const products = [product('a'), product('p', { family: 'package' }), product('d', { family: 'depressant' })];

  test('are used only where the order doses them or names them in a rule, and a note names those left aside', () => {
    const undosed = convert(products, {});
    expect(undosed.order.stocks.map(({ id }) => id)).toEqual(['a']);
    expect(undosed.notes).toEqual([expect.stringContaining('not used here: ')]);
    const dosed = convert(products, { doses: [{ stockId: 'p', exactly: 0.01 }] });
    expect(dosed.order.stocks.map(({ id }) => id)).toEqual(['a', 'p']);
    const named = convert(products, { shares: [{ kind: 'share', set: { families: ['depressant'] }, max: 0.01 }] });
    expect(named.order.stocks.map(({ id }) => id)).toEqual(['a', 'd']);
  });
});

describe('rules that are not finished', () => {
  const whole: ShareRule = { kind: 'share', set: { stockIds: ['a'] }, max: 0.5 };
  const unfinished: ShareRule[] = [
    { kind: 'share', set: {}, max: 0.5 },
    { kind: 'share', set: { stockIds: ['a'] } },
    { kind: 'ratio', set: { stockIds: ['a'] }, to: { stockIds: [] }, max: 1 },
    { kind: 'count', set: { families: [] }, max: 1 },
    { kind: 'excludes', stockId: '', set: { stockIds: ['a'] } },
    { kind: 'flag', flag: '' },
  ];

  test('stay out of the engine order, and a note says so', () => {
    const { order, notes } = convert([product('a')], { shares: [...unfinished, whole] });
    expect(order.shares).toEqual([whole]);
    expect(notes).toEqual(['6 rules of the order are not finished: they ask for nothing yet.']);
    expect(convert([product('a')], { shares: [whole] }).notes).toEqual([]);
  });

  test('are kept in the file and read back', () => {
    const order = { ...emptyOrder('o', 'Order'), shares: unfinished };
    const workbook: Workbook = { ...emptyWorkbook('w', 'W'), orders: [order] };
    expect(restoreWorkbook(serialiseWorkbook(workbook))).toMatchObject({ ok: true, workbook, notes: [] });
  });
});
