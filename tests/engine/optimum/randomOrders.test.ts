import { expect, test } from 'vitest';
import { solveBlend } from '../../../src/index';
import { CONTINUOUS, randomOrder } from '../../oracle/randomOrder';
import { rootGap } from '../../oracle/rootGap';
import { sliceSearch } from '../../oracle/sliceSearch';
import { caseOf, disagreements, seeds } from './judge';

// Second way: slices over KV100 with HiGHS on rows of its own (tests/oracle), no code in common with the engine.
test('200 seeded orders: status and cost as by the slice search', async () => {
  const count = { orders: 0, solved: 0, impossible: 0, undecided: 0, binding: 0 };
  const found: string[] = [];
  for (const seed of seeds(200)) {
    const order = randomOrder(seed, CONTINUOUS);
    const answer = sliceSearch(order);
    count.orders++;
    if (answer.status === 'undecided') count.undecided++;
    if (answer.status === 'solved') count.solved++;
    if (answer.status === 'impossible') count.impossible++;
    if (answer.viBinds && rootGap(order, answer.cost) > 1e-4) count.binding++;
    const entry = caseOf(`seed ${seed}`, order, answer);
    if (entry) found.push(...(await disagreements(solveBlend, [entry])));
  }
  console.info(`Random orders: ${JSON.stringify(count)} ("binding": VI active and a root gap above 1e-4).`);
  expect(found).toEqual([]);
  expect(count.binding, 'too few orders where the viscosity index matters').toBeGreaterThan(count.orders / 4);
  expect(count.impossible).toBeGreaterThan(count.orders / 50);
  expect(count.undecided).toBeLessThanOrEqual(count.orders / 100);
});
