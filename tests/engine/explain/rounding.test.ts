import { describe, expect, test } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import { type Order, predictBlend, type Recipe, roundRecipe, solveBlend, toOrder } from '../../../src/index';
import { costOf, predictedViolation } from '../../oracle/predictedViolation';
import { CONTINUOUS, randomOrder } from '../../oracle/randomOrder';
import { worstViolation } from '../../oracle/violation';
import { seeds } from '../optimum/judge';
import { plainOrder } from '../order/plainOrder';

const UNIT_TOLERANCE = 1.01e-6;
const LONG = { timeLimitMs: 60_000 };

/** Every mix of the order's stocks in whole per cents, the cheapest first. */
function inPerCents(order: Order): { x: number[]; cost: number }[] {
  const shares = (left: number, stocks: number): number[][] =>
    stocks === 1
      ? [[left / 100]]
      : Array.from({ length: left + 1 }, (_, k) =>
          shares(left - k, stocks - 1).map((rest) => [k / 100, ...rest]),
        ).flat();
  return shares(100, order.stocks.length)
    .map((x) => ({ x, cost: costOf(order, x) }))
    .sort((a, b) => a.cost - b.cost);
}

const wholeSteps = (recipe: Recipe, step: number) =>
  recipe.every(({ massFraction }) => Math.abs(massFraction / step - Math.round(massFraction / step)) < 1e-9);
const sumOf = (recipe: Recipe) => recipe.reduce((sum, line) => sum + line.massFraction, 0);
const shareIn = (recipe: Recipe, stockId: string) => recipe.find((line) => line.stockId === stockId)?.massFraction;

describe('against every mix on a grid of 1 %', () => {
  test('two and three stocks: the same cost, proven, and none where the grid has none', async () => {
    const problems: string[] = [];
    let rounded = 0;
    for (const seed of seeds(24, 31)) {
      const order = randomOrder(seed, { ...CONTINUOUS, stocks: [2, 3], rules: false });
      const outcome = await solveBlend(order);
      if (!outcome.recipe) continue;
      const expected = inPerCents(order).find(({ x }) => predictedViolation(order, x) <= 1e-6);
      const found = await roundRecipe(order, outcome, 0.01, LONG);
      if (!expected || !found) {
        if (expected || found) problems.push(`seed ${seed}: ${found?.costPerTonne} against ${expected?.cost}`);
        continue;
      }
      rounded++;
      if (Math.abs(found.costPerTonne / expected.cost - 1) > 1e-8)
        problems.push(`seed ${seed}: ${found.costPerTonne} against ${expected.cost}`);
      if (!found.proven) problems.push(`seed ${seed}: not proven`);
      if (!wholeSteps(found.recipe, 0.01) || Math.abs(sumOf(found.recipe) - 1) > 1e-12)
        problems.push(`seed ${seed}: not in steps`);
      if (worstViolation(order, found.recipe).units > UNIT_TOLERANCE) problems.push(`seed ${seed}: misses a limit`);
    }
    expect(problems).toEqual([]);
    expect(rounded).toBeGreaterThan(10);
  });

  test('a window of KV100 that no mix in steps of 10 % hits: no recipe, as on the grid', async () => {
    const stocks = plainOrder().stocks.slice(0, 2);
    const [first, second] = stocks.map((stock) => stock.id);
    const half = [first, second].map((stockId, i) => ({ stockId, massFraction: [0.45, 0.55][i] }));
    const kv100 = predictBlend(stocks, half).properties.find((p) => p.property === 'kv' && p.celsius === 100)?.value;
    const order: Order = {
      stocks,
      limits: [{ property: 'kv', celsius: 100, min: (kv100 ?? 0) * 0.9999, max: (kv100 ?? 0) * 1.0001 }],
    };
    const outcome = await solveBlend(order);
    expect(outcome.recipe).toBeDefined();
    const tenths = inPerCents(order).filter(({ x }) => wholeSteps([{ stockId: first, massFraction: x[0] }], 0.1));
    expect(tenths.filter(({ x }) => predictedViolation(order, x) <= 1e-6)).toEqual([]);
    expect(await roundRecipe(order, outcome, 0.1, LONG)).toBeUndefined();
  });
});

