import { describe, expect, test } from 'vitest';
import { type BlendOutcome, type Order, type Stock, solveBlend } from '../../../src/index';
import { BASE_OILS, DEMO_ORDERS } from '../../oracle/demoOrders';
import { DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { sliceSearch } from '../../oracle/sliceSearch';
import { worstViolation } from '../../oracle/violation';

function demo(name: string): Order {
  const found = DEMO_ORDERS.find((entry) => entry.name === name);
  if (!found) throw new Error(`No demo order "${name}".`);
  return structuredClone(found.order);
}

function without(stock: Stock, property: string): Stock {
  return { ...stock, figures: stock.figures.filter((figure) => figure.property !== property) };
}

/** What no outcome may ever do, whatever it says. */
function expectConsistent(outcome: BlendOutcome): void {
  const { recipe, costPerTonne, properties, proof, stopped, problems, checks } = outcome;
  expect(recipe === undefined).toBe(costPerTonne === undefined);
  expect(recipe === undefined).toBe(properties === undefined);
  if (!recipe) expect(checks).toEqual([]);
  expect(problems.length > 0).toBe(stopped === 'refused' || stopped === 'engine failed');
  if (proof.kind === 'least cost' || proof.kind === 'within gap') {
    expect(recipe).toBeDefined();
    expect(proof.lowerBound).toBeLessThanOrEqual(costPerTonne ?? Number.NaN);
    expect(proof.gap).toBeGreaterThanOrEqual(0);
  } else if (proof.kind !== 'none') expect(recipe).toBeUndefined();
  expect(JSON.parse(JSON.stringify(outcome))).toEqual(outcome);
}

/** A clock that jumps by an hour once it was read `calm` times. */
function jumpingClock(calm: number): () => number {
  let reads = 0;
  return () => (reads++ < calm ? reads : 3_600_000 + reads);
}

const HARD = { ...DISCRETE, stocks: [9, 9] as [number, number] };

describe('stopped early, at every moment', () => {
  const orders = [21, 24, 33]
    .map((seed) => randomOrder(seed, HARD))
    .concat(demo('VG 46, VI 105'), demo('impossible at 10'));

  test('a time limit never turns into a false proof', async () => {
    const kinds = new Set<string>();
    for (const order of orders) {
      const truth = sliceSearch(order);
      for (let calm = 1; calm <= 40; calm += 3) {
        const outcome = await solveBlend(order, { timeLimitMs: 1000, now: jumpingClock(calm) });
        expectConsistent(outcome);
        kinds.add(`${outcome.stopped}: ${outcome.proof.kind}`);
        expectTrue(outcome, order, truth);
      }
    }
    expect([...kinds]).toEqual(
      expect.arrayContaining(['time limit: none', 'time limit: within gap', 'finished: least cost']),
    );
  });

  test('cancelling never turns into a false proof', async () => {
    const kinds = new Set<string>();
    for (const order of orders) {
      const truth = sliceSearch(order);
      for (let calm = 0; calm <= 30; calm += 3) {
        let asked = 0;
        const outcome = await solveBlend(order, { isCancelled: () => asked++ >= calm });
        expectConsistent(outcome);
        kinds.add(`${outcome.stopped}: ${outcome.proof.kind}`);
        expectTrue(outcome, order, truth);
      }
    }
    expect([...kinds]).toEqual(
      expect.arrayContaining(['cancelled: none', 'cancelled: within gap', 'finished: least cost']),
    );
  });
});

function expectTrue(outcome: BlendOutcome, order: Order, truth: { status: string; cost: number }): void {
  const { proof, recipe, costPerTonne } = outcome;
  if (proof.kind.startsWith('impossible')) expect(truth.status).toBe('impossible');
  if (proof.lowerBound !== undefined && truth.status === 'solved') {
    expect(proof.lowerBound).toBeLessThanOrEqual(truth.cost * (1 + 1e-6));
  }
  if (!recipe || costPerTonne === undefined) return;
  expect(truth.status).toBe('solved');
  expect(costPerTonne).toBeGreaterThanOrEqual(truth.cost * (1 - 5e-6));
  expect(worstViolation(order, recipe).units).toBeLessThan(1.01e-6);
}

describe('refused: the order is no question, and the message says where', () => {
  const base = (): Order => ({
    stocks: structuredClone(BASE_OILS),
    limits: [{ property: 'kv', celsius: 100, min: 5.8, max: 6.2 }],
  });

  async function expectRefused(order: Order, path: (string | number)[], words: RegExp): Promise<void> {
    const outcome = await solveBlend(order);
    expectConsistent(outcome);
    expect(outcome.stopped).toBe('refused');
    expect(outcome.proof).toEqual({ kind: 'none' });
    const problem = outcome.problems.find((entry) => path.every((step, i) => entry.path[i] === step));
    expect(problem, JSON.stringify(outcome.problems)).toBeDefined();
    expect(problem?.message).toMatch(words);
  }

  test('a required stock with a missing figure names the cell', async () => {
    const order = base();
    order.stocks[7] = without(order.stocks[7], 'noack');
    order.limits.push({ property: 'noack', max: 12 });
    order.doses = [{ stockId: 'PAO 4', min: 0.1 }];
    await expectRefused(order, ['stocks', 'PAO 4', 'noack'], /PAO 4.*Noack/);
  });

  test('a required stock without KV40 in an order with a viscosity index names KV40', async () => {
    const order = base();
    order.stocks[7].figures = order.stocks[7].figures.filter((figure) => figure.celsius !== 40);
    order.limits.push({ property: 'vi', min: 100 });
    order.doses = [{ stockId: 'PAO 4', exactly: 0.1 }];
    await expectRefused(order, ['stocks', 'PAO 4', 'kv@40'], /PAO 4.*40 °C/);
  });

  test('no stocks', async () => {
    await expectRefused({ stocks: [], limits: [] }, ['stocks'], /no stocks/);
  });

  test('an unknown property', async () => {
    const order = base();
    order.limits.push({ property: 'smell', max: 3 });
    await expectRefused(order, ['limits', 1, 'property'], /smell/);
  });

  test.each(['min', 'max', 'insideBy'] as const)('a limit whose %s is no number', async (end) => {
    const order = base();
    order.limits[0] = { ...order.limits[0], [end]: Number.NaN };
    await expectRefused(order, ['limits', 0, end], /number/);
  });

  test('a price that is no number', async () => {
    const order = base();
    order.stocks[0].pricePerTonne = Number.NaN;
    await expectRefused(order, ['stocks', 'SN 150', 'pricePerTonne'], /SN 150/);
  });

  test('a figure that is no number', async () => {
    const order = base();
    order.stocks[0].figures[1].value = Number.NaN;
    await expectRefused(order, ['stocks', 'SN 150', 'kv@40'], /SN 150/);
  });

  test('a limit that contradicts itself', async () => {
    const order = base();
    order.limits[0] = { property: 'kv', celsius: 100, min: 6.2, max: 5.8 };
    await expectRefused(order, ['limits', 0], /6\.2.*5\.8/);
  });

  test('a viscosity index where no mix reaches KV100 = 2', async () => {
    const thin = structuredClone(BASE_OILS.slice(5, 6));
    thin[0].figures = [
      { property: 'density', celsius: 15, value: 800, origin: 'measured' },
      { property: 'kv', celsius: 40, value: 5.1, origin: 'measured' },
      { property: 'kv', celsius: 100, value: 1.7, origin: 'measured' },
    ];
    await expectRefused({ stocks: thin, limits: [{ property: 'vi', min: 90 }] }, ['limits', 0], /KV100.*2/);
  });

  test('a dose of a stock that is not there', async () => {
    const order = base();
    order.doses = [{ stockId: 'moonshine', exactly: 0.1 }];
    await expectRefused(order, ['doses', 0], /not among the stocks/);
  });

  test('options that are no numbers are the caller’s mistake', async () => {
    await expect(solveBlend(base(), { timeLimitMs: Number.NaN })).rejects.toThrow(RangeError);
    await expect(solveBlend(base(), { relativeGap: -1 })).rejects.toThrow(RangeError);
  });
});

describe('impossible', () => {
  test('with every figure known', async () => {
    const outcome = await solveBlend(demo('impossible at 10'));
    expectConsistent(outcome);
    expect(outcome).toMatchObject({ stopped: 'finished', proof: { kind: 'impossible' }, leftOut: [] });
    expect(outcome.conflict?.length).toBeGreaterThan(0);
  });

  test('with the figures that are known: the stock left out is named', async () => {
    const order = demo('impossible at 10');
    const ester = order.stocks.findIndex((stock) => stock.family === 'ester');
    order.stocks[ester] = without(order.stocks[ester], 'noack');
    const outcome = await solveBlend(order);
    expectConsistent(outcome);
    expect(outcome).toMatchObject({ stopped: 'finished', proof: { kind: 'impossible with known figures' } });
    expect(outcome.leftOut).toMatchObject([{ stockId: 'polyol ester', reason: 'unknown figure', property: 'noack' }]);
  });

  test('limits of two kinds that exclude each other', async () => {
    const outcome = await solveBlend({
      stocks: BASE_OILS,
      limits: [
        { property: 'kv', celsius: 100, max: 4 },
        { property: 'kv', celsius: 40, min: 60 },
      ],
    });
    expect(outcome.proof.kind).toBe('impossible');
    expect(outcome.conflict).toEqual([0, 1]);
  });

  test('doses of more than the whole', async () => {
    const doses = [
      { stockId: 'PAO 4', exactly: 0.6 },
      { stockId: 'PAO 6', exactly: 0.5 },
    ];
    const outcome = await solveBlend({ stocks: BASE_OILS, limits: [], doses });
    expectConsistent(outcome);
    expect(outcome.proof.kind).toBe('impossible');
  });
});

test('a stock thinner than KV100 = 2 is an ordinary part of a mix with a viscosity index', async () => {
  const spindle: Stock = {
    ...structuredClone(BASE_OILS[0]),
    id: 'spindle oil',
    pricePerTonne: 300,
    figures: [
      { property: 'density', celsius: 15, value: 845, origin: 'measured' },
      { property: 'kv', celsius: 40, value: 5.2, origin: 'measured' },
      { property: 'kv', celsius: 100, value: 1.7, origin: 'measured' },
    ],
  };
  const order: Order = {
    stocks: [...BASE_OILS, spindle],
    limits: [
      { property: 'kv', celsius: 100, min: 3, max: 3.4 },
      { property: 'vi', min: 95 },
    ],
  };
  const outcome = await solveBlend(order);
  expect(outcome.recipe?.map((line) => line.stockId)).toContain('spindle oil');
  expect(Math.abs((outcome.costPerTonne ?? 0) / sliceSearch(order).cost - 1)).toBeLessThan(5e-6);
});
