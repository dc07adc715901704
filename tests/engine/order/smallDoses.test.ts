import { expect, test } from 'vitest';
import type { Dose, Order } from '../../../src/index';
import { demoStock, plainOrder, shareOf, solved } from './plainOrder';

const DYE = 'gear package';

/** The plain order with a package that may be dosed in traces: 2e-5 is 20 g a tonne. */
function withTrace(dose: Omit<Dose, 'stockId'>): Order {
  const order = plainOrder();
  return { ...order, stocks: [...order.stocks, demoStock(DYE)], doses: [{ stockId: DYE, ...dose }] };
}

test.each<[string, Omit<Dose, 'stockId'>, number, number]>([
  ['exactly 20 g a tonne, required', { exactly: 2e-5, required: true }, 2e-5, 2e-5],
  ['exactly 20 g a tonne', { exactly: 2e-5 }, 2e-5, 2e-5],
  ['required, at most 50 g a tonne', { required: true, max: 5e-5 }, 1e-6, 5e-5],
  ['at least 20 g a tonne, at most 50 g', { min: 2e-5, max: 5e-5 }, 2e-5, 5e-5],
])('a compulsory dose of %s is kept', async (_, dose, least, most) => {
  const share = shareOf(await solved(withTrace(dose)), DYE);
  expect(share).toBeGreaterThanOrEqual(least - 1e-9);
  expect(share).toBeLessThanOrEqual(most + 1e-9);
});

test('a trace counts as one of its family', async () => {
  const order = withTrace({ exactly: 2e-5 });
  order.shares = [{ kind: 'count', set: { families: ['package'] }, min: 1 }];
  expect(shareOf(await solved(order), DYE)).toBeCloseTo(2e-5, 9);
});

test('a trace counts against the most stocks', async () => {
  const order = withTrace({ exactly: 2e-5 });
  order.mostStocks = 3;
  const { recipe } = await solved(order);
  expect(recipe?.length).toBeLessThanOrEqual(3);
  expect(recipe?.map((line) => line.stockId)).toContain(DYE);
});

test('a required stock without a figure is in the recipe, although nothing makes it cheap', async () => {
  const order = plainOrder();
  const free = await solved(order);
  expect(shareOf(free, 'mPAO 100')).toBe(0);
  const bound = await solved({ ...order, doses: [{ stockId: 'mPAO 100', required: true }] });
  expect(shareOf(bound, 'mPAO 100')).toBeGreaterThan(0);
  expect(bound.costPerTonne).toBeGreaterThan(free.costPerTonne ?? Number.NaN);
});

test('a required stock is used at its least dose where it has one', async () => {
  const order = plainOrder();
  const stocks = order.stocks.map((stock) => (stock.id === 'mPAO 100' ? { ...stock, leastDoseIfUsed: 0.03 } : stock));
  const outcome = await solved({ ...order, stocks, doses: [{ stockId: 'mPAO 100', required: true }] });
  expect(shareOf(outcome, 'mPAO 100')).toBeCloseTo(0.03, 8);
});
