import { afterEach, expect, test, vi } from 'vitest';
import type * as LeastCostModule from '../../../src/optimise/search/leastCost';
import { sliceSearch } from '../../oracle/sliceSearch';
import { COST_TOLERANCE } from './judge';
import { expectCaught, loadedEngine } from './loadedEngine';
import { orderByVolume } from './orderByVolume';

const LEAST_COST = '../../../src/optimise/search/leastCost';

const cases = Array.from({ length: 60 }, (_, i) => i + 1).flatMap((seed) => {
  const order = orderByVolume(seed);
  const answer = sliceSearch(order);
  return answer.status === 'solved' ? [{ name: `by volume ${seed}`, order, least: answer.cost }] : [];
});

afterEach(() => {
  vi.doUnmock(LEAST_COST);
  vi.resetModules();
});

/** Costs per m³ that differ from the slice search's, and bounds above them. */
async function judged(): Promise<string[]> {
  const solve = await loadedEngine();
  const found: string[] = [];
  for (const { name, order, least } of cases) {
    const { costPerCubicMetre: cost = Number.NaN, proof } = await solve(order);
    const isRight = Math.abs(cost / least - 1) <= COST_TOLERANCE;
    if (!isRight || proof.kind !== 'least cost') found.push(`${name}: ${proof.kind}, cost ${cost} against ${least}`);
    const isBelow = (proof.lowerBound ?? Infinity) <= least * (1 + 1e-6);
    if (!isBelow) found.push(`${name}: bound ${proof.lowerBound} above ${least}`);
  }
  return found;
}

test('the engine itself: the judge finds nothing', async () => {
  expect(cases.length).toBeGreaterThan(20);
  expect(await judged()).toEqual([]);
});

test('caught: the bound divided by the greatest volume in place of the least', async () => {
  vi.doMock(LEAST_COST, async (importOriginal) => {
    const original = await importOriginal<typeof LeastCostModule>();
    const leastCostPerCubicMetre: typeof original.leastCostPerCubicMetre = (engine, model, volumes, ...rest) => {
      // The least and the greatest volume are taken over what the list gives out: the greatest alone.
      const greatest = Math.max(...volumes);
      const mistaken = Object.defineProperty(Float64Array.from(volumes), Symbol.iterator, {
        value: () => [greatest].values(),
      });
      return original.leastCostPerCubicMetre(engine, model, mistaken, ...rest);
    };
    return { ...original, leastCostPerCubicMetre };
  });
  expectCaught(await judged(), cases.length);
});
