import { expect, test } from 'vitest';
import { DEMO_ORDERS } from './demoOrders';
import { sliceSearch } from './sliceSearch';

// The quoted costs were found once, in whole currency units, by another slice search over the same invented figures.
test.each(DEMO_ORDERS)('the slice search reaches the quoted cost: $name', ({ order, quoted }) => {
  const answer = sliceSearch(order);
  if (quoted === undefined) {
    expect(answer.status).toBe('impossible');
    return;
  }
  expect(answer.status).toBe('solved');
  expect(Math.abs(answer.cost - quoted)).toBeLessThanOrEqual(0.51);
  expect(answer.upper - answer.lower).toBeLessThanOrEqual(1e-6 * quoted);
});
