import { describe, expect, test } from 'vitest';
import { type Explanation, explainRecipe, type Order, solveBlend } from '../../../src/index';
import { CONTINUOUS, DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { plainOrder, solved } from '../order/plainOrder';

const order = randomOrder(71_003, { ...CONTINUOUS, stocks: [12, 12] });

/** A clock that goes on by one millisecond with every look at it: the same run each time. */
function tickingClock() {
  let milliseconds = 0;
  return () => milliseconds++;
}

const parts = ({ limits, used, entries }: Explanation) => [limits, used, entries];

/** Every list of `some` begins the list of `all`. */
function expectBeginning(some: Explanation, all: Explanation): void {
  parts(some).forEach((list, at) => void expect(list).toEqual(parts(all)[at].slice(0, list.length)));
}

describe('an explanation that is stopped', () => {
  test('out of time it keeps what is done, unchanged, and says so', async () => {
    const outcome = await solved(order);
    const now = tickingClock();
    const whole = await explainRecipe(order, outcome, { timeLimitMs: 1e9, now });
    const wholeMs = now();
    expect(whole.stopped).toBe('finished');
    const lengths = new Set<number>();
    for (const part of [0, 0.1, 0.3, 0.6, 0.9]) {
      const timeLimitMs = part * wholeMs;
      const some = await explainRecipe(order, outcome, { timeLimitMs, now: tickingClock() });
      expect(some.stopped).toBe('time limit');
      expect(some.solves).toBeLessThan(whole.solves);
      expectBeginning(some, whole);
      lengths.add(parts(some).flat().length);
    }
    expect(lengths.size).toBeGreaterThan(2);
    expect([...lengths][0]).toBe(0);
  });

  test('cancelled between two solves it keeps what is done', async () => {
    const outcome = await solved(order);
    const whole = await explainRecipe(order, outcome);
    let told = 0;
    const some = await explainRecipe(order, outcome, { isCancelled: () => told >= 3, onPart: () => void told++ });
    expect(some.stopped).toBe('cancelled');
    expect(some.solves).toBeLessThan(whole.solves);
    expect(parts(some).flat()).toHaveLength(3);
    expectBeginning(some, whole);
  });

  test('an engine that fails is told, not thrown', async () => {
    const outcome = await solved(order);
    const linearEngine = {
      name: 'broken',
      open: () => {
        throw new Error('broken');
      },
    };
    const some = await explainRecipe(order, outcome, { linearEngine });
    expect(some).toMatchObject({ stopped: 'engine failed', limits: [], used: [], entries: [] });
  });

  test('an outcome without a recipe cannot be explained', async () => {
    const impossible: Order = { ...plainOrder(), limits: [{ property: 'kv', celsius: 100, min: 900 }] };
    const outcome = await solveBlend(impossible);
    expect(outcome.recipe).toBeUndefined();
    await expect(explainRecipe(impossible, outcome)).rejects.toThrow(RangeError);
  });

  test('a recipe that is not proven leaves nothing proven', async () => {
    const discrete = randomOrder(72_004, { ...DISCRETE, stocks: [12, 12] });
    const outcome = await solved(discrete);
    const doubtful = { ...outcome, proof: { ...outcome.proof, kind: 'within gap' as const } };
    const explanation = await explainRecipe(discrete, doubtful);
    const figures = [...explanation.limits, ...explanation.entries];
    expect(figures.length).toBeGreaterThan(5);
    expect(figures.every((figure) => !figure.proven)).toBe(true);
  });
});

test('parts are told as they are done: limits, then stocks in use, then the others', async () => {
  const outcome = await solved(order);
  const told: Explanation[] = [];
  const whole = await explainRecipe(order, outcome, { onPart: (soFar) => told.push(soFar) });
  expect(told).toHaveLength(parts(whole).flat().length);
  for (const soFar of told) expectBeginning(soFar, whole);
  expect(parts(told[0]).map((list) => list.length)).toEqual([1, 0, 0]);
  const firstUsed = told.find((soFar) => soFar.used.length > 0);
  expect(firstUsed).toMatchObject({ limits: whole.limits, entries: [] });
});

test.each([CONTINUOUS, DISCRETE])('the order of the stocks changes nothing', async (shape) => {
  for (const seed of [75_001, 75_002, 75_003, 75_004, 75_005]) {
    const one = randomOrder(seed, shape);
    const other = { ...one, stocks: [...one.stocks].reverse() };
    const [first, second] = [await solveBlend(one), await solveBlend(other)];
    if (!first.recipe) continue;
    expect(await explainRecipe(other, second)).toEqual(await explainRecipe(one, first));
  }
});

test('explaining changes neither the order nor the outcome', async () => {
  const outcome = await solved(order);
  const before = structuredClone({ order, outcome });
  await explainRecipe(order, outcome);
  expect({ order, outcome }).toEqual(before);
});

// A count, not a time: entry prices are guessed from the stocks in use, and asked once where the guess is right.
test('a 12-stock order takes a few dozen solves', async () => {
  const counts: number[] = [];
  for (let seed = 76_001; seed < 76_021; seed++) {
    const twelve = randomOrder(seed, { ...CONTINUOUS, stocks: [12, 12] });
    const outcome = await solveBlend(twelve);
    if (outcome.recipe) counts.push((await explainRecipe(twelve, outcome, { timeLimitMs: 60_000 })).solves);
  }
  counts.sort((a, b) => a - b);
  expect(counts.length).toBeGreaterThan(10);
  expect(counts[counts.length >> 1]).toBeLessThanOrEqual(45);
});
