import { describe, expect, test } from 'vitest';
import { type BlendOutcome, type Order, solveBlend } from '../../../src/index';
import { DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { sliceSearch } from '../../oracle/sliceSearch';
import { worstViolation } from '../../oracle/violation';
import { demo, expectConsistent } from './consistency';

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
      for (let calm = 1; calm <= 40; calm++) {
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
