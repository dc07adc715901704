import { expect, test } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import { demandInWords, type Order, toOrder } from '../../../src/index';
import { expectIrreducible, expectReach, expectRelaxations, ladderOf } from './ladderChecks';

function impossibleDemo(): Order {
  const workbook = demoWorkbook();
  const found = workbook.orders.find(({ id }) => id === 'impossible-base');
  if (!found) throw new Error('The demo has lost its impossible order.');
  return toOrder(workbook, found).order;
}

test('the impossible order of the demo: what conflicts, and each of it is needed', async () => {
  const order = impossibleDemo();
  const ladder = await ladderOf(order);
  expect(ladder).toMatchObject({ stopped: 'finished', conflictProven: true });
  expect(ladder.noConflict).toBeUndefined();
  expect(ladder.conflict.map((demand) => demandInWords(demand, order))).toEqual([
    'Kinematic viscosity at 100 °C at most 4.3 mm²/s',
    'Noack volatility at most 8 % m/m',
    'ester at most 15 % of the mix',
  ]);
  await expectIrreducible(order, ladder);
});

test('what is within reach of it: no Noack volatility of 10, but 11 (source: the scenario, found by an earlier slice search)', async () => {
  const order = impossibleDemo();
  const ladder = await ladderOf(order);
  const noack = ladder.reach.find(({ limit }) => order.limits[limit].property === 'noack');
  expect(noack?.reachable).toBeGreaterThan(10);
  expect(noack?.reachable).toBeLessThanOrEqual(11);
  expect(ladder.reach).toHaveLength(5);
  // Neither a lower viscosity index nor a milder pour point helps.
  expect(ladder.reach.filter(({ reachable }) => reachable !== undefined)).toHaveLength(2);
  await expectReach(order, ladder);
});

test('its relaxations give proven recipes', async () => {
  const order = impossibleDemo();
  const ladder = await ladderOf(order);
  expect(ladder.relaxations.length).toBeGreaterThanOrEqual(2);
  await expectRelaxations(order, ladder);
});

test('weights change which relaxation comes first', async () => {
  const order = impossibleDemo();
  const noack = order.limits.findIndex(({ property }) => property === 'noack');
  const plain = await ladderOf(order);
  expect(plain.relaxations[0].changes.map(({ limit }) => limit)).toEqual([noack]);
  const weights = { [noack]: 100 };
  const weighted = await ladderOf(order, { weights });
  expect(weighted.relaxations[0].changes.map(({ limit }) => limit)).toEqual([0]);
  await expectRelaxations(order, weighted, weights);
});
