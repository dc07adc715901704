import { describe, expect, it } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import { productsToKeepOut, stocksToKeepOut } from '../../../app/explain/takeAlternative';
import { type Alternative, alternatives, type Order, type Product, solveBlend, toOrder } from '../../../src';
import { mixOf } from '../answer/answers';

const using = (...stockIds: string[]): Alternative => ({
  recipe: stockIds.map((stockId) => ({ stockId, massFraction: 1 / stockIds.length })),
  costPerTonne: 1,
  dearerBy: 1,
  without: [],
  instead: [],
  proven: true,
});

describe('the stocks to keep out for another recipe', () => {
  it('are those of every cheaper recipe that it does without', () => {
    const list = [using('light', 'third'), using('light', 'fourth')];
    expect(stocksToKeepOut(mixOf(), list, 0)).toEqual(['heavy']);
    expect(stocksToKeepOut(mixOf(), list, 1)).toEqual(['heavy', 'third']);
  });

  it('make it the cheapest: each of the demo’s other recipes, solved again without them', async () => {
    const workbook = demoWorkbook();
    const found = workbook.orders.find(({ id }) => id === 'driveline-6');
    if (!found) throw new Error('The demo has no such order.');
    const { order } = toOrder(workbook, found);
    const outcome = await solveBlend(order);
    const { list } = await alternatives(order, outcome);
    expect(list.length).toBeGreaterThan(2);
    for (const [place, { costPerTonne }] of list.entries()) {
      const out = productsToKeepOut(workbook.products, stocksToKeepOut(outcome, list, place), []) ?? [];
      const without: Order = toOrder(workbook, {
        ...found,
        excludedProductIds: [...found.excludedProductIds, ...out],
      }).order;
      const again = await solveBlend(without);
      expect(again.costPerTonne).toBeCloseTo(costPerTonne, 2);
    }
  });
});

describe('the products to keep out', () => {
  const lot = (id: string) => ({ id, name: id, figures: [] });
  const products: Product[] = [
    { id: 'a', name: 'A', family: 'PAO', figures: [], lots: [lot('a-1'), lot('a-2')] },
    { id: 'b', name: 'B', family: 'PAO', figures: [], lots: [lot('b-1')] },
  ];

  it('are those of the stocks, be they products or lots', () => {
    expect(productsToKeepOut(products, ['a'], ['b'])).toEqual(['a']);
    expect(productsToKeepOut(products, ['a-1', 'a-2'], ['b-1'])).toEqual(['a']);
  });

  it('cannot tell one lot of a product from another', () => {
    expect(productsToKeepOut(products, ['a-1'], ['a-2', 'b-1'])).toBeUndefined();
  });
});
