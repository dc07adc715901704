import type { Limit, Order, Stock } from '../../src/index';
import { endsOf, pour, seen, volumeOf } from './figures';
import { INDEX_RULES, indexOnLine, type ViscosityTerm, viscosityTerm } from './indices';
import type { OrderRows, Row } from './orderRows';

/** How each stock enters the averages of viscosity; without weight where it takes the value of the rest. */
export function viscosityTerms(stocks: Stock[], rule: string): ViscosityTerm[] {
  return stocks.map((stock) => {
    const kv40 = seen(stock, 'kv', 40);
    const kv100 = seen(stock, 'kv', 100);
    if (typeof kv40 !== 'object' || typeof kv100 !== 'object') return { weight: 0, index40: 0, index100: 0 };
    const density = 1000 / volumeOf(stock);
    return viscosityTerm(rule, { kv40: kv40.value, kv100: kv100.value, density, blendWeight: stock.blendWeight ?? 1 });
  });
}

/** Weighted-mean row: Σ w x (I - end) on the stated side of zero, scaled so that typical values are near 1. */
function meanRow(name: string, weights: number[], indices: number[], end: number, upper: boolean, scale: number): Row {
  const typical = Math.max(...weights) * scale;
  const values = weights.map((w, i) => (w * (indices[i] - end)) / typical);
  return upper ? { name, values, lower: -Infinity, upper: 0 } : { name, values, lower: 0, upper: Infinity };
}

/** The rows of one limit; a viscosity index has none. */
export function limitRows(limit: Limit, order: Order, built: OrderRows): Row[] {
  const { min, max } = endsOf(limit);
  const rows: Row[] = [];
  const add = (
    weights: number[],
    indices: number[],
    toIndex: (v: number) => number,
    sense: 1 | -1,
    scale: (i: number) => number,
  ) => {
    for (const [end, upper] of [
      [min, false],
      [max, true],
    ] as const) {
      if (end === undefined) continue;
      const index = toIndex(end);
      const name = `${limit.property}@${limit.celsius ?? ''} ${upper ? 'max' : 'min'} ${end}`;
      rows.push(meanRow(name, weights, indices, index, upper === (sense === 1), scale(index)));
    }
  };
  if (limit.property === 'vi') return rows;
  if (limit.property === 'kv') {
    const { terms, index } = built.viscosity as NonNullable<OrderRows['viscosity']>; // built whenever kv is limited
    const celsius = limit.celsius ?? 100;
    const indices = terms.map((t) =>
      celsius === 40 ? t.index40 : celsius === 100 ? t.index100 : indexOnLine(t.index40, t.index100, celsius),
    );
    add(
      terms.map((t) => t.weight),
      indices,
      index,
      1,
      (i) => Math.max(0.1, Math.abs(i)),
    );
    return rows;
  }
  const rule = INDEX_RULES[limit.property];
  const found = built.stocks.map((stock) =>
    limit.property === 'pourPoint'
      ? pour(stock, order.depressant ?? false)
      : seen(stock, limit.property, limit.celsius),
  );
  const weights = built.stocks.map((stock, i) =>
    typeof found[i] !== 'object' ? 0 : rule.basis === 'volume' ? volumeOf(stock) : 1,
  );
  const indices = found.map((f) => (typeof f === 'object' ? rule.toIndex(f.value) : 0));
  add(weights, indices, rule.toIndex, rule.sense, (i) => Math.max(Math.abs(i), 1e-6));
  return rows;
}
