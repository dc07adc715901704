import { describe, expect, test } from 'vitest';
import { explainRecipe, type Order, type Stock, solveBlend } from '../../../src/index';

/** Source of every figure here: hand calculation. Sulphur averages by mass. */
function oil(id: string, sulphur: number, pricePerTonne: number): Stock {
  const figures = [{ property: 'sulphur', value: sulphur, origin: 'measured' as const }];
  return { id, name: id, family: 'Group I', pricePerTonne, figures };
}

const CHEAP = oil('cheap', 1000, 800);
const CLEAN = oil('clean', 100, 1200);
const BETWEEN = oil('between', 400, 1300);

async function explain(order: Order) {
  const outcome = await solveBlend(order);
  return { outcome, explanation: await explainRecipe(order, outcome) };
}

describe('a cheap and a clean oil under a sulphur limit of 400 mg/kg', () => {
  const order: Order = { stocks: [CHEAP, CLEAN, BETWEEN], limits: [{ property: 'sulphur', max: 400 }] };

  // x · 1000 + (1 - x) · 100 = 400: x = 1/3, cost 800/3 + 2/3 · 1200 = 1066.67.
  test('the limit costs 400/900 a mg/kg; without it all is the cheap oil', async () => {
    const { outcome, explanation } = await explain(order);
    expect(outcome.costPerTonne).toBeCloseTo(3200 / 3, 6);
    expect(explanation.limits).toHaveLength(1);
    const [price] = explanation.limits;
    expect(price).toMatchObject({ limit: 0, end: 'max', stated: 400, step: 2, proven: true });
    expect(price.looserSaves).toBeCloseTo(800 / 900, 6);
    expect(price.tighterCosts).toBeCloseTo(800 / 900, 6);
    expect(price.withoutSaves).toBeCloseTo(800 / 3, 6);
    // At 1000 mg/kg everything is saved, 300 steps; 315 steps still save 300/315 > 0.95 of their price, 316 do not.
    expect(price.holdsTo).toBe(1030);
  });

  test('the oil between comes in below what the two others cost at its sulphur', async () => {
    const { explanation } = await explain(order);
    expect(explanation.entries).toHaveLength(1);
    expect(explanation.entries[0]).toMatchObject({ stockId: 'between', pricePerTonne: 1300, proven: true });
    expect(explanation.entries[0].entersBelow).toBeCloseTo(3200 / 3, 4);
  });

  test('the recipe stands until an oil is as dear as the clean one, or the two as dear as the one between', async () => {
    const { explanation } = await explain(order);
    const [cheap, clean] = explanation.used;
    expect(cheap).toMatchObject({ stockId: 'cheap', impossibleWithout: false, proven: true });
    // The limit holds the cheap oil to a third however cheap; at 1200 the clean oil alone is as good.
    expect(cheap.standsFrom).toBeUndefined();
    expect(cheap.standsTo).toBeCloseTo(1200, 4);
    expect(cheap.lossCosts).toBeCloseTo(1200 - 3200 / 3, 6);
    // 800/3 + 2/3 · p = 1300 at p = 1550; at 800 the clean oil replaces the cheap one.
    expect(clean.standsFrom).toBeCloseTo(800, 4);
    expect(clean.standsTo).toBeCloseTo(1550, 4);
    expect(clean.lossCosts).toBeCloseTo(1300 - 3200 / 3, 6);
  });

  test('without the oil between the clean one cannot be missed, at no price', async () => {
    const { explanation } = await explain({ ...order, stocks: [CHEAP, CLEAN] });
    const clean = explanation.used.find((stock) => stock.stockId === 'clean');
    expect(clean).toMatchObject({ impossibleWithout: true, proven: true });
    expect(clean?.lossCosts).toBeUndefined();
    expect(clean?.standsTo).toBeUndefined();
  });
});

test('"below" and a margin stay where they are: the end moves as stated', async () => {
  // Strict below 411, one unit, with 10 inside: 400, the same recipe and prices.
  const order: Order = {
    stocks: [CHEAP, CLEAN],
    limits: [{ property: 'sulphur', below: 411, insideBy: 10 }],
  };
  const { outcome, explanation } = await explain(order);
  expect(outcome.costPerTonne).toBeCloseTo(3200 / 3, 6);
  expect(explanation.limits).toMatchObject([{ limit: 0, end: 'max', stated: 411, step: 2 }]);
  expect(explanation.limits[0].looserSaves).toBeCloseTo(800 / 900, 6);
  expect(explanation.limits[0].withoutSaves).toBeCloseTo(800 / 3, 6);
});

