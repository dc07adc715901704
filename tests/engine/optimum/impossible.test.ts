import { describe, expect, test } from 'vitest';
import { type Order, type Stock, solveBlend } from '../../../src/index';
import { BASE_OILS } from '../../oracle/demoStocks';
import { sliceSearch } from '../../oracle/sliceSearch';
import { demo, expectConsistent, without } from './consistency';

describe('impossible', () => {
  test('with every figure known', async () => {
    const outcome = await solveBlend(demo('impossible at 10'));
    expectConsistent(outcome);
    expect(outcome).toMatchObject({ stopped: 'finished', proof: { kind: 'impossible' }, leftOut: [] });
    expect(outcome.conflict?.length).toBeGreaterThan(0);
  });

  test('with the figures that are known: the stock left out is named', async () => {
    const order = demo('impossible at 10');
    const ester = order.stocks.findIndex((stock) => stock.family === 'ester');
    order.stocks[ester] = without(order.stocks[ester], 'noack');
    const outcome = await solveBlend(order);
    expectConsistent(outcome);
    expect(outcome).toMatchObject({ stopped: 'finished', proof: { kind: 'impossible with known figures' } });
    expect(outcome.leftOut).toMatchObject([{ stockId: 'polyol ester', reason: 'unknown figure', property: 'noack' }]);
  });

  test('limits of two kinds that exclude each other', async () => {
    const outcome = await solveBlend({
      stocks: BASE_OILS,
      limits: [
        { property: 'kv', celsius: 100, max: 4 },
        { property: 'kv', celsius: 40, min: 60 },
      ],
    });
    expect(outcome.proof.kind).toBe('impossible');
    expect(outcome.conflict).toEqual([0, 1]);
  });

  test('doses of more than the whole', async () => {
    const doses = [
      { stockId: 'PAO 4', exactly: 0.6 },
      { stockId: 'PAO 6', exactly: 0.5 },
    ];
    const outcome = await solveBlend({ stocks: BASE_OILS, limits: [], doses });
    expectConsistent(outcome);
    expect(outcome.proof.kind).toBe('impossible');
  });
});

test('a stock thinner than KV100 = 2 is an ordinary part of a mix with a viscosity index', async () => {
  const spindle: Stock = {
    ...structuredClone(BASE_OILS[0]),
    id: 'spindle oil',
    pricePerTonne: 300,
    figures: [
      { property: 'density', celsius: 15, value: 845, origin: 'measured' },
      { property: 'kv', celsius: 40, value: 5.2, origin: 'measured' },
      { property: 'kv', celsius: 100, value: 1.7, origin: 'measured' },
    ],
  };
  const order: Order = {
    stocks: [...BASE_OILS, spindle],
    limits: [
      { property: 'kv', celsius: 100, min: 3, max: 3.4 },
      { property: 'vi', min: 95 },
    ],
  };
  const outcome = await solveBlend(order);
  expect(outcome.recipe?.map((line) => line.stockId)).toContain('spindle oil');
  expect(Math.abs((outcome.costPerTonne ?? 0) / sliceSearch(order).cost - 1)).toBeLessThan(5e-6);
});
