import type { Order, Recipe } from '../../src/index';
import { Draw } from './mulberry32';
import { orderRows, type Row } from './orderRows';
import { costOf, predictedViolation } from './predictedViolation';

/** Doses, caps and share rules of an order without choices, as bounds and rows over all its stocks. */
interface Simple {
  lower: number[];
  upper: number[];
  rows: Row[];
}

function simpleRules(order: Order): Simple {
  const rows = orderRows(order);
  if (rows.stocks.length !== order.stocks.length) throw new Error('The attack takes orders with all figures known.');
  const isShare = (row: Row) => row.name.startsWith('share') || row.name.startsWith('dose');
  return { lower: rows.lower, upper: rows.upper, rows: rows.rows.filter(isShare) };
}

function missOfRules({ rows, lower: lowest, upper: highest }: Simple, x: readonly number[]): number {
  let miss = x.reduce((most, share, i) => Math.max(most, lowest[i] - share, share - highest[i]), 0);
  for (const { values, lower, upper } of rows) {
    const sum = values.reduce((total, v, i) => total + v * x[i], 0);
    miss = Math.max(miss, lower - sum, sum - upper);
  }
  return miss;
}

function keepsBounds({ lower, upper }: Simple, x: readonly number[]): boolean {
  return x.every((share, i) => share >= lower[i] && share <= upper[i]);
}

/** One random step that keeps Σ x = 1 and the bounds, or undefined. */
function stepFrom(draw: Draw, x: readonly number[], { lower, upper }: Simple, size: number): number[] | undefined {
  const next = [...x];
  const places = draw.shuffled(x.map((_, i) => i)).slice(0, draw.whole(2, Math.min(4, x.length)));
  let rest = 0;
  for (const place of places.slice(1)) {
    const wish = x[place] + draw.between(-size, size);
    next[place] = Math.min(upper[place], Math.max(lower[place], wish));
    rest += next[place] - x[place];
  }
  next[places[0]] -= rest;
  return next[places[0]] < 0 || next[places[0]] > 1 ? undefined : next;
}

/**
 * Cheapest feasible cost that random local search reaches from many starts, judged by `predictBlend` alone. Knows
 * nothing of rows, bounds of cost or the search: it can only ever attack a claim, not support one.
 */
export function attack(
  order: Order,
  recipe: Recipe,
  seed: number,
  starts: number,
  steps: number,
): { cost: number; x: number[] } {
  const draw = new Draw(seed);
  const rules = simpleRules(order);
  const scale = Math.max(1, ...order.stocks.map((stock) => Math.abs(stock.pricePerTonne)));
  const miss = (x: readonly number[]) => Math.max(predictedViolation(order, x), 1e6 * missOfRules(rules, x));
  const even = recipe.length > 0 ? 0 : 1 / order.stocks.length;
  const given = order.stocks.map((stock) => recipe.find((line) => line.stockId === stock.id)?.massFraction ?? even);
  let best = { cost: Infinity, x: given };
  for (let start = 0; start < starts; start++) {
    let x = [...given];
    for (let k = 0; k < 4 * start; k++) x = stepFrom(draw, x, rules, 0.15) ?? x;
    let size = start === 0 ? 0.01 : 0.2;
    let current = { miss: Math.max(0, miss(x)), cost: costOf(order, x) };
    const worth = (state: typeof current, price: number) => state.cost + price * state.miss;
    for (let step = 0; step < steps; step++) {
      const price = scale * (0.01 + step / steps);
      const next = stepFrom(draw, x, rules, size);
      if (!next) continue;
      const state = { miss: Math.max(0, miss(next)), cost: costOf(order, next) };
      if (state.miss <= 1e-9 && keepsBounds(rules, next) && state.cost < best.cost)
        best = { cost: state.cost, x: next };
      if (worth(state, price) < worth(current, price)) {
        x = next;
        current = state;
        size = Math.min(0.3, size * 1.3);
      } else size = Math.max(1e-8, size * 0.97);
    }
  }
  return best;
}
