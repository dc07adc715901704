import type { BlendOutcome, Order, Stock } from '../../../src';

/** Invented stocks with round figures, so that what follows can be worked out by hand. */
export const LIGHT: Stock = {
  id: 'light',
  name: 'Light oil',
  family: 'Group III',
  pricePerTonne: 1000,
  availableTonnes: 20,
  figures: [
    { property: 'kv', celsius: 40, value: 20, origin: 'typical' },
    { property: 'kv', celsius: 100, value: 4, origin: 'typical' },
    { property: 'density', celsius: 15, value: 800, origin: 'typical' },
  ],
};

export const HEAVY: Stock = {
  id: 'heavy',
  name: 'Heavy oil',
  family: 'PAO',
  pricePerTonne: 3000,
  figures: [
    { property: 'kv', celsius: 40, value: 400, origin: 'typical' },
    { property: 'kv', celsius: 100, value: 40, origin: 'typical' },
    { property: 'density', celsius: 15, value: 900, origin: 'typical' },
  ],
};

export function orderOf(change: Partial<Order> = {}): Order {
  return { stocks: [LIGHT, HEAVY], limits: [], viscosityRule: 'wright', ...change };
}

/** An outcome without a recipe. */
export function outcomeOf(change: Partial<BlendOutcome> = {}): BlendOutcome {
  return {
    stopped: 'finished',
    proof: { kind: 'none' },
    checks: [],
    leftOut: [],
    cautions: [],
    problems: [],
    work: { nodes: 1, linearPrograms: 1, milliseconds: 1 },
    ...change,
  };
}

/** Three quarters of the light oil and a quarter of the heavy one: 1500 a tonne. */
export function mixOf(change: Partial<BlendOutcome> = {}): BlendOutcome {
  return outcomeOf({
    proof: { kind: 'least cost', lowerBound: 1500, gap: 0 },
    recipe: [
      { stockId: 'heavy', massFraction: 0.25 },
      { stockId: 'light', massFraction: 0.75 },
    ],
    costPerTonne: 1500,
    costPerCubicMetre: 1234.29,
    properties: {
      properties: [
        known('kv', 38.12, 40),
        known('kv', 6.67, 100),
        known('vi', 132.4),
        // 0.25/900 + 0.75/800 m³ a kilogram.
        known('density', 822.857142857, 15),
        { property: 'noack', unknownFrom: ['heavy'], asTheRest: [], estimatedFrom: [] },
      ],
      volumeFractions: [0.228571428571, 0.771428571429],
      spread: [
        {
          property: 'kv',
          celsius: 40,
          byRule: [
            { rule: 'wright', value: 38.12 },
            { rule: 'walther', value: 35.5 },
            { rule: 'refutas', value: 36.2 },
            { rule: 'logarithmic', value: 42.3 },
            { rule: 'cube root', value: 61 },
          ],
        },
      ],
    },
    ...change,
  });
}

function known(property: string, value: number, celsius?: number) {
  const at = celsius === undefined ? {} : { celsius };
  return { property, ...at, value, unknownFrom: [], asTheRest: [], estimatedFrom: [] };
}
