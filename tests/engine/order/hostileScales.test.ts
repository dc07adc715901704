import { expect, test } from 'vitest';
import { type Order, solveBlend } from '../../../src/index';
import { demoStock } from './plainOrder';

/** Quantities far from a plant's usual ones. Expected values by hand. */

test('a drum larger than the batch cannot be used, not even for a trace', async () => {
  const [clean, sulphurous] = [demoStock('PAO 6'), demoStock('SN 150')];
  const order: Order = {
    stocks: [
      { ...clean, pricePerTonne: 2000 },
      { ...sulphurous, pricePerTonne: 100, lotTonnes: 0.2 },
    ],
    limits: [],
    batchTonnes: 0.005,
  };
  const outcome = await solveBlend(order);
  expect(outcome.recipe).toEqual([{ stockId: clean.id, massFraction: 1 }]);
  expect(outcome.costPerTonne).toBe(2000);
});

test.each([
  [1 / 3, 1],
  [0.1234567, 1.234567],
  [0.1000004, 1.000004],
])('drums of %f t make a batch of %f t, though neither is a whole number of grams', async (lotTonnes, batchTonnes) => {
  const order: Order = { stocks: [{ ...demoStock('PAO 6'), lotTonnes }], limits: [], batchTonnes };
  expect((await solveBlend(order)).proof.kind).toBe('least cost');
});

test('a price step is reached by a share that misses it by a rounding: the cost told is the cost proven', async () => {
  const stock = { ...demoStock('PAO 6'), pricePerTonne: 2000 };
  for (const from of [0.20898849899, 0.333333333333, 0.1]) {
    const order: Order = {
      stocks: [
        { ...stock, priceSteps: [{ fromTonnes: from, pricePerTonne: 1500 }] },
        { ...demoStock('SN 150'), id: 'cheap', pricePerTonne: 900 },
      ],
      limits: [],
      doses: [{ stockId: stock.id, min: from * (1 - 1e-9) }],
      batchTonnes: 1,
    };
    const { objective, costPerTonne } = await solveBlend(order);
    // Up to the step the stock costs 2000, from it on 1500: it is bought at the step.
    expect(costPerTonne).toBeCloseTo(from * 1500 + (1 - from) * 900, 4);
    expect(costPerTonne).toBeCloseTo(objective ?? Number.NaN, 4);
  }
});

test('a flush that nobody pays does not blunt the gap', async () => {
  const stocks = ['PAO 4', 'PAO 6', 'PAO 40'].map((id) => ({ ...demoStock(id), flushCost: 0.001 }));
  const order: Order = {
    stocks: [...stocks, { ...demoStock('SN 500'), flushCost: 1e8 }],
    limits: [{ property: 'kv', celsius: 100, min: 7.9, max: 8.1 }],
    batchTonnes: 0.01,
  };
  const dear = await solveBlend(order);
  const plain = await solveBlend({ ...order, stocks });
  expect(dear.proof.kind).toBe('least cost');
  expect(dear.proof.gap).toBeLessThan(1e-6);
  expect(dear.costPerTonne).toBeCloseTo(plain.costPerTonne ?? Number.NaN, 2);
});

test('a dose of more tonnes than the batch, or of next to nothing, is refused where it stands', async () => {
  const stocks = [demoStock('PAO 4'), demoStock('PAO 6')];
  const order: Order = { stocks, limits: [], batchTonnes: 1 };
  const [id] = [stocks[0].id];
  const much = await solveBlend({ ...order, doses: [{ stockId: id, exactly: 5, unit: 'tonnes' }] });
  expect(much.problems).toEqual([
    { path: ['doses', 0], message: expect.stringMatching(/5 t are more than the batch of 1 t/) },
  ]);
  const little = await solveBlend({ ...order, doses: [{ stockId: id, exactly: 1e-9 }] });
  expect(little.problems).toEqual([{ path: ['doses', 0], message: expect.stringMatching(/is no dose/) }]);
});
