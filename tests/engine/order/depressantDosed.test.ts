import { expect, test } from 'vitest';
import type { BlendOutcome, Order } from '../../../src/index';
import { demoStock, plainOrder, solved } from './plainOrder';

function depressed(): Order {
  const { stocks, limits } = plainOrder();
  return {
    stocks: [...stocks, demoStock('depressant')],
    limits: [...limits, { property: 'pourPoint', max: -30 }],
    depressant: true,
  };
}

function warns({ cautions }: BlendOutcome): boolean {
  return cautions.some(({ message }) => /no depressant is dosed/.test(message));
}

test('pour points with depressant, and none dosed: a caution', async () => {
  expect(warns(await solved(depressed()))).toBe(true);
});

test('with one dosed there is none', async () => {
  const order = { ...depressed(), doses: [{ stockId: 'depressant', exactly: 0.002 }] };
  expect(warns(await solved(order))).toBe(false);
});

test('without a limit on the pour point there is none', async () => {
  const order = depressed();
  order.limits.pop();
  expect(warns(await solved(order))).toBe(false);
});

test('with neat pour points there is none', async () => {
  const order: Order = { ...depressed(), depressant: false };
  order.limits[1] = { property: 'pourPoint', max: -9 };
  expect(warns(await solved(order))).toBe(false);
});
