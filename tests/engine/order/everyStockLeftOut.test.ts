import { expect, test } from 'vitest';
import { solveBlend } from '../../../src/index';
import { expectConsistent, without } from '../optimum/consistency';
import { plainOrder } from './plainOrder';

test('every figure unknown: impossible with known figures, every stock named', async () => {
  const order = plainOrder();
  order.stocks = order.stocks.map((stock) => without(stock, 'noack'));
  order.limits.push({ property: 'noack', max: 12 });
  const outcome = await solveBlend(order);
  expectConsistent(outcome);
  expect(outcome).toMatchObject({ stopped: 'finished', proof: { kind: 'impossible with known figures' } });
  expect(outcome.leftOut.map((entry) => entry.stockId).sort()).toEqual(order.stocks.map((stock) => stock.id).sort());
  expect(outcome.conflictRules).toEqual([expect.stringMatching(/no stock/)]);
});

test('no stock carries the flag: impossible, whatever the figures', async () => {
  const order = plainOrder();
  order.shares = [{ kind: 'flag', flag: 'food contact' }];
  const outcome = await solveBlend(order);
  expectConsistent(outcome);
  expect(outcome).toMatchObject({ stopped: 'finished', proof: { kind: 'impossible' } });
  expect(outcome.leftOut.every((entry) => entry.reason === 'missing flag')).toBe(true);
  expect(outcome.leftOut).toHaveLength(order.stocks.length);
});
