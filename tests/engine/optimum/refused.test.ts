import { describe, expect, test } from 'vitest';
import { type Order, solveBlend } from '../../../src/index';
import { BASE_OILS } from '../../oracle/demoStocks';
import { expectConsistent, without } from './consistency';

describe('refused: the order is no question, and the message says where', () => {
  const base = (): Order => ({
    stocks: structuredClone(BASE_OILS),
    limits: [{ property: 'kv', celsius: 100, min: 5.8, max: 6.2 }],
  });

  async function expectRefused(order: Order, path: (string | number)[], words: RegExp): Promise<void> {
    const outcome = await solveBlend(order);
    expectConsistent(outcome);
    expect(outcome.stopped).toBe('refused');
    expect(outcome.proof).toEqual({ kind: 'none' });
    const problem = outcome.problems.find((entry) => path.every((step, i) => entry.path[i] === step));
    expect(problem, JSON.stringify(outcome.problems)).toBeDefined();
    expect(problem?.message).toMatch(words);
  }

  test('a required stock with a missing figure names the cell', async () => {
    const order = base();
    order.stocks[7] = without(order.stocks[7], 'noack');
    order.limits.push({ property: 'noack', max: 12 });
    order.doses = [{ stockId: 'PAO 4', min: 0.1 }];
    await expectRefused(order, ['stocks', 'PAO 4', 'noack'], /PAO 4.*Noack/);
  });

  test('a required stock without KV40 in an order with a viscosity index names KV40', async () => {
    const order = base();
    order.stocks[7].figures = order.stocks[7].figures.filter((figure) => figure.celsius !== 40);
    order.limits.push({ property: 'vi', min: 100 });
    order.doses = [{ stockId: 'PAO 4', exactly: 0.1 }];
    await expectRefused(order, ['stocks', 'PAO 4', 'kv@40'], /PAO 4.*40 °C/);
  });

  test('no stocks', async () => {
    await expectRefused({ stocks: [], limits: [] }, ['stocks'], /no stocks/);
  });

  test('an unknown property', async () => {
    const order = base();
    order.limits.push({ property: 'smell', max: 3 });
    await expectRefused(order, ['limits', 1, 'property'], /smell/);
  });

  test.each(['min', 'max', 'insideBy'] as const)('a limit whose %s is no number', async (end) => {
    const order = base();
    order.limits[0] = { ...order.limits[0], [end]: Number.NaN };
    await expectRefused(order, ['limits', 0, end], /number/);
  });

  test('a price that is no number', async () => {
    const order = base();
    order.stocks[0].pricePerTonne = Number.NaN;
    await expectRefused(order, ['stocks', 'SN 150', 'pricePerTonne'], /SN 150/);
  });

  test('a figure that is no number', async () => {
    const order = base();
    order.stocks[0].figures[1].value = Number.NaN;
    await expectRefused(order, ['stocks', 'SN 150', 'kv@40'], /SN 150/);
  });

  test('a limit that contradicts itself', async () => {
    const order = base();
    order.limits[0] = { property: 'kv', celsius: 100, min: 6.2, max: 5.8 };
    await expectRefused(order, ['limits', 0], /6\.2.*5\.8/);
  });

  test('a viscosity index where no mix reaches KV100 = 2', async () => {
    const thin = structuredClone(BASE_OILS.slice(5, 6));
    thin[0].figures = [
      { property: 'density', celsius: 15, value: 800, origin: 'measured' },
      { property: 'kv', celsius: 40, value: 5.1, origin: 'measured' },
      { property: 'kv', celsius: 100, value: 1.7, origin: 'measured' },
    ];
    await expectRefused({ stocks: thin, limits: [{ property: 'vi', min: 90 }] }, ['limits', 0], /KV100.*2/);
  });

  test('a dose of a stock that is not there', async () => {
    const order = base();
    order.doses = [{ stockId: 'moonshine', exactly: 0.1 }];
    await expectRefused(order, ['doses', 0], /not in this order/);
  });

  test('options that are no numbers are the caller’s mistake', async () => {
    await expect(solveBlend(base(), { timeLimitMs: Number.NaN })).rejects.toThrow(RangeError);
    await expect(solveBlend(base(), { relativeGap: -1 })).rejects.toThrow(RangeError);
  });
});
