import { describe, expect, test } from 'vitest';
import { type Order, solveBlend } from '../../../src/index';
import { unitOf } from '../../oracle/figures';
import { Draw } from '../../oracle/mulberry32';
import { CONTINUOUS, DISCRETE, type OrderShape, randomOrder } from '../../oracle/randomOrder';
import { seeds } from '../optimum/judge';
import { expectBound, expectIrreducible, expectReach, expectRelaxations, ladderOf, possibility } from './ladderChecks';

/** A possible order made impossible: one of its limits, or a cap on a stock it needs, drawn tighter and tighter. */
async function tightened(order: Order, draw: Draw): Promise<Order> {
  const copy = structuredClone(order);
  const { checks } = await solveBlend(copy);
  for (let turn = 0; turn < 12 && (await possibility(copy)) === 'possible'; turn++) {
    const limit = draw.pick(copy.limits);
    const value = checks.find((check) => check.limit === copy.limits.indexOf(limit))?.value ?? 0;
    const by = unitOf(limit) * draw.whole(3, 40);
    if (limit.max !== undefined) limit.max = Math.max(limit.min ?? -Infinity, Math.min(limit.max, value) - by);
    else if (limit.min !== undefined) limit.min = Math.max(limit.min, value) + by;
  }
  return copy;
}

async function impossibleOrders(from: number, count: number, shape: OrderShape): Promise<Order[]> {
  const orders: Order[] = [];
  for (const seed of seeds(count, from)) {
    const order = randomOrder(seed, shape);
    const found = await possibility(order);
    const made = found === 'possible' ? await tightened(order, new Draw(seed)) : order;
    if ((await possibility(made)) === 'impossible') orders.push(made);
  }
  return orders;
}

describe.each<[string, OrderShape, number, number]>([
  ['limits and shares', { ...CONTINUOUS, stocks: [3, 10] }, 7000, 20],
  ['choices too', { ...DISCRETE, stocks: [3, 5] }, 7140, 14],
])('random impossible orders: %s', (_, shape, from, count) => {
  test('conflict, reach and relaxations hold against a second way', async () => {
    const orders = await impossibleOrders(from, count, shape);
    expect(orders.length).toBeGreaterThan(count / 2);
    const seen = { within: 0, joint: 0, rule: 0, near: 0 };
    for (const [place, order] of orders.entries()) {
      const ladder = await ladderOf(order);
      expect(ladder.stopped).toBe('finished');
      if (ladder.noConflict) {
        expect(ladder.noConflict.why).toBe('no mix at all');
        continue;
      }
      await expectIrreducible(order, ladder);
      await expectReach(order, ladder);
      await expectRelaxations(order, ladder);
      await expectBound(order, ladder, new Draw(place));
      if (ladder.reach.some(({ reachable }) => reachable !== undefined)) seen.within++;
      if (ladder.relaxations.some(({ changes }) => changes.length > 1)) seen.joint++;
      if (ladder.conflict.some(({ kind }) => kind !== 'limit')) seen.rule++;
      if ((ladder.leastEffort ?? 0) >= 0.9 * (ladder.relaxations[0]?.effort ?? Infinity)) seen.near++;
    }
    expect(seen.within).toBeGreaterThan(3);
    expect(seen.joint).toBeGreaterThan(0);
    expect(seen.rule).toBeGreaterThan(0);
    expect(seen.near).toBeGreaterThan(orders.length / 2);
  }, 300_000);
});

test('a list of stocks in another order changes nothing', async () => {
  const orders = await impossibleOrders(7200, 12, { ...DISCRETE, stocks: [4, 6] });
  expect(orders.length).toBeGreaterThan(4);
  for (const [place, order] of orders.entries()) {
    const shuffled = { ...order, stocks: new Draw(place).shuffled(order.stocks) };
    expect(await ladderOf(shuffled)).toEqual(await ladderOf(order));
  }
});
