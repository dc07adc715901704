import { expect, test } from 'vitest';
import { solveBlend } from '../../../src/index';
import { gridSearch } from '../../oracle/gridSearch';
import { randomOrder } from '../../oracle/randomOrder';
import { seeds } from './judge';

// Second way: every mix on a grid, refined around the cheapest, with predictBlend as the only judge. A grid can miss a
// thin sliver of mixes, so it never proves "impossible"; what it finds must not beat the bound, and must come near.
test.each([
  { stocks: 2, points: 300, count: 18, from: 5001 },
  { stocks: 3, points: 16, count: 8, from: 6001 },
])('full grids of $stocks stocks', async ({ stocks, points, count, from }) => {
  let compared = 0;
  let near = 0;
  for (const seed of seeds(count, from)) {
    const order = randomOrder(seed, { stocks: [stocks, stocks], rules: false, choices: false });
    const grid = gridSearch(order, points);
    const outcome = await solveBlend(order);
    if (!grid) continue;
    const cost = outcome.costPerTonne ?? Number.NaN;
    const bound = outcome.proof.lowerBound ?? Number.NaN;
    expect(outcome.proof.kind, `seed ${seed}: the grid has a mix at ${grid.cost}`).toBe('least cost');
    expect(bound, `seed ${seed}: a grid mix beats the bound`).toBeLessThanOrEqual(grid.cost * (1 + 1e-8));
    expect(cost, `seed ${seed}`).toBeLessThanOrEqual(grid.cost * (1 + 1e-6));
    if (Math.abs(cost / grid.cost - 1) < 2e-5) near++;
    compared++;
  }
  expect(compared).toBeGreaterThan(count / 3);
  // The grid itself now and then stops short of a corner between limits.
  expect(near).toBeGreaterThanOrEqual(0.75 * compared);
});
