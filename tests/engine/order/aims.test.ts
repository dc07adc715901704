import { expect, test } from 'vitest';
import type { BlendOutcome, Limit, Order } from '../../../src/index';
import { plainOrder, shareOf, solved } from './plainOrder';

/** Volatility of the mix by hand: the mean of the stocks' figures by mass. */
function noackOf(order: Order, outcome: BlendOutcome): number {
  return order.stocks.reduce((sum, stock) => {
    const figure = stock.figures.find((entry) => entry.property === 'noack')?.value ?? Number.NaN;
    return sum + shareOf(outcome, stock.id) * figure;
  }, 0);
}

function withAim(...limits: Limit[]): Order {
  const order = plainOrder();
  return { ...order, limits: [...order.limits, ...limits] };
}

function warnsOfFirstOrder({ cautions }: BlendOutcome): boolean {
  return cautions.some(({ message }) => /first order/.test(message));
}

/** One reporting unit of volatility [% m/m]. */
const UNIT = 0.1;
const AIM = 9;

test.each([0.1, 1, 4, 30, 1000])(
  'volatility at %d a unit: the objective is cost and deviation, least and proven',
  async (weight) => {
    const order = withAim({ property: 'noack', aim: AIM, aimWeight: weight });
    const outcome = await solved(order);
    const { objective = Number.NaN, costPerTonne = Number.NaN, proof } = outcome;
    const counted = (weight * Math.abs(noackOf(order, outcome) - AIM)) / UNIT;
    expect(Math.abs(objective - (costPerTonne + counted))).toBeLessThan(1e-9 * objective);
    expect(proof.lowerBound).toBeLessThanOrEqual(objective * (1 + 1e-12));
    expect(warnsOfFirstOrder(outcome)).toBe(false);
    // Two mixes that any optimum must beat: the cheapest of all, and the cheapest on the aim.
    const careless = await solved(withAim({ property: 'noack', max: 60 }));
    const missed = Math.abs(noackOf(order, careless) - AIM) / UNIT;
    expect(objective).toBeLessThanOrEqual((careless.costPerTonne ?? 0) + weight * missed + 1e-3);
    const onAim = await solved(withAim({ property: 'noack', min: AIM, max: AIM }));
    expect(objective).toBeLessThanOrEqual((onAim.costPerTonne ?? 0) + 1e-3);
  },
);

test('in an order per m³ a deviation is counted per tonne, and turned into one per m³ with the cost', async () => {
  const order: Order = { ...withAim({ property: 'noack', aim: AIM, aimWeight: 4 }), costBasis: 'cubic metre' };
  const outcome = await solved(order);
  const { objective = Number.NaN, costPerTonne = Number.NaN, costPerCubicMetre = Number.NaN, proof } = outcome;
  const counted = (4 * Math.abs(noackOf(order, outcome) - AIM)) / UNIT;
  const tonnesPerCubicMetre = costPerCubicMetre / costPerTonne;
  expect(counted).toBeGreaterThan(1);
  expect(Math.abs(objective - (costPerTonne + counted) * tonnesPerCubicMetre)).toBeLessThan(1e-9 * objective);
  expect(proof.lowerBound).toBeLessThanOrEqual(objective * (1 + 1e-12));
});

test('a weak aim leaves the cheapest recipe, a strong one is met', async () => {
  const weak = withAim({ property: 'noack', aim: AIM, aimWeight: 1e-6 });
  const cheapest = await solved(withAim({ property: 'noack', max: 60 }));
  expect((await solved(weak)).costPerTonne).toBeCloseTo(cheapest.costPerTonne ?? 0, 2);
  const strong = withAim({ property: 'noack', aim: AIM, aimWeight: 1000 });
  expect(noackOf(strong, await solved(strong))).toBeCloseTo(AIM, 6);
});

test.each<[string, Limit]>([
  ['viscosity', { property: 'kv', celsius: 40, aim: 32 }],
  ['the pour point', { property: 'pourPoint', aim: -20 }],
])('an aim on %s is counted to first order, and says so', async (_, limit) => {
  expect(warnsOfFirstOrder(await solved(withAim(limit)))).toBe(true);
});

test('VG 46 within a tenth, aimed at its middle: the recipe comes to the middle', async () => {
  const order = plainOrder();
  // ISO 3448: the middle of VG 46 is 46 mm²/s at 40 °C, its ends 10 % either side.
  order.limits = [{ property: 'kv', celsius: 40, min: 41.4, max: 50.6, aim: 46, aimWeight: 100 }];
  const { checks } = await solved(order);
  expect(Math.abs(checks[0].value - 46)).toBeLessThan(0.05);
  const { checks: free } = await solved({ ...order, limits: [{ property: 'kv', celsius: 40, min: 41.4, max: 50.6 }] });
  expect(Math.abs(free[0].value - 46)).toBeGreaterThan(1);
});
