import { describe, expect, test } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import {
  alternatives,
  bestOfProperty,
  fewestStocks,
  nearestRecipe,
  type Order,
  type Recipe,
  solveBlend,
  toOrder,
} from '../../../src/index';
import { orderRows } from '../../oracle/orderRows';
import { costOf, predictedViolation } from '../../oracle/predictedViolation';
import { CONTINUOUS, randomOrder } from '../../oracle/randomOrder';
import { figureOf } from '../../oracle/randomStock';
import { searchRows } from '../../oracle/sliceSearch';
import { worstViolation } from '../../oracle/violation';
import { seeds } from '../optimum/judge';
import { plainOrder } from '../order/plainOrder';
import { cheapestOfEverySet } from './everySet';

const LONG = { timeLimitMs: 60_000 };
const UNIT_TOLERANCE = 1.01e-6;

describe('fewest stocks', () => {
  test('as by trying every set of stocks', async () => {
    const problems: string[] = [];
    let fewer = 0;
    for (const seed of seeds(14, 71)) {
      const order = randomOrder(seed, { ...CONTINUOUS, stocks: [4, 6] });
      const outcome = await solveBlend(order);
      const within = 0.15;
      const found = await fewestStocks(order, outcome, { within, ...LONG });
      const every = found && cheapestOfEverySet(order);
      if (!every || !found || outcome.costPerTonne === undefined) continue;
      const ceiling = outcome.costPerTonne * (1 + within);
      const counts = every.filter(({ cost }) => cost <= ceiling).map(({ stocks }) => stocks.length);
      const least = Math.min(...counts);
      if (found.recipe.length !== least) problems.push(`seed ${seed}: ${found.recipe.length} against ${least}`);
      const cheapest = Math.min(...every.filter(({ stocks }) => stocks.length <= least).map(({ cost }) => cost));
      if (Math.abs(found.costPerTonne / cheapest - 1) > 1e-5)
        problems.push(`seed ${seed}: cost ${found.costPerTonne} against ${cheapest}`);
      if (!found.proven || found.costPerTonne > ceiling * (1 + 1e-5)) problems.push(`seed ${seed}: ${found.proven}`);
      if (worstViolation(order, found.recipe).units > UNIT_TOLERANCE) problems.push(`seed ${seed}: misses a limit`);
      if (least < (outcome.recipe?.length ?? 0)) fewer++;
    }
    expect(problems).toEqual([]);
    expect(fewer).toBeGreaterThan(2);
  });

  test('no time: the cheapest recipe itself, not called proven', async () => {
    const order = plainOrder();
    const outcome = await solveBlend(order);
    const found = await fewestStocks(order, outcome, { timeLimitMs: 0 });
    expect(found).toMatchObject({
      recipe: outcome.recipe,
      dearerBy: 0,
      proven: false,
      stopped: 'time limit',
      solves: 0,
    });
  });
});

describe('the best value of a property', () => {
  test('least volatility under a ceiling: as by the second way with volatility in place of cost', async () => {
    const problems: string[] = [];
    let compared = 0;
    for (const seed of seeds(14, 171)) {
      const order = randomOrder(seed, { ...CONTINUOUS, stocks: [4, 8] });
      const outcome = await solveBlend(order);
      const within = 0.04;
      const aim = { property: 'noack', towards: 'lower' } as const;
      const found = await bestOfProperty(order, outcome, aim, { within, ...LONG });
      if (!found || outcome.costPerTonne === undefined) continue;
      const rows = orderRows(order);
      const ceiling = outcome.costPerTonne * (1 + within);
      const underCeiling = {
        name: 'ceiling',
        values: rows.cost.map((price) => price - ceiling),
        lower: -Infinity,
        upper: 0,
      };
      const answer = searchRows({
        ...rows,
        rows: [...rows.rows, underCeiling],
        cost: rows.stocks.map((stock) => figureOf(stock, 'noack')),
      });
      if (answer.status !== 'solved') continue;
      compared++;
      if (!found.proven) problems.push(`seed ${seed}: not proven`);
      if (!(found.value >= answer.cost - 1e-3 && found.value <= answer.cost + found.step * 1.1))
        problems.push(`seed ${seed}: ${found.value} against ${answer.cost}`);
      if (worstViolation(order, found.recipe).units > UNIT_TOLERANCE) problems.push(`seed ${seed}: misses a limit`);
    }
    expect(problems).toEqual([]);
    expect(compared).toBeGreaterThan(8);
  });

  test('highest viscosity index: the second way solves it at the value, and not a step beyond', async () => {
    let compared = 0;
    for (const seed of seeds(10, 271)) {
      const order = randomOrder(seed, { ...CONTINUOUS, stocks: [4, 8], width: 0.05 });
      const outcome = await solveBlend(order);
      const found = await bestOfProperty(
        order,
        outcome,
        { property: 'vi', towards: 'higher' },
        { within: 0.1, ...LONG },
      );
      if (!found || outcome.costPerTonne === undefined) continue;
      const ceiling = outcome.costPerTonne * 1.1;
      const costAt = (min: number) =>
        searchRows(orderRows({ ...order, limits: [...order.limits, { property: 'vi', min }] }));
      expect(found.proven).toBe(true);
      expect(costAt(found.value - 1e-4).cost).toBeLessThan(ceiling * (1 + 1e-5));
      const beyond = costAt(found.value + found.step * 1.01);
      expect(beyond.status === 'impossible' || beyond.cost > ceiling * (1 - 1e-6)).toBe(true);
      compared++;
    }
    expect(compared).toBeGreaterThan(5);
  });

  test('nothing for a property that is unknown', async () => {
    const order = plainOrder();
    const outcome = await solveBlend(order);
    expect(await bestOfProperty(order, outcome, { property: 'calcium', towards: 'lower' })).toBeUndefined();
    expect(await bestOfProperty(order, outcome, { property: 'unheard of', towards: 'lower' })).toBeUndefined();
  });

  test('no time: the value of the cheapest recipe, not called proven', async () => {
    const order = plainOrder();
    const outcome = await solveBlend(order);
    const found = await bestOfProperty(order, outcome, { property: 'noack', towards: 'lower' }, { timeLimitMs: 0 });
    expect(found).toMatchObject({ recipe: outcome.recipe, proven: false, stopped: 'time limit' });
  });
});