test('of two limits at the same place neither saves anything alone, each costs when tightened', async () => {
  const limits = [
    { property: 'sulphur', max: 400 },
    { property: 'sulphur', max: 400 },
  ];
  const { explanation } = await explain({ stocks: [CHEAP, CLEAN], limits });
  expect(explanation.limits.map((price) => price.limit)).toEqual([0, 1]);
  for (const price of explanation.limits) {
    expect(price).toMatchObject({ looserSaves: 0, withoutSaves: 0 });
    expect(price.holdsTo).toBeUndefined();
    expect(price.tighterCosts).toBeCloseTo(800 / 900, 6);
  }
});

test('a range without width: each end at its own side, tightening impossible', async () => {
  const { explanation } = await explain({
    stocks: [CHEAP, CLEAN],
    limits: [{ property: 'sulphur', min: 400, max: 400 }],
  });
  const [min, max] = explanation.limits;
  expect(min).toMatchObject({ end: 'min', looserSaves: 0, withoutSaves: 0, proven: true });
  expect(max).toMatchObject({ end: 'max', proven: true });
  expect(max.withoutSaves).toBeCloseTo(800 / 3, 6);
  expect(min.tighterCosts).toBeUndefined();
  expect(max.tighterCosts).toBeUndefined();
});

test('with whole drums a limit costs though the mix does not sit on it', async () => {
  // Drums of a tenth: at most 0.3 of the cheap oil under 430 mg/kg (370 mg/kg), and a step of 2 either way; 0.4 would be 460 mg/kg.
  const drum = { lotTonnes: 1 };
  const order: Order = {
    stocks: [
      { ...CHEAP, ...drum },
      { ...CLEAN, ...drum },
    ],
    limits: [{ property: 'sulphur', max: 430 }],
    batchTonnes: 10,
  };
  const { outcome, explanation } = await explain(order);
  expect(outcome.costPerTonne).toBeCloseTo(1080, 6);
  expect(outcome.checks[0].onLimit).toBe(false);
  expect(explanation.limits).toHaveLength(1);
  expect(explanation.limits[0]).toMatchObject({ looserSaves: 0, tighterCosts: 0, proven: true });
  expect(explanation.limits[0].withoutSaves).toBeCloseTo(280, 6);
});

test('cost per m³: savings per m³, prices of stocks per tonne', async () => {
  // Densities 800 and 1000 kg/m³: a tonne with a third of the cheap oil is 1/3 · 1.25 + 2/3 · 1 = 13/12 m³.
  const dense = (stock: Stock, density: number): Stock => ({
    ...stock,
    figures: [...stock.figures, { property: 'density', celsius: 15, value: density, origin: 'measured' }],
  });
  const order: Order = {
    stocks: [dense(CHEAP, 800), dense(CLEAN, 1000), dense(BETWEEN, 1000)],
    limits: [{ property: 'sulphur', max: 400 }],
    costBasis: 'cubic metre',
  };
  const { outcome, explanation } = await explain(order);
  const perCubicMetre = 3200 / 3 / (13 / 12);
  expect(outcome.objective).toBeCloseTo(perCubicMetre, 3);
  // All cheap: 800 / 1.25 = 640 per m³.
  expect(explanation.limits[0].withoutSaves).toBeCloseTo(perCubicMetre - 640, 3);
  // The oil between weighs a tonne per m³: it comes in where its tonne costs what a m³ of the recipe does.
  expect(explanation.entries[0].entersBelow).toBeCloseTo(perCubicMetre, 2);
});

test('a stock that is paid for being used up has an entry price and a range like any other', async () => {
  // A third of the slop: (-50 + 2 · 1200) / 3 = 783.33; it is worth using until it is as dear as the clean oil.
  const order: Order = {
    stocks: [oil('slop', 1000, -50), CLEAN, BETWEEN],
    limits: [{ property: 'sulphur', max: 400 }],
  };
  const { outcome, explanation } = await explain(order);
  expect(outcome.costPerTonne).toBeCloseTo(2350 / 3, 6);
  expect(explanation.entries[0].entersBelow).toBeCloseTo(2350 / 3, 4);
  const slop = explanation.used.find((stock) => stock.stockId === 'slop');
  expect(slop?.standsTo).toBeCloseTo(1200, 4);
  expect(slop?.standsFrom).toBeUndefined();
});

test('price steps move along with the price', async () => {
  // Three tonnes of nine at 700, the price from two tonnes on; as dear as the clean oil where that is 1200, at 1300.
  const stepped: Stock = { ...CHEAP, priceSteps: [{ fromTonnes: 2, pricePerTonne: 700 }] };
  const order: Order = {
    stocks: [stepped, CLEAN],
    limits: [{ property: 'sulphur', max: 400 }],
    batchTonnes: 9,
  };
  const { outcome, explanation } = await explain(order);
  expect(outcome.objective).toBeCloseTo(3100 / 3, 6);
  const cheap = explanation.used.find((stock) => stock.stockId === 'cheap');
  expect(cheap?.standsTo).toBeCloseTo(1300, 4);
  expect(cheap?.lossCosts).toBeCloseTo(500 / 3, 6);
});