describe('rules', () => {
  async function round(change: Partial<Order>, step: number) {
    const order = { ...plainOrder(), ...change };
    const found = await roundRecipe(order, await solveBlend(order), step, LONG);
    expect(worstViolation(order, found?.recipe ?? []).units).toBeLessThan(UNIT_TOLERANCE);
    return found;
  }

  test('an exact dose in whole steps stays, and all shares are whole steps', async () => {
    const found = await round({ doses: [{ stockId: 'polyol ester', exactly: 0.05 }] }, 0.01);
    expect(found).toMatchObject({ proven: true, offStep: [] });
    expect(shareIn(found?.recipe ?? [], 'polyol ester')).toBe(0.05);
    expect(wholeSteps(found?.recipe ?? [], 0.01)).toBe(true);
  });

  test('an exact dose between steps stays, and the greatest share makes up the mix', async () => {
    const found = await round({ doses: [{ stockId: 'polyol ester', exactly: 0.0085 }] }, 0.001);
    const recipe = found?.recipe ?? [];
    const greatest = recipe.reduce((a, b) => (b.massFraction > a.massFraction ? b : a));
    expect(shareIn(recipe, 'polyol ester')).toBe(0.0085);
    expect([...(found?.offStep ?? [])].sort()).toEqual(['polyol ester', greatest.stockId].sort());
    expect(sumOf(recipe)).toBeCloseTo(1, 12);
    expect(found?.proven).toBe(true);
  });

  test('a division that does not make up the batch: one stock takes the rest', async () => {
    const found = await round({ batchTonnes: 1 }, 0.003);
    expect(found?.offStep).toHaveLength(1);
    expect(sumOf(found?.recipe ?? [])).toBeCloseTo(1, 12);
  });

  test('quantity on hand is not overdrawn by rounding up', async () => {
    const first = await solveBlend(plainOrder());
    const { stockId, massFraction } = first.recipe?.[0] ?? { stockId: '', massFraction: 0 };
    const order = plainOrder();
    const stock = order.stocks.find((candidate) => candidate.id === stockId);
    const onHand = 10 * (Math.floor(massFraction * 100) / 100 - 0.001);
    Object.assign(stock ?? {}, { availableTonnes: onHand });
    const found = await round({ stocks: order.stocks, batchTonnes: 10 }, 0.01);
    expect(10 * (shareIn(found?.recipe ?? [], stockId) ?? 0)).toBeLessThanOrEqual(onHand);
    expect(found?.proven).toBe(true);
  });

  test('whole drums stay whole', async () => {
    const order = plainOrder();
    const stock = order.stocks.find((candidate) => candidate.id === 'polyol ester');
    Object.assign(stock ?? {}, { lotTonnes: 0.18 });
    const doses = [{ stockId: 'polyol ester', min: 0.02 }];
    const found = await round({ stocks: order.stocks, batchTonnes: 10, doses }, 0.001);
    expect((shareIn(found?.recipe ?? [], 'polyol ester') ?? 0) / 0.018).toBeCloseTo(2, 9);
    expect(found?.proven).toBe(true);
  });

  test('a flush cost is counted', async () => {
    const order = plainOrder();
    for (const stock of order.stocks) stock.flushCost = 100;
    const found = await round({ stocks: order.stocks, batchTonnes: 10 }, 0.01);
    const recipe = found?.recipe ?? [];
    const price = (id: string) => order.stocks.find((stock) => stock.id === id)?.pricePerTonne ?? Number.NaN;
    const byHand = recipe.reduce((sum, line) => sum + line.massFraction * price(line.stockId) + 10, 0);
    expect(found?.costPerTonne).toBeCloseTo(byHand, 6);
  });
});

test('prices that fall with the quantity are counted', async () => {
  const order = { ...plainOrder(), batchTonnes: 10 };
  const first = await solveBlend(order);
  const bought = first.recipe?.reduce((a, b) => (b.massFraction > a.massFraction ? b : a)).stockId;
  const stock = order.stocks.find((candidate) => candidate.id === bought);
  const cheap = (stock?.pricePerTonne ?? 0) - 100;
  Object.assign(stock ?? {}, { priceSteps: [{ fromTonnes: 1, pricePerTonne: cheap }] });
  const found = await roundRecipe(order, await solveBlend(order), 0.01, LONG);
  const price = (id: string) =>
    id === bought ? cheap : (order.stocks.find((other) => other.id === id)?.pricePerTonne ?? Number.NaN);
  const byHand = (found?.recipe ?? []).reduce((sum, line) => sum + line.massFraction * price(line.stockId), 0);
  expect(shareIn(found?.recipe ?? [], bought ?? '')).toBeGreaterThan(0.1);
  expect(found?.costPerTonne).toBeCloseTo(byHand, 6);
});

describe('the demo', () => {
  test.each([0.001, 0.0001])(
    'every order in steps of %d: on specification, the cost of rounding is the difference',
    async (step) => {
      const workbook = demoWorkbook();
      let rounded = 0;
      let proven = 0;
      for (const { order } of workbook.orders.map((entry) => toOrder(workbook, entry))) {
        const outcome = await solveBlend(order);
        if (!outcome.recipe) continue;
        const found = await roundRecipe(order, outcome, step, { timeLimitMs: 3000 });
        if (!found) continue;
        rounded++;
        if (found.proven) proven++;
        expect(worstViolation(order, found.recipe).units).toBeLessThan(UNIT_TOLERANCE);
        expect(found.costPerTonne - found.roundingCosts).toBeCloseTo(outcome.costPerTonne ?? Number.NaN, 6);
        expect(found.roundingCosts).toBeGreaterThan(-2e-6 * found.costPerTonne);
        expect(found.roundingCosts).toBeLessThan(0.02 * found.costPerTonne);
      }
      expect(rounded).toBeGreaterThan(5);
      expect(proven).toBeGreaterThan(0);
    },
  );
});

describe('honest endings', () => {
  test('a step that is none is refused', async () => {
    const order = plainOrder();
    const outcome = await solveBlend(order);
    await expect(roundRecipe(order, outcome, 0)).rejects.toThrow('above 0 and below 1');
    await expect(roundRecipe(order, outcome, Number.NaN)).rejects.toThrow(RangeError);
  });

  test('no time, no recipe', async () => {
    const order = plainOrder();
    expect(await roundRecipe(order, await solveBlend(order), 0.01, { timeLimitMs: 0 })).toBeUndefined();
  });

  test('time for the rounding but not for the proof: not called proven', async () => {
    const workbook = demoWorkbook();
    const entry = workbook.orders.find(({ id }) => id === 'vg-320-synthetic');
    const { order } = toOrder(workbook, entry ?? workbook.orders[0]);
    const outcome = await solveBlend(order);
    let time = 0;
    // Every look at the clock takes a millisecond.
    const found = await roundRecipe(order, outcome, 0.0001, { timeLimitMs: 200, now: () => time++ });
    expect(worstViolation(order, found?.recipe ?? []).units).toBeLessThan(UNIT_TOLERANCE);
    expect(found?.proven).toBe(false);
  });
});
