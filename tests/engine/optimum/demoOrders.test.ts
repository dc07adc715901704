import { expect, test } from 'vitest';
import { solveBlend } from '../../../src/index';
import { DEMO_ORDERS } from '../../oracle/demoOrders';
import { sliceSearch } from '../../oracle/sliceSearch';
import { caseOf, disagreements } from './judge';

// The quoted costs come from another slice search over the same invented figures; 0.1 % covers their rounding.
test.each(DEMO_ORDERS)('demo order: $name', async ({ name, order, quoted }) => {
  const entry = caseOf(name, order, sliceSearch(order));
  expect(await disagreements(solveBlend, entry ? [entry] : [])).toEqual([]);
  const outcome = await solveBlend(order);
  if (quoted === undefined) expect(outcome.proof.kind).toBe('impossible');
  else expect(Math.abs((outcome.costPerTonne ?? 0) / quoted - 1)).toBeLessThan(1e-3);
});

test('the synthetic gear oil warns that the blending rules disagree', async () => {
  const gear = DEMO_ORDERS.find(({ name }) => name === 'VG 320 synthetic');
  const outcome = gear && (await solveBlend(gear.order));
  expect(outcome?.cautions.map((caution) => caution.kind)).toContain('trial blend');
});
