import { expect, test } from 'vitest';
import { demoWorkbook } from '../../app/demo/demoWorkbook';
import { type Order, solveBlend, toOrder } from '../../src/index';
import { sliceSearch } from '../oracle/sliceSearch';

const DRUMMED = ['pao-6-drums', 'polyol-ester-drums'];

function drumOrder(): Order {
  const workbook = demoWorkbook();
  const found = workbook.orders.find(({ id }) => id === 'vg-32-compressor');
  if (!found) throw new Error('The demo has no order in drums.');
  return toOrder(workbook, found).order;
}

/** The order with so many drums of each stock settled: nothing of whole drums or flush costs is left to choose. */
function withDrums(order: Order, counts: readonly number[]): { order: Order; flush: number } {
  const batch = Number(order.batchTonnes);
  let flush = 0;
  const doses = [...(order.doses ?? [])];
  const stocks = order.stocks.map(({ lotTonnes, flushCost, leastDoseIfUsed, ...stock }) => {
    const count = counts[DRUMMED.indexOf(stock.id)];
    if (count === undefined || lotTonnes === undefined) return stock;
    if (count === 0) return { ...stock, greatestDose: 0 };
    doses.push({ stockId: stock.id, exactly: (count * lotTonnes) / batch });
    flush += (flushCost ?? 0) / batch;
    return stock;
  });
  return { order: { ...order, stocks, doses }, flush };
}

test('package, least doses, drums, flush costs and at most five stocks: as by trying every number of drums', async () => {
  const order = drumOrder();
  const outcome = await solveBlend(order);
  expect(outcome.stopped).toBe('finished');
  expect(outcome.proof.kind).toBe('least cost');
  let least = Infinity;
  let possible = 0;
  for (let pao = 0; pao <= 12; pao++) {
    for (let ester = 0; ester <= 2; ester++) {
      const { order: settled, flush } = withDrums(order, [pao, ester]);
      // HiGHS over slices of KV100, one number of drums after the other: no code of the search is shared.
      const answer = sliceSearch(settled);
      expect(answer.status).not.toBe('undecided');
      if (answer.status !== 'solved') continue;
      possible++;
      least = Math.min(least, answer.cost + flush);
    }
  }
  expect(possible).toBeGreaterThan(3);
  expect(outcome.costPerTonne).toBeCloseTo(least, 2);
  for (const id of DRUMMED) {
    const stock = order.stocks.find((candidate) => candidate.id === id);
    const share = outcome.recipe?.find((line) => line.stockId === id)?.massFraction ?? 0;
    const drums = (share * Number(order.batchTonnes)) / (stock?.lotTonnes ?? Number.NaN);
    expect(drums).toBeCloseTo(Math.round(drums), 6);
    expect(drums).toBeGreaterThan(0);
  }
});
