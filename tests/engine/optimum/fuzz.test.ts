import { expect, test } from 'vitest';
import { solveBlend } from '../../../src/index';
import { mixedOrder } from '../../oracle/mixedOrder';
import { sliceSearch } from '../../oracle/sliceSearch';
import { worstViolation } from '../../oracle/violation';
import { caseOf, differences, seeds } from './judge';

/**
 * All rules mixed, 3 to 80 stocks, each order held against HiGHS as a mixed-integer solver over fine slices of KV100.
 * `npm run fuzz` runs 3 000 orders; the same seeds every time.
 */
test('orders with all rules mixed: status, cost and bound as by mixed-integer slices', async () => {
  const found: string[] = [];
  const statuses = new Map<string, number>();
  let worstMiss = 0;
  let worstTime = { seed: 0, milliseconds: 0 };
  let compared = 0;
  const all = seeds(60, 1);
  for (const seed of all) {
    const order = mixedOrder(seed);
    const outcome = await solveBlend(order, { now: () => performance.now(), timeLimitMs: 20_000 });
    const kind = `${outcome.stopped}, ${outcome.proof.kind}`;
    statuses.set(kind, (statuses.get(kind) ?? 0) + 1);
    if (outcome.work.milliseconds > worstTime.milliseconds)
      worstTime = { seed, milliseconds: outcome.work.milliseconds };
    if (outcome.recipe) worstMiss = Math.max(worstMiss, worstViolation(order, outcome.recipe).units);
    const answer = sliceSearch(order);
    const entry = caseOf(`seed ${seed}`, order, answer);
    if (!entry) continue;
    compared++;
    found.push(...differences(entry, outcome).map((difference) => `seed ${seed}: ${difference}`));
  }
  console.info(
    `${all.length} orders, ${compared} decided by the second way: ${[...statuses].map(([kind, count]) => `${count} ${kind}`).join('; ')}. ` +
      `${found.length} disagreements, worst miss ${worstMiss.toExponential(1)} reporting units, ` +
      `longest solve ${worstTime.milliseconds.toFixed(0)} ms (seed ${worstTime.seed}).`,
  );
  expect(found).toEqual([]);
  expect(compared).toBeGreaterThan(0.9 * all.length);
  expect(worstMiss).toBeLessThanOrEqual(1.01e-6);
}, 3_600_000);
