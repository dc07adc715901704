import { expect, test } from 'vitest';
import { type BlendOutcome, createEngine, type Order, reusingSessions, solveBlend } from '../../../src/index';
import { Draw } from '../../oracle/mulberry32';
import { CONTINUOUS, DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { type LinearEngine, spoiled } from '../optimum/faultyEngines';
import { seeds } from '../optimum/judge';

const highs = await createEngine();

/** Two searches to a gap of 1e-6 may differ by this part of the cost. */
const TWO_GAPS = 2e-6;

/** The order with one limit moved a little, as when it is dragged, and now and then a price or a greatest dose. */
function moved(order: Order, draw: Draw): Order {
  const copy = structuredClone(order);
  const limit = draw.pick(copy.limits);
  const step = draw.between(-0.02, 0.02);
  if (limit.min !== undefined) limit.min += step * Math.abs(limit.min);
  if (limit.max !== undefined) limit.max += step * Math.abs(limit.max);
  if (draw.chance(0.3)) draw.pick(copy.stocks).pricePerTonne *= draw.between(0.8, 1.2);
  if (draw.chance(0.2)) draw.pick(copy.stocks).greatestDose = draw.between(0.3, 1);
  return copy;
}

/** Runs of orders over the same stocks with limits moved, then other stocks. */
function ordersInARow(): Order[] {
  return seeds(20, 51_001).flatMap((seed) => {
    const draw = new Draw(seed);
    const orders = [randomOrder(seed, seed % 4 === 0 ? DISCRETE : CONTINUOUS)];
    while (orders.length < 10) orders.push(moved(orders[orders.length - 1], draw));
    return orders;
  });
}

/** How two answers to one order differ, in words; empty where they say the same. */
function difference(one: BlendOutcome, other: BlendOutcome): string {
  if (one.stopped !== other.stopped || one.proof.kind !== other.proof.kind) {
    return `${one.stopped}, ${one.proof.kind} against ${other.stopped}, ${other.proof.kind}`;
  }
  if (one.costPerTonne === undefined || other.costPerTonne === undefined) return '';
  const apart = Math.abs(one.costPerTonne / other.costPerTonne - 1);
  if (apart > TWO_GAPS) return `cost ${one.costPerTonne} against ${other.costPerTonne}`;
  const cheapest = Math.min(one.costPerTonne, other.costPerTonne);
  return (one.proof.lowerBound ?? Infinity) <= cheapest * (1 + 1e-9)
    ? ''
    : `bound ${one.proof.lowerBound} above ${cheapest}`;
}

/** The engine, and how often a session was opened on it. */
function counting(engine: LinearEngine): { engine: LinearEngine; opened: () => number } {
  let opened = 0;
  const open: LinearEngine['open'] = (program) => {
    opened++;
    return engine.open(program);
  };
  return { engine: { ...engine, open }, opened: () => opened };
}

test('orders solved in a row on a kept session are answered as on fresh ones', async () => {
  const { engine, opened } = counting(highs);
  const kept = reusingSessions(engine);
  const orders = ordersInARow();
  const differences: string[] = [];
  let withRecipe = 0;
  for (const [place, order] of orders.entries()) {
    const reused = await solveBlend(order, { linearEngine: kept });
    const fresh = await solveBlend(order, { linearEngine: highs });
    if (reused.recipe) withRecipe++;
    const found = difference(reused, fresh);
    if (found) differences.push(`order ${place}: ${found}`);
  }
  expect(differences).toEqual([]);
  expect(withRecipe).toBeGreaterThan(orders.length / 2);
  expect(opened()).toBeLessThan(orders.length / 2);
});

test('a session that once did not know is replaced by a new one, and no other', async () => {
  let doubts = 0;
  const once = spoiled(highs, 'once in doubt', (result) => (doubts++ === 0 ? { status: 'unknown' } : result));
  const { engine, opened } = counting(once);
  const kept = reusingSessions(engine);
  const order = randomOrder(2, CONTINUOUS);
  const fresh = await solveBlend(order, { linearEngine: highs });
  const seen: number[] = [];
  for (let round = 0; round < 4; round++) {
    expect(difference(await solveBlend(order, { linearEngine: kept }), fresh)).toBe('');
    seen.push(opened());
  }
  expect(seen).toEqual([1, 2, 2, 2]);
});

test('where to look first changes no answer, be it ever so absurd', async () => {
  const differences: string[] = [];
  for (const seed of seeds(16, 52_001)) {
    const order = randomOrder(seed, seed % 4 === 0 ? DISCRETE : CONTINUOUS);
    const plain = await solveBlend(order);
    for (const near of [0.1, 2, 7.5, 1e6, 0, -5, Number.NaN, Infinity, -Infinity]) {
      const found = difference(await solveBlend(order, { near }), plain);
      if (found) differences.push(`seed ${seed} near ${near}: ${found}`);
    }
  }
  expect(differences).toEqual([]);
});
