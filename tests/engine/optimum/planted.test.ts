import { expect, test } from 'vitest';
import { solveBlend } from '../../../src/index';
import { plantedOrder } from '../../oracle/plantedOrder';
import { worstViolation } from '../../oracle/violation';
import { disagreements, seeds } from './judge';

// No solver stands behind the expected cost: see plantedOrder.ts for why x* is the cheapest.
test('200 planted orders: the planted cost is found and proven', async () => {
  const found: string[] = [];
  const kinds = new Map<string, number>();
  for (const seed of seeds(200)) {
    const { order, cost, x, place, width } = plantedOrder(seed);
    kinds.set(`${width} ${place}`, (kinds.get(`${width} ${place}`) ?? 0) + 1);
    const recipe = order.stocks.map((stock, i) => ({ stockId: stock.id, massFraction: x[i] }));
    expect(worstViolation(order, recipe).units, `seed ${seed}`).toBeLessThan(1e-6);
    found.push(
      ...(await disagreements(solveBlend, [{ name: `seed ${seed}`, order, expected: { status: 'solved', cost } }])),
    );
  }
  console.info(`Planted orders by window and place of x*: ${JSON.stringify(Object.fromEntries(kinds))}.`);
  expect(found).toEqual([]);
  expect(kinds.size).toBeGreaterThanOrEqual(6);
});
