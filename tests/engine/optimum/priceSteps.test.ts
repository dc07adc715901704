import { expect, test } from 'vitest';
import { type Order, type Stock, solveBlend } from '../../../src/index';
import { Draw } from '../../oracle/mulberry32';
import { DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { enumerateSupports } from '../../oracle/supports';
import { caseOf, disagreements, seeds } from './judge';

const BATCH = 10;

/** Two stocks of an order get cheaper with the quantity. */
function withSteps(order: Order, draw: Draw, kind: NonNullable<Stock['priceStepsFor']>): Order {
  const stepped = new Set(draw.shuffled(order.stocks).slice(0, 2));
  const stocks = order.stocks.map((stock): Stock => {
    if (!stepped.has(stock)) return stock;
    const first = draw.between(0.5, 3);
    const price = Math.abs(stock.pricePerTonne);
    return {
      ...stock,
      priceStepsFor: kind,
      priceSteps: [
        { fromTonnes: first, pricePerTonne: price * draw.between(0.85, 0.97) },
        { fromTonnes: first + draw.between(0.5, 3), pricePerTonne: price * draw.between(0.6, 0.84) },
      ],
    };
  });
  return { ...order, batchTonnes: BATCH, stocks };
}

/** Every way to settle on which stretch of its price each stock is bought, and what that costs beside the price. */
function settled(order: Order): { order: Order; fixed: number }[] {
  let ways: { stocks: Stock[]; doses: NonNullable<Order['doses']>; fixed: number }[] = [
    { stocks: [], doses: [...(order.doses ?? [])], fixed: 0 },
  ];
  for (const { priceSteps = [], priceStepsFor, ...stock } of order.stocks) {
    const points = [{ fromTonnes: 0, pricePerTonne: stock.pricePerTonne }, ...priceSteps];
    // Worked by hand: what the tonnes before a step cost more than at the step's price.
    let extra = 0;
    const stretches = points.map(({ fromTonnes, pricePerTonne }, place) => {
      if (place > 0 && priceStepsFor === 'the excess')
        extra += (points[place - 1].pricePerTonne - pricePerTonne) * fromTonnes;
      const to = points[place + 1]?.fromTonnes ?? BATCH;
      return { from: fromTonnes, to, pricePerTonne, fixed: extra / BATCH };
    });
    ways = ways.flatMap((way) =>
      stretches.map(({ from, to, pricePerTonne, fixed }) => ({
        stocks: [
          ...way.stocks,
          { ...stock, pricePerTonne, greatestDose: Math.min(stock.greatestDose ?? 1, to / BATCH) },
        ],
        doses: from > 0 ? [...way.doses, { stockId: stock.id, min: from / BATCH }] : way.doses,
        fixed: way.fixed + fixed,
      })),
    );
  }
  return ways.map(({ stocks, doses, fixed }) => ({ order: { ...order, stocks, doses }, fixed }));
}

test.each(['all tonnes', 'the excess'] as const)('price steps for %s: as by trying every stretch', async (kind) => {
  const found: string[] = [];
  let solved = 0;
  let matters = 0;
  for (const seed of seeds(16, 5001)) {
    const order = randomOrder(seed, { ...DISCRETE, rules: false, choices: seed % 2 === 0, stocks: [3, 4] });
    const stepped = withSteps(order, new Draw(seed), kind);
    let best: { status: 'solved' | 'impossible'; cost: number } = { status: 'impossible', cost: Infinity };
    for (const { order: plain, fixed } of settled(stepped)) {
      const answer = enumerateSupports(plain);
      expect(answer.status).not.toBe('undecided');
      if (answer.status === 'solved' && answer.cost + fixed < best.cost) {
        best = { status: 'solved', cost: answer.cost + fixed };
      }
    }
    if (best.status === 'solved') solved++;
    if (best.cost < enumerateSupports({ ...order, batchTonnes: BATCH }).cost * (1 - 1e-4)) matters++;
    const entry = caseOf(`seed ${seed}`, stepped, best);
    if (entry) found.push(...(await disagreements(solveBlend, [entry])));
  }
  expect(found).toEqual([]);
  expect(solved).toBeGreaterThan(5);
  expect(matters).toBeGreaterThan(3);
});

test('a price for all tonnes that rises is refused, with what to do', async () => {
  const order = randomOrder(1, { ...DISCRETE, choices: false });
  order.batchTonnes = BATCH;
  order.stocks[0].priceSteps = [{ fromTonnes: 1, pricePerTonne: order.stocks[0].pricePerTonne + 50 }];
  const { stopped, problems } = await solveBlend(order);
  expect(stopped).toBe('refused');
  expect(problems[0].message).toMatch(/cannot rise with the quantity.*excess/);
});
