import {
  type BlendOutcome,
  type Family,
  type Order,
  predictBlend,
  type Stock,
  type ViscosityPoint,
} from '../../../src';

/** An invented stock with the figures a chart needs. */
export function stockThrough(name: string, points: readonly ViscosityPoint[], family: Family = 'Group II'): Stock {
  return {
    id: name.toLowerCase().replaceAll(' ', '-'),
    name,
    family,
    pricePerTonne: 1000,
    figures: [
      { property: 'density', celsius: 15, value: 860, origin: 'typical' },
      ...points.map(({ celsius, kv }) => ({ property: 'kv', celsius, value: kv, origin: 'typical' as const })),
    ],
  };
}

export const THIN = stockThrough('Thin', [
  { celsius: 40, kv: 17.4 },
  { celsius: 100, kv: 3.95 },
]);

export const THICK = stockThrough('Thick', [
  { celsius: 40, kv: 398 },
  { celsius: 100, kv: 39.6 },
]);

/** An answer as the engine would give it, with these shares by mass. */
export function answered(stocks: Stock[], shares: number[], order: Partial<Order> = {}) {
  const recipe = stocks.map(({ id }, place) => ({ stockId: id, massFraction: shares[place] ?? 0 }));
  const asked: Order = { stocks, limits: [], ...order };
  const outcome: BlendOutcome = {
    stopped: 'finished',
    proof: { kind: 'least cost', gap: 0 },
    recipe,
    costPerTonne: 1000,
    properties: predictBlend(stocks, recipe, { viscosityRule: asked.viscosityRule }),
    checks: [],
    leftOut: [],
    cautions: [],
    problems: [],
    work: { nodes: 1, linearPrograms: 1, milliseconds: 1 },
  };
  return { order: asked, outcome };
}
