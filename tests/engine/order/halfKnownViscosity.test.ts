import { expect, test } from 'vitest';
import { type Order, predictBlend, type Stock, solveBlend, type ViscosityRule } from '../../../src/index';
import { asTheRest, demoStock, plainOrder, shareOf, solved } from './plainOrder';

/** A cheap oil with KV40 stated and KV100 taken from the rest. */
function halfKnown(): Stock {
  const stock = demoStock('Group III 6');
  const figures = stock.figures.map((figure) =>
    figure.property === 'kv' && figure.celsius === 100 ? asTheRest('kv', 100) : figure,
  );
  return { ...stock, id: 'half', name: 'Half-known oil', pricePerTonne: 100, figures };
}

function ordered(viscosityRule: ViscosityRule, limits: Order['limits']): Order {
  return { stocks: [...plainOrder().stocks, halfKnown()], limits, viscosityRule };
}

const AT_40 = [{ property: 'kv', celsius: 40, min: 36, max: 37 }];

test.each<ViscosityRule>(['walther', 'refutas', 'logarithmic', 'cube root'])(
  'under the %s rule a stated KV40 counts, whatever stands at 100 °C',
  async (rule) => {
    const outcome = await solved(ordered(rule, AT_40));
    expect(outcome.leftOut).toEqual([]);
    expect(shareOf(outcome, 'half')).toBeCloseTo(1, 6);
    expect(outcome.checks[0].value).toBeCloseTo(36.5, 6);
  },
);

test('a mix is predicted with the stated KV40, not with that of the rest', () => {
  const thin = demoStock('PAO 4');
  const recipe = [
    { stockId: 'half', massFraction: 0.5 },
    { stockId: thin.id, massFraction: 0.5 },
  ];
  const { properties } = predictBlend([halfKnown(), thin], recipe, { viscosityRule: 'logarithmic' });
  const kv40 = properties.find((entry) => entry.property === 'kv' && entry.celsius === 40);
  expect(kv40?.asTheRest).toEqual([]);
  expect(kv40?.value).toBeGreaterThan(24);
  expect(kv40?.value).toBeLessThan(27);
});

test('the Wright method needs both temperatures: the stock is left out by name', async () => {
  const outcome = await solved(ordered('wright', AT_40));
  expect(outcome.leftOut).toMatchObject([{ stockId: 'half', reason: 'unknown figure', property: 'kv', celsius: 100 }]);
  expect(outcome.leftOut[0].message).toMatch(/^Half-known oil:.*40 °C.*100 °C/);
  expect(shareOf(outcome, 'half')).toBe(0);
});

test.each<ViscosityRule>(['wright', 'walther', 'logarithmic'])(
  'for a viscosity index, under the %s rule, it is left out by name too',
  async (rule) => {
    const outcome = await solved(ordered(rule, [...AT_40, { property: 'vi', min: 100 }]));
    expect(outcome.leftOut.map((entry) => entry.stockId)).toEqual(['half']);
    expect(outcome.leftOut[0].message).toMatch(/^Half-known oil:/);
  },
);

test('a limit on viscosity without a temperature is refused', async () => {
  const outcome = await solveBlend({ ...plainOrder(), limits: [{ property: 'kv', min: 5, max: 6 }] });
  expect(outcome.stopped).toBe('refused');
  expect(outcome.problems).toMatchObject([
    { path: ['limits', 0, 'celsius'], message: expect.stringMatching(/temperature/) },
  ]);
});
