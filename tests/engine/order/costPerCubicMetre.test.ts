import { describe, expect, test } from 'vitest';
import { type BlendOutcome, type Order, type SolveProgress, solveBlend } from '../../../src/index';
import { DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { sliceSearch } from '../../oracle/sliceSearch';
import { demo, expectConsistent } from '../optimum/consistency';
import { orderByVolume } from '../optimum/orderByVolume';
import { asTheRest, plainOrder, shareOf, solved } from './plainOrder';

function perCubicMetre(order: Order): Order {
  return { ...order, costBasis: 'cubic metre' };
}

/** Orders that differ in what is cheapest by mass and by volume, with their least cost per m³ by the slice search. */
const ORDERS = ['driveline -42', 'driveline -45', 'VG 46, VI 105', 'impossible at 11'].map((name) => {
  const order = perCubicMetre(demo(name));
  return { name, order, least: sliceSearch(order).cost };
});

test.each(ORDERS)(
  '$name: the objective is the cost per m³, the least there is, with its bound below',
  async ({ order, least }) => {
    const { objective, costPerCubicMetre, costPerTonne, proof } = await solved(order);
    expect(objective).toBeCloseTo(costPerCubicMetre ?? Number.NaN, 6);
    expect(costPerCubicMetre).not.toBeCloseTo(costPerTonne ?? Number.NaN, 0);
    expect(Math.abs((costPerCubicMetre ?? 0) / least - 1)).toBeLessThan(5e-6);
    expect(proof.lowerBound).toBeLessThanOrEqual(costPerCubicMetre ?? Number.NaN);
    expect(proof.lowerBound).toBeGreaterThan(least * (1 - 5e-6));
  },
);

test('a density taken from the rest says nothing of a volume: the stock is left out by name', async () => {
  const order = perCubicMetre({ ...plainOrder(), limits: [{ property: 'noack', max: 14.3 }] });
  const cheapest = order.stocks[5];
  cheapest.pricePerTonne = 10;
  expect(shareOf(await solved(order), cheapest.id)).toBeCloseTo(1, 9);
  cheapest.figures = cheapest.figures.map((figure) =>
    figure.property === 'density' ? asTheRest('density', 15) : figure,
  );
  const outcome = await solved(order);
  expect(outcome.leftOut).toMatchObject([{ stockId: cheapest.id, reason: 'unknown figure', property: 'density' }]);
  expect(outcome.leftOut[0].message).toMatch(/^Group III 4: .*m³/);
  expect(shareOf(outcome, cheapest.id)).toBe(0);
  expect(shareOf(await solved({ ...order, costBasis: 'tonne' }), cheapest.id)).toBeCloseTo(1, 9);
});

/** A clock that jumps by an hour once it was read `calm` times. */
function jumpingClock(calm: number): () => number {
  let reads = 0;
  return () => (reads++ < calm ? reads : 3_600_000 + reads);
}

describe('stopped by a time limit', () => {
  /** Orders of several rounds, and orders whose first recipe comes late: until then there is a bound alone. */
  const hard = [
    ...[2, 5, 7].map(orderByVolume),
    ...[63, 85, 99, 106].map((seed) => perCubicMetre(randomOrder(seed, { ...DISCRETE, stocks: [8, 8] }))),
  ];

  function expectHonest(outcome: BlendOutcome, least: number): void {
    const { proof, costPerCubicMetre, stopped } = outcome;
    expect(proof.lowerBound ?? -Infinity).toBeLessThanOrEqual(least * (1 + 1e-6));
    if (costPerCubicMetre === undefined) return;
    expect(costPerCubicMetre).toBeGreaterThanOrEqual(least * (1 - 5e-6));
    if (stopped === 'time limit' && costPerCubicMetre > least * (1 + 5e-6)) expect(proof.kind).not.toBe('least cost');
  }

  test('no bound above the least cost per m³, and no proof of what is dearer', async () => {
    const kinds = new Set<string>();
    let boundsAlone = 0;
    for (const order of [...ORDERS.map((entry) => entry.order), ...hard]) {
      const least = (await solved(order)).costPerCubicMetre ?? Number.NaN;
      for (let calm = 1; calm <= 45; calm += 2) {
        const outcome = await solveBlend(order, { timeLimitMs: 1000, now: jumpingClock(calm) });
        expectConsistent(outcome);
        expectHonest(outcome, least);
        kinds.add(`${outcome.stopped}: ${outcome.proof.kind}`);
        if (!outcome.recipe && outcome.proof.lowerBound !== undefined) boundsAlone++;
      }
    }
    const expected = ['time limit: none', 'time limit: within gap', 'finished: least cost'];
    expect([...kinds]).toEqual(expect.arrayContaining(expected));
    expect(boundsAlone).toBeGreaterThan(5);
  });
});

test('progress tells the work of a search per m³, and neither a cost nor a bound of its parts', async () => {
  async function told(order: Order): Promise<SolveProgress[]> {
    const progress: SolveProgress[] = [];
    let time = 0;
    await solveBlend(order, { timeLimitMs: 1e9, now: () => (time += 60), onProgress: (entry) => progress.push(entry) });
    return progress;
  }
  const order = randomOrder(33, { ...DISCRETE, stocks: [9, 9] });
  const perTonne = await told(order);
  expect(perTonne.some((entry) => entry.bestCost !== undefined && entry.lowerBound !== undefined)).toBe(true);
  const perVolume = await told(perCubicMetre(order));
  expect(perVolume.length).toBeGreaterThan(0);
  for (const entry of perVolume) expect(Object.keys(entry).sort()).toEqual(['milliseconds', 'nodes']);
});
