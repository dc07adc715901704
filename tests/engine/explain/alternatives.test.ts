import { describe, expect, test } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import { alternatives, type Order, predictBlend, solveBlend, toOrder } from '../../../src/index';
import { CONTINUOUS, DISCRETE, type OrderShape, randomOrder } from '../../oracle/randomOrder';
import { worstViolation } from '../../oracle/violation';
import { seeds } from '../optimum/judge';
import { plainOrder } from '../order/plainOrder';
import { cheapestOfEverySet, type Found } from './everySet';

const hasAll = (stocks: readonly string[], set: readonly string[]) => set.every((id) => stocks.includes(id));

/** The definition, word by word: the next cheapest that lacks at least one stock of every cheaper one. */
function byDefinition(found: readonly Found[], first: readonly string[]): Found[] {
  const listed: Found[] = [{ cost: 0, stocks: [...first] }];
  for (const entry of found) if (!listed.some(({ stocks }) => hasAll(entry.stocks, stocks))) listed.push(entry);
  return listed.slice(1);
}

async function compare(order: Order): Promise<{ listed: number; problems: string[] } | undefined> {
  const outcome = await solveBlend(order);
  if (!outcome.recipe || outcome.objective === undefined) return undefined;
  const every = cheapestOfEverySet(order);
  if (!every) return undefined;
  const within = 0.3;
  const ceiling = outcome.objective * (1 + within);
  const expected = byDefinition(
    every,
    outcome.recipe.map((line) => line.stockId),
  ).filter(({ cost }) => cost <= ceiling);
  const { list, stopped } = await alternatives(order, outcome, { within, count: 6, timeLimitMs: 60_000 });
  const problems = stopped === 'finished' ? [] : [`stopped: ${stopped}`];
  const costs = expected.slice(0, 6).map(({ cost }) => cost);
  const same =
    costs.length === list.length && costs.every((cost, i) => Math.abs(list[i].costPerTonne / cost - 1) < 1e-5);
  if (!same) problems.push(`${list.map((entry) => entry.costPerTonne)} against ${costs}`);
  for (const entry of list) {
    if (!entry.proven) problems.push('not proven');
    if (!(worstViolation(order, entry.recipe).units <= 1.01e-6)) problems.push('misses a limit');
  }
  return { listed: list.length, problems };
}

describe('against every set of stocks solved alone', () => {
  test.each([
    ['shares, doses and limits', { ...CONTINUOUS, stocks: [4, 6] }, 1, 14],
    ['least doses, counts and exclusions too', { ...DISCRETE, stocks: [4, 5] }, 501, 5],
  ] satisfies [string, OrderShape, number, number][])('%s', async (_name, shape, from, count) => {
    const problems: string[] = [];
    let listed = 0;
    for (const seed of seeds(count, from)) {
      const found = await compare(randomOrder(seed, shape));
      listed += found?.listed ?? 0;
      problems.push(...(found?.problems ?? []).map((problem) => `seed ${seed}: ${problem}`));
    }
    expect(problems).toEqual([]);
    expect(listed).toBeGreaterThanOrEqual(count / 3);
  });
});

describe('the demo', () => {
  test('every order: each alternative lacks a stock of every cheaper recipe, costs no less, and is on specification', async () => {
    const workbook = demoWorkbook();
    let listed = 0;
    for (const { order } of workbook.orders.map((entry) => toOrder(workbook, entry))) {
      const outcome = await solveBlend(order);
      const { list, stopped } = await alternatives(order, outcome, { timeLimitMs: 60_000 });
      expect(stopped).toBe('finished');
      let cost = outcome.costPerTonne ?? 0;
      const sets = [(outcome.recipe ?? []).map((line) => line.stockId)];
      for (const entry of list) {
        const stocks = entry.recipe.map((line) => line.stockId);
        expect(sets.filter((set) => hasAll(stocks, set))).toEqual([]);
        expect(entry.costPerTonne).toBeGreaterThan(cost * (1 - 2e-6));
        expect(entry.costPerTonne - entry.dearerBy).toBeCloseTo(outcome.costPerTonne ?? 0, 6);
        expect(entry.costPerTonne).toBeLessThanOrEqual((outcome.costPerTonne ?? 0) * 1.05);
        expect(entry.proven).toBe(true);
        expect(entry.without.length).toBeGreaterThan(0);
        expect(worstViolation(order, entry.recipe).units).toBeLessThan(1.01e-6);
        sets.push(stocks);
        cost = entry.costPerTonne;
      }
      listed += list.length;
    }
    expect(listed).toBeGreaterThan(10);
  });

  test('a compulsory stock is in every alternative', async () => {
    const order: Order = { ...plainOrder(), doses: [{ stockId: 'polyol ester', exactly: 0.05 }] };
    const { list } = await alternatives(order, await solveBlend(order), { within: 0.5 });
    expect(list.length).toBe(5);
    for (const { recipe } of list) {
      expect(recipe.find((line) => line.stockId === 'polyol ester')?.massFraction).toBeCloseTo(0.05, 9);
      expect(() => predictBlend(order.stocks, recipe)).not.toThrow();
    }
  });

  test('a rule on one stock stands while the stock is left out', async () => {
    const order = plainOrder();
    const first = await solveBlend(order);
    const stockId = first.recipe?.[0].stockId ?? '';
    order.shares = [{ kind: 'count', set: { stockIds: [stockId] }, min: 1 }];
    const { list } = await alternatives(order, await solveBlend(order), { within: 0.5 });
    for (const { recipe } of list) expect(recipe.map((line) => line.stockId)).toContain(stockId);
    expect(list.length).toBeGreaterThan(0);
  });
});

describe('honest endings', () => {
  test('no time: nothing listed, and said so', async () => {
    const order = plainOrder();
    const outcome = await solveBlend(order);
    expect(await alternatives(order, outcome, { timeLimitMs: 0 })).toEqual({
      list: [],
      stopped: 'time limit',
      solves: 0,
    });
  });

  test('cancelled half way: what is listed is what a whole run lists first', async () => {
    const order = plainOrder();
    const outcome = await solveBlend(order);
    const whole = await alternatives(order, outcome, { within: 0.5 });
    let asked = 0;
    const isCancelled = () => ++asked > 12;
    const part = await alternatives(order, outcome, { within: 0.5, isCancelled });
    expect(part.stopped).toBe('cancelled');
    expect(part.list).toEqual(whole.list.slice(0, part.list.length));
    expect(part.list.length).toBeLessThan(whole.list.length);
  });

  test('no recipe, no alternatives', async () => {
    const order: Order = { ...plainOrder(), limits: [{ property: 'kv', celsius: 100, min: 1000 }] };
    expect(await alternatives(order, await solveBlend(order))).toEqual({ list: [], stopped: 'finished', solves: 0 });
  });
});
