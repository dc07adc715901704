import type { Order, Stock } from '../../src/index';
import { endsOf, pour, type Seen, seen, volumeOf } from './figures';
import { INDEX_RULES, VISCOSITY_INDEX, type ViscosityTerm } from './indices';
import { limitRows, viscosityTerms } from './limitRows';
import { applyDoses, applyShares } from './ruleRows';

/** lower ≤ Σ values·x ≤ upper, one value a usable stock. Every row but the bounds has a zero on the right. */
export interface Row {
  name: string;
  values: number[];
  lower: number;
  upper: number;
}

/** An order in the oracle's own terms. `x` are mass fractions of `stocks`, Σ x = 1. */
export interface OrderRows {
  stocks: Stock[];
  leftOut: { stockId: string; property: string }[];
  /** Compulsory stocks that were left out. */
  refused: string[];
  cost: number[];
  lower: number[];
  upper: number[];
  /** Where positive: the stock is absent, or at least this much. */
  least: number[];
  /** What using the stock costs, per tonne of mix, whatever its share. */
  fixed: number[];
  rows: Row[];
  viscosity?: { terms: ViscosityTerm[]; index: (kv: number) => number };
  vi?: { min?: number; max?: number };
  /** KV100 window [mm²/s]. */
  window: { low: number; high: number };
  choices: {
    most?: number;
    counts: { members: number[]; min: number; max: number }[];
    excludes: { from: number; members: number[] }[];
    needs: { from: number; members: number[] }[];
  };
  /** Specific volumes [L/kg], for costs per m³. */
  volumes?: number[];
}

/** What the limits need of a stock; undefined names the first unknown property. */
function needs(stock: Stock, order: Order): { unknown?: string; asTheRest: boolean } {
  let asTheRest = false;
  const ask = (property: string, found: Seen): string | undefined => {
    if (found === undefined) return property;
    if (found === 'as the rest') asTheRest = true;
    return undefined;
  };
  for (const { property } of order.limits) {
    let unknown: string | undefined;
    if (property === 'kv' || property === 'vi') {
      unknown = ask('kv', seen(stock, 'kv', 40)) ?? ask('kv', seen(stock, 'kv', 100));
      if (!asTheRest && !unknown) unknown = ask('density', seen(stock, 'density'));
    } else if (property === 'pourPoint') {
      unknown = ask('pourPoint', pour(stock, order.depressant ?? false)) ?? ask('density', seen(stock, 'density'));
    } else {
      unknown = ask(property, seen(stock, property));
      if (!unknown && INDEX_RULES[property].basis === 'volume') unknown = ask('density', seen(stock, 'density'));
    }
    if (unknown) return { unknown, asTheRest };
  }
  if (order.costBasis === 'cubic metre' && !seen(stock, 'density')) return { unknown: 'density', asTheRest };
  return { asTheRest };
}

function smallestBatch(order: Order): number | undefined {
  return typeof order.batchTonnes === 'object' ? order.batchTonnes.min : order.batchTonnes;
}

/** Turns an order into rows, by the formulas of DEVELOPERS.md alone: none of the engine's code is used. */
export function orderRows(order: Order): OrderRows {
  const flags = (order.shares ?? []).flatMap((rule) => (rule.kind === 'flag' ? [rule.flag] : []));
  const leftOut: OrderRows['leftOut'] = [];
  const smallDose = new Set<string>();
  const stocks = order.stocks.filter((stock) => {
    const { unknown, asTheRest } = needs(stock, order);
    if (asTheRest) smallDose.add(stock.id);
    if (unknown) leftOut.push({ stockId: stock.id, property: unknown });
    return !unknown && flags.every((flag) => stock.flags?.includes(flag));
  });
  const batch = smallestBatch(order);
  const upper = stocks.map((stock) => {
    const onHand = batch && stock.availableTonnes !== undefined ? stock.availableTonnes / batch : 1;
    const cap = smallDose.has(stock.id) ? (order.greatestDoseAsTheRest ?? 0.02) : 1;
    return Math.min(1, stock.greatestDose ?? 1, onHand, cap);
  });
  const gone = new Set(leftOut.map((entry) => entry.stockId));
  const refused = (order.doses ?? []).filter(
    (dose) => gone.has(dose.stockId) && dose.required !== false && (dose.exactly ?? dose.min ?? 0) > 0,
  );
  const built: OrderRows = {
    stocks,
    leftOut,
    refused: refused.map((dose) => dose.stockId),
    cost: stocks.map((stock) => stock.pricePerTonne),
    lower: stocks.map(() => 0),
    upper,
    least: stocks.map((stock) => stock.leastDoseIfUsed ?? 0),
    fixed: stocks.map((stock) =>
      typeof order.batchTonnes === 'number' ? (stock.flushCost ?? 0) / order.batchTonnes : 0,
    ),
    rows: [],
    window: { low: 0, high: Infinity },
    choices: {
      ...(order.mostStocks === undefined ? {} : { most: order.mostStocks }),
      counts: [],
      excludes: [],
      needs: [],
    },
    ...(order.costBasis === 'cubic metre' ? { volumes: stocks.map(volumeOf) } : {}),
  };
  if (order.limits.some((limit) => limit.property === 'kv' || limit.property === 'vi')) {
    const rule = order.viscosityRule ?? 'wright';
    built.viscosity = { terms: viscosityTerms(stocks, rule), index: VISCOSITY_INDEX[rule] };
  }
  for (const limit of order.limits) {
    built.rows.push(...limitRows(limit, order, built));
    const { min, max } = endsOf(limit);
    if (limit.property === 'vi') {
      const vi = built.vi ?? {};
      if (min !== undefined) vi.min = Math.max(vi.min ?? -Infinity, min);
      if (max !== undefined) vi.max = Math.min(vi.max ?? Infinity, max);
      built.vi = vi;
    }
    if (limit.property === 'kv' && (limit.celsius ?? 100) === 100) {
      built.window.low = Math.max(built.window.low, min ?? 0);
      built.window.high = Math.min(built.window.high, max ?? Infinity);
    }
  }
  applyDoses(order, built);
  applyShares(order, built);
  return built;
}
