import { expect, test } from 'vitest';
import { solveBlend } from '../../../src/index';
import { attack } from '../../oracle/localSearch';
import { CONTINUOUS, randomOrder } from '../../oracle/randomOrder';
import { seeds } from './judge';

// Many-start local search through predictBlend alone: one feasible mix below the bound breaks the proof.
test('no mix that local search finds is cheaper than the proven bound', async () => {
  let near = 0;
  let attacked = 0;
  for (const seed of seeds(14, 3001)) {
    const order = randomOrder(seed, CONTINUOUS);
    const { proof, recipe, costPerTonne } = await solveBlend(order);
    const found = attack(order, recipe ?? [], seed, 3, 250);
    if (!recipe) {
      expect(found.cost, `seed ${seed}: said to be impossible, but ${JSON.stringify(found.x)} meets the order`).toBe(
        Infinity,
      );
      continue;
    }
    attacked++;
    const bound = proof.lowerBound ?? Infinity;
    const message = `seed ${seed}: ${JSON.stringify(found.x)} costs ${found.cost}, bound ${bound}`;
    expect(found.cost, message).toBeGreaterThanOrEqual(bound - 1e-9 * Math.abs(bound));
    if (found.cost < (costPerTonne ?? 0) * 1.002) near++;
  }
  // An attack that never comes near the optimum would be no attack.
  expect(near).toBeGreaterThan(attacked / 3);
});
