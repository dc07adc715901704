import type { Limit, Order, Recipe, Stock } from '../../src/index';
import { endsOf, pour, seen, unitOf } from './figures';
import { INDEX_RULES, indexOnLine, VISCOSITY_INDEX, viscosityTerm } from './indices';
import { viOf } from './viscosityIndex';
import { invert } from './walther';

interface Part {
  stock: Stock;
  x: number;
}

function viscosityAt(parts: readonly Part[], celsius: number, rule: string): number {
  const index = VISCOSITY_INDEX[rule];
  let weight = 0;
  let sum = 0;
  for (const { stock, x } of parts) {
    const [kv40, kv100, density] = [seen(stock, 'kv', 40), seen(stock, 'kv', 100), seen(stock, 'density')];
    if (typeof kv40 !== 'object' || typeof kv100 !== 'object' || typeof density !== 'object') continue;
    const blendWeight = stock.blendWeight ?? 1;
    const term = viscosityTerm(rule, { kv40: kv40.value, kv100: kv100.value, density: density.value, blendWeight });
    weight += x * term.weight;
    sum += x * term.weight * indexOnLine(term.index40, term.index100, celsius);
  }
  return invert(index, sum / weight);
}

/** The value of a limited property, by the oracle's own formulas. */
export function mixValue(order: Order, parts: readonly Part[], limit: Limit): number {
  const rule = order.viscosityRule ?? 'wright';
  if (limit.property === 'kv') return viscosityAt(parts, limit.celsius ?? 100, rule);
  if (limit.property === 'vi') {
    const kv100 = viscosityAt(parts, 100, rule);
    // A mix on the lower end of D2270 may lie a rounding below it.
    return viOf(viscosityAt(parts, 40, rule), kv100 < 2 && kv100 > 2 - 1e-9 ? 2 : kv100);
  }
  const { basis, toIndex, fromIndex } = INDEX_RULES[limit.property];
  let weight = 0;
  let sum = 0;
  for (const { stock, x } of parts) {
    const figure =
      limit.property === 'pourPoint'
        ? pour(stock, order.depressant ?? false)
        : seen(stock, limit.property, limit.celsius);
    if (figure === 'as the rest') continue;
    const density = seen(stock, 'density');
    const share = basis === 'mass' ? x : typeof density === 'object' ? x / density.value : Number.NaN;
    weight += share;
    sum += share * (figure ? toIndex(figure.value) : Number.NaN);
  }
  return fromIndex(sum / weight);
}

/** How far the worst limit is missed, in reporting units; 0 or less where all hold. */
export function worstViolation(order: Order, recipe: Recipe): { units: number; limit?: Limit; value?: number } {
  const byId = new Map(order.stocks.map((stock) => [stock.id, stock]));
  const parts = recipe.flatMap(({ stockId, massFraction }) => {
    const stock = byId.get(stockId);
    if (!stock) throw new Error(`No stock "${stockId}".`);
    return massFraction > 0 ? [{ stock, x: massFraction }] : [];
  });
  let worst: { units: number; limit?: Limit; value?: number } = { units: -Infinity };
  for (const limit of order.limits) {
    const value = mixValue(order, parts, limit);
    const { min, max } = endsOf(limit);
    const out = Math.max((min ?? -Infinity) - value, value - (max ?? Infinity)) / unitOf(limit);
    if (Number.isNaN(out) || out > worst.units) worst = { units: Number.isNaN(out) ? Infinity : out, limit, value };
  }
  return worst;
}
