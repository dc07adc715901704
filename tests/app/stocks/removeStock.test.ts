import { beforeEach, expect, it } from 'vitest';
import { useView } from '../../../app/state/viewStore';
import { undo, useWorkbook } from '../../../app/state/workbookStore';
import { removeStock } from '../../../app/stocks/removeStock';
import { emptyOrder, missingInRule, toOrder } from '../../../src';
import { inventedStock, putStocksOnPage } from './stocksOnPage';

const FIRST = {
  ...emptyOrder('first', 'First'),
  excludedProductIds: ['b'],
  doses: [
    { stockId: 'a', exactly: 0.02 },
    { stockId: 'b', max: 0.3 },
  ],
  shares: [
    { kind: 'share' as const, set: { stockIds: ['a', 'b'] }, max: 0.5 },
    { kind: 'ratio' as const, set: { families: ['PAO' as const] }, to: { stockIds: ['a'] }, min: 1 },
    { kind: 'excludes' as const, stockId: 'a', set: { flag: 'no zinc' } },
  ],
};
const SECOND = {
  ...emptyOrder('second', 'Second'),
  excludedProductIds: ['a', 'b'],
  doses: [{ stockId: 'a', min: 0.1 }],
};

beforeEach(() => putStocksOnPage([inventedStock('a'), inventedStock('b')], { orders: [FIRST, SECOND] }));

const workbook = () => useWorkbook.getState().workbook;

it('takes the stock out of doses, rules and exclusions of all orders, as one step, and says so', () => {
  const before = workbook();
  removeStock('a');
  expect(JSON.stringify(workbook())).not.toContain('"a"');
  expect(workbook().orders[0]?.doses).toEqual([{ stockId: 'b', max: 0.3 }]);
  expect(workbook().orders[0]?.shares[0]).toMatchObject({ set: { stockIds: ['b'] } });
  expect(workbook().orders[1]).toMatchObject({ doses: [], excludedProductIds: ['b'] });
  expect(useView.getState().message).toBe(
    "Stock a removed, also from 2 orders' doses and one order's rules. Undo brings it back.",
  );
  undo();
  expect(workbook()).toEqual(before);
  expect(useWorkbook.getState().canUndo).toBe(false);
});

it('leaves a rule without its stock unfinished, never with an id that nothing bears', () => {
  removeStock('a');
  const [, ratio, excludes] = workbook().orders[0]?.shares ?? [];
  expect(ratio && missingInRule(ratio)).toMatch(/Choose the stocks/);
  expect(excludes && missingInRule(excludes)).toMatch(/Choose the stock;/);
  const [, second] = workbook().orders;
  expect(second && JSON.stringify(toOrder(workbook(), second))).not.toContain('"a"');
});

it('says nothing of orders that do not name the stock', () => {
  removeStock('b');
  expect(useView.getState().message).toMatch(/^Stock b removed, also from one order's doses and one order's rules\./);
  undo();
  putStocksOnPage([inventedStock('c')]);
  removeStock('c');
  expect(useView.getState().message).toBe('Stock c removed. Undo brings it back.');
});
