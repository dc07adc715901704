import { describe, expect, test } from 'vitest';
import { withoutStocks } from '../../../src/explain/withoutStocks';
import { type BlendOutcome, type Order, type ShareRule, solveBlend } from '../../../src/index';
import { plainOrder, solved } from '../order/plainOrder';

const uses = ({ recipe }: BlendOutcome, stockId: string) => recipe?.some((line) => line.stockId === stockId) ?? false;

/** The two greatest stocks of the plain order's cheapest recipe. */
async function greatestStocks(): Promise<[string, string]> {
  const { recipe = [] } = await solved(plainOrder());
  const [first, second] = [...recipe].sort((a, b) => b.massFraction - a.massFraction);
  return [first.stockId, second.stockId];
}

function withRule(...shares: ShareRule[]): Order {
  return { ...plainOrder(), shares };
}

describe('a stock is left out: what becomes of the rules that name it', () => {
  test('a share that only it could fill makes the order impossible', async () => {
    const [first] = await greatestStocks();
    const order = withRule({ kind: 'share', set: { stockIds: [first] }, min: 0.1 });
    expect((await solveBlend(withoutStocks(order, [first]))).proof.kind).toBe('impossible');
  });

  test('a share at most is kept by its absence', async () => {
    const [first] = await greatestStocks();
    const order = withRule({ kind: 'share', set: { stockIds: [first] }, max: 0.1 });
    const plain = await solved(withoutStocks(plainOrder(), [first]));
    expect((await solved(withoutStocks(order, [first]))).costPerTonne).toBeCloseTo(plain.costPerTonne ?? 0, 6);
  });

  test('a set keeps its other stocks', async () => {
    const [first, second] = await greatestStocks();
    const order = withRule({ kind: 'share', set: { stockIds: [first, second] }, max: 0.05 });
    const outcome = await solved(withoutStocks(order, [first]));
    expect(outcome.recipe?.find((line) => line.stockId === second)?.massFraction ?? 0).toBeLessThanOrEqual(0.05 + 1e-8);
  });

  test('what needs it goes with it; what it needs does not', async () => {
    const [first, second] = await greatestStocks();
    const order = withRule({ kind: 'needs', stockId: second, set: { stockIds: [first] } });
    expect(uses(await solved(withoutStocks(order, [first])), second)).toBe(false);
    const free = await solved(withoutStocks(plainOrder(), [second]));
    expect((await solved(withoutStocks(order, [second]))).costPerTonne).toBeCloseTo(free.costPerTonne ?? 0, 6);
  });

  test('what it excludes is free again', async () => {
    const [first, second] = await greatestStocks();
    const order = withRule({ kind: 'excludes', stockId: first, set: { stockIds: [second] } });
    const free = await solved(withoutStocks(plainOrder(), [first]));
    expect((await solved(withoutStocks(order, [first]))).costPerTonne).toBeCloseTo(free.costPerTonne ?? 0, 6);
  });

  test('a ratio to it leaves nothing to be a part of', async () => {
    const [first, second] = await greatestStocks();
    const order = withRule({ kind: 'ratio', set: { stockIds: [second] }, to: { stockIds: [first] }, max: 2 });
    expect(uses(await solved(withoutStocks(order, [first])), second)).toBe(false);
  });

  test('its dose goes with it, those of others stay; the order itself is untouched', async () => {
    const [first, second] = await greatestStocks();
    const order: Order = {
      ...plainOrder(),
      doses: [
        { stockId: first, max: 0.5 },
        { stockId: second, min: 0.07, required: false },
      ],
    };
    const before = structuredClone(order);
    expect(withoutStocks(order, [first]).doses).toEqual([order.doses?.[1]]);
    expect(order).toEqual(before);
  });
});