describe('the nearest recipe', () => {
  const changeOf = (order: Order, x: readonly number[], inUse: Recipe) =>
    order.stocks.reduce(
      (sum, { id }, i) => sum + Math.abs(x[i] - (inUse.find((line) => line.stockId === id)?.massFraction ?? 0)),
      0,
    );

  test('two stocks: as on a line of 5000 mixes; three: no mix of a grid is nearer', async () => {
    const problems: string[] = [];
    let moved = 0;
    for (const seed of seeds(14, 371)) {
      const order = randomOrder(seed, { ...CONTINUOUS, stocks: [2, 3], rules: false });
      const outcome = await solveBlend(order);
      if (outcome.costPerTonne === undefined) continue;
      const inUse = order.stocks.map(({ id }, i, { length }) => ({
        stockId: id,
        massFraction: i === 0 ? 0.7 : 0.3 / (length - 1),
      }));
      const within = 0.1;
      const found = await nearestRecipe(order, outcome, inUse, { within, ...LONG });
      if (!found) {
        problems.push(`seed ${seed}: nothing found`);
        continue;
      }
      const ceiling = outcome.costPerTonne * (1 + within);
      const fine = order.stocks.length === 2;
      const n = fine ? 5000 : 50;
      const mixes = Array.from({ length: n + 1 }, (_, a) => a / n).flatMap((a) =>
        fine
          ? [[a, 1 - a]]
          : Array.from({ length: n + 1 }, (_, b) => [a, b / n, 1 - a - b / n]).filter((x) => x[2] >= 0),
      );
      const nearer = mixes
        .filter((x) => changeOf(order, x, inUse) < found.totalChange - 1e-5 && costOf(order, x) <= ceiling)
        .filter((x) => predictedViolation(order, x) <= 0);
      if (nearer.length > 0) problems.push(`seed ${seed}: ${nearer[0]} is nearer than ${found.totalChange}`);
      if (!found.proven) problems.push(`seed ${seed}: not proven`);
      if (found.costPerTonne > ceiling * (1 + 1e-5)) problems.push(`seed ${seed}: above the ceiling`);
      if (worstViolation(order, found.recipe).units > UNIT_TOLERANCE) problems.push(`seed ${seed}: misses a limit`);
      if (found.totalChange > 0.01) moved++;
    }
    expect(problems).toEqual([]);
    expect(moved).toBeGreaterThan(3);
  });

  test('a recipe in use that keeps the order under the ceiling stays as it is', async () => {
    const workbook = demoWorkbook();
    let stayed = 0;
    for (const { order } of workbook.orders.map((entry) => toOrder(workbook, entry))) {
      const outcome = await solveBlend(order);
      for (const { recipe, dearerBy } of (await alternatives(order, outcome, LONG)).list) {
        const within = (1.0001 * dearerBy) / (outcome.costPerTonne ?? Number.NaN);
        const found = await nearestRecipe(order, outcome, recipe, { within, ...LONG });
        expect(found?.totalChange).toBeLessThan(2e-6);
        expect(found?.proven).toBe(true);
        expect(found?.dearerBy).toBeCloseTo(dearerBy, 2);
        const roomy = await nearestRecipe(order, outcome, recipe, { within: 0.5, ...LONG });
        expect(roomy?.totalChange).toBeLessThan(2e-6);
        expect(roomy?.proven).toBe(true);
        stayed++;
      }
    }
    expect(stayed).toBeGreaterThan(10);
  });

  test('a ceiling at the least cost leaves the cheapest recipe only', async () => {
    const workbook = demoWorkbook();
    const { order } = toOrder(workbook, workbook.orders[0]);
    const outcome = await solveBlend(order);
    const [other] = (await alternatives(order, outcome)).list;
    const found = await nearestRecipe(order, outcome, other.recipe, { within: 0, ...LONG });
    expect(found?.dearerBy).toBeLessThan(0.01);
    expect(found?.totalChange).toBeGreaterThan(0.001);
  });

  test.each([{ flushCost: 50 }, { priceSteps: [{ fromTonnes: 1, pricePerTonne: 700 }] }])(
    'what is no property of a mix (%o) gives no answer rather than a wrong one',
    async (costs) => {
      const order: Order = { ...plainOrder(), batchTonnes: 10 };
      Object.assign(order.stocks[0], costs);
      const outcome = await solveBlend(order);
      expect(await nearestRecipe(order, outcome, outcome.recipe ?? [])).toBeUndefined();
    },
  );
});
