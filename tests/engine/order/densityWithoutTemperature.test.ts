import { expect, test } from 'vitest';
import type { Order } from '../../../src/index';
import { plainOrder, solved } from './plainOrder';

/** The same order with every density stated without its temperature. */
function bare(order: Order): Order {
  return {
    ...order,
    stocks: order.stocks.map((stock) => ({
      ...stock,
      figures: stock.figures.map(({ celsius, ...figure }) =>
        figure.property === 'density' || celsius === undefined ? figure : { ...figure, celsius },
      ),
    })),
  };
}

test('a density without a temperature is one at 15 °C', async () => {
  const order: Order = { ...plainOrder(), costBasis: 'cubic metre' };
  order.limits.push({ property: 'density', max: 850 });
  const [stated, unstated] = [await solved(order), await solved(bare(order))];
  expect(unstated.leftOut).toEqual([]);
  expect(unstated.recipe).toEqual(stated.recipe);
  expect(unstated.costPerCubicMetre).toBe(stated.costPerCubicMetre);
  expect(unstated.checks).toEqual(stated.checks);
});
