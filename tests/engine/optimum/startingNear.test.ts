import { expect, test } from 'vitest';
import { type BlendOutcome, type Order, solveBlend } from '../../../src/index';
import { Draw } from '../../oracle/mulberry32';
import { CONTINUOUS, DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { seeds } from './judge';

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

test('orders solved in a row, each from the last KV100, are answered as from nothing', async () => {
  const orders = ordersInARow();
  const differences: string[] = [];
  let withRecipe = 0;
  let near: number | undefined;
  for (const [place, order] of orders.entries()) {
    const after = await solveBlend(order, near === undefined ? {} : { near });
    near = after.properties?.properties.find(({ property, celsius }) => property === 'kv' && celsius === 100)?.value;
    if (after.recipe) withRecipe++;
    const found = difference(after, await solveBlend(order));
    if (found) differences.push(`order ${place}: ${found}`);
  }
  expect(differences).toEqual([]);
  expect(withRecipe).toBeGreaterThan(orders.length / 2);
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
