import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type BlendOutcome, type Order, predictBlend, solveBlend } from '../../../src/index';
import { Draw } from '../../oracle/mulberry32';
import { CONTINUOUS, DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { randomStock } from '../../oracle/randomStock';

/** Twice the relative gap at which a search may stop, and a little for limits met to a millionth of a unit. */
const GAP = 4e-6;
const RUNS = Math.round(40 * Number(process.env.BASEWRIGHT_SEEDS ?? 1));

const orders = fc
  .record({ seed: fc.integer({ min: 1, max: 1_000_000 }), choices: fc.boolean() })
  .map(({ seed, choices }) => ({ seed, order: randomOrder(seed, choices ? DISCRETE : CONTINUOUS) }));

/** Least cost; infinite where it is proven that there is none. */
function leastCost({ proof, costPerTonne }: BlendOutcome): number {
  if (proof.kind === 'impossible') return Infinity;
  expect(proof.kind).toBe('least cost');
  return costPerTonne ?? Number.NaN;
}

function copy(order: Order): Order {
  return structuredClone(order);
}

/** Checks a property of orders with fixed seeds: the same orders on every machine. */
async function holds(seed: number, check: (order: Order, draw: Draw) => Promise<void>): Promise<void> {
  await fc.assert(
    fc.asyncProperty(orders, async ({ seed: orderSeed, order }) => check(order, new Draw(orderSeed))),
    { seed, numRuns: RUNS, endOnFailure: true },
  );
}

function notDearer(cost: number, than: number): void {
  if (than === Infinity) return;
  expect(cost).toBeLessThanOrEqual(than + GAP * Math.abs(than));
}

test('a recipe is on specification when predicted anew, costs what it says, and the bound is below it', async () => {
  await holds(1, async (order) => {
    const { recipe, checks, proof, costPerTonne } = await solveBlend(order);
    if (!recipe || costPerTonne === undefined) return;
    const { properties } = predictBlend(order.stocks, recipe, order);
    for (const check of checks) {
      expect(check.passes).toBe(true);
      const value = properties.find((p) => p.property === check.property && p.celsius === check.celsius)?.value;
      expect(Math.abs((value ?? Number.NaN) - check.value)).toBeLessThanOrEqual(1e-9 * Math.abs(check.value) + 1e-9);
    }
    expect(recipe.reduce((sum, line) => sum + line.massFraction, 0)).toBeCloseTo(1, 12);
    const price = (id: string) => order.stocks.find((stock) => stock.id === id)?.pricePerTonne ?? Number.NaN;
    expect(recipe.reduce((sum, line) => sum + line.massFraction * price(line.stockId), 0)).toBeCloseTo(costPerTonne, 6);
    expect(proof.lowerBound).toBeLessThanOrEqual(costPerTonne);
  });
});

test('the cost never rises when a limit is loosened', async () => {
  await holds(2, async (order, draw) => {
    const looser = copy(order);
    const limit = draw.pick(looser.limits);
    if (limit.min !== undefined) limit.min -= Math.abs(limit.min) * 0.03;
    if (limit.max !== undefined) limit.max += Math.abs(limit.max) * 0.03;
    notDearer(leastCost(await solveBlend(looser)), leastCost(await solveBlend(order)));
  });
});

test('the cost never rises when a stock is added', async () => {
  await holds(3, async (order, draw) => {
    const more = copy(order);
    more.stocks.push(randomStock(draw, 99));
    notDearer(leastCost(await solveBlend(more)), leastCost(await solveBlend(order)));
  });
});

test('the cost never rises when a price is cut', async () => {
  await holds(4, async (order, draw) => {
    const cheaper = copy(order);
    draw.pick(cheaper.stocks).pricePerTonne *= 0.9;
    notDearer(leastCost(await solveBlend(cheaper)), leastCost(await solveBlend(order)));
  });
});

test('the order of the stocks and limits changes nothing', async () => {
  await holds(5, async (order, draw) => {
    const turned = copy(order);
    turned.stocks = draw.shuffled(turned.stocks);
    const [a, b] = [await solveBlend(order), await solveBlend(turned)];
    expect(b.proof.kind).toBe(a.proof.kind);
    expect(b.recipe ?? []).toEqual(a.recipe ?? []);
    turned.limits = draw.shuffled(turned.limits);
    const [cost, again] = [leastCost(a), leastCost(await solveBlend(turned))];
    if (cost !== again) expect(Math.abs(again - cost)).toBeLessThanOrEqual(GAP * cost);
  });
});

test('prices times a factor give the cost times that factor', async () => {
  await holds(6, async (order, draw) => {
    const factor = draw.ratio(1e-3, 1e3);
    const scaled = copy(order);
    for (const stock of scaled.stocks) stock.pricePerTonne *= factor;
    const [cost, dear] = [leastCost(await solveBlend(order)), leastCost(await solveBlend(scaled))];
    if (cost === Infinity) expect(dear).toBe(Infinity);
    else expect(Math.abs(dear / factor - cost)).toBeLessThanOrEqual(GAP * cost);
  });
});

test('ten identical stocks are as good as one', async () => {
  await holds(7, async (order, draw) => {
    const plain = copy(order);
    plain.mostStocks = undefined;
    plain.shares = [];
    const one = draw.pick(plain.stocks);
    one.greatestDose = undefined;
    one.availableTonnes = undefined;
    one.leastDoseIfUsed = undefined;
    plain.doses = plain.doses?.filter((dose) => dose.stockId !== one.id);
    const many = copy(plain);
    for (let twin = 1; twin < 10; twin++) many.stocks.push({ ...structuredClone(one), id: `${one.id} twin ${twin}` });
    const [cost, again] = [leastCost(await solveBlend(plain)), leastCost(await solveBlend(many))];
    if (cost === Infinity) expect(again).toBe(Infinity);
    else expect(Math.abs(again - cost)).toBeLessThanOrEqual(GAP * cost);
  });
});

test('one stock alone that meets the limits is the answer, at its price', async () => {
  await holds(8, async (_, draw) => {
    const stock = randomStock(draw, 1);
    const kv100 = stock.figures.find((f) => f.property === 'kv' && f.celsius === 100)?.value ?? Number.NaN;
    const outcome = await solveBlend({
      stocks: [stock],
      limits: [{ property: 'kv', celsius: 100, min: kv100 * 0.99, max: kv100 * 1.01 }],
    });
    expect(outcome.recipe).toEqual([{ stockId: stock.id, massFraction: 1 }]);
    expect(outcome.costPerTonne).toBeCloseTo(stock.pricePerTonne, 9);
  });
});

test('the same order gives the same recipe twice', async () => {
  await holds(9, async (order) => {
    const [a, b] = [await solveBlend(order), await solveBlend(copy(order))];
    expect(b.recipe).toEqual(a.recipe);
  });
});
