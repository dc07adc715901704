import type { Limit, Order, Stock, StockSet } from '../../src/index';
import { INDEX_RULES, indexOnLine, VISCOSITY_INDEX, type ViscosityTerm, viscosityTerm } from './indices';

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
  rows: Row[];
  viscosity?: { terms: ViscosityTerm[]; index: (kv: number) => number };
  vi?: { min?: number; max?: number };
  /** KV100 window [mm²/s]. */
  window: { low: number; high: number };
  choices: {
    most?: number;
    counts: { members: number[]; max: number }[];
    excludes: { from: number; members: number[] }[];
  };
  /** Specific volumes [L/kg], for costs per m³. */
  volumes?: number[];
}

export type Seen = { value: number } | 'as the rest' | undefined;

/** A figure of a stock as it stands: a value, "as the rest", or unknown. */
export function seen(stock: Stock, property: string, celsius?: number): Seen {
  const figure = stock.figures.find((f) => f.property === property && (celsius === undefined || f.celsius === celsius));
  if (!figure) return undefined;
  if (figure.origin === 'as the rest') return 'as the rest';
  return figure.value === undefined ? undefined : { value: figure.value };
}

/** The pour point an order reads: with depressant where it is used and known. */
export function pour(stock: Stock, depressant: boolean): Seen {
  return (depressant ? seen(stock, 'pourPointDepressed') : undefined) ?? seen(stock, 'pourPoint');
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

/** One reporting unit of a property. */
export function unitOf({ property }: Limit): number {
  return property === 'kv' ? 0.01 : property === 'vi' ? 1 : INDEX_RULES[property].unit;
}

/** The ends of a limit: strict upper limits one reporting unit inside, margins applied. */
export function endsOf(limit: Limit): { min?: number; max?: number } {
  const unit = unitOf(limit);
  const margin = limit.insideBy ?? 0;
  const uppers: number[] = [];
  if (limit.max !== undefined) uppers.push(limit.below === true ? limit.max - unit : limit.max);
  if (typeof limit.below === 'number') uppers.push(limit.below - unit);
  return {
    ...(limit.min === undefined ? {} : { min: limit.min + margin }),
    ...(uppers.length === 0 ? {} : { max: Math.min(...uppers) - margin }),
  };
}

function volumeOf(stock: Stock): number {
  const density = seen(stock, 'density');
  return typeof density === 'object' ? 1000 / density.value : Number.NaN;
}

function viscosityTerms(stocks: Stock[], rule: string): ViscosityTerm[] {
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

function limitRows(limit: Limit, order: Order, built: OrderRows): Row[] {
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

function inSet(stock: Stock, set: StockSet): boolean {
  return (
    (set.stockIds ?? []).includes(stock.id) ||
    (set.families ?? []).includes(stock.family) ||
    (set.flag !== undefined && (stock.flags ?? []).includes(set.flag))
  );
}

const NOT_BASE = ['thickener', 'package', 'depressant'];
const isBase = (stock: Stock) => !NOT_BASE.includes(stock.family);

/** share ≥ or ≤ a part of the mix or of the base oil, as homogeneous rows over Σ x. */
function shareRows(name: string, member: boolean[], whole: boolean[], min?: number, max?: number): Row[] {
  const part = (end: number) => member.map((m, i) => (m ? 1 : 0) - (whole[i] ? end : 0));
  if (min !== undefined && min === max) return [{ name, values: part(min), lower: 0, upper: 0 }];
  const rows: Row[] = [];
  if (min !== undefined) rows.push({ name: `${name} min`, values: part(min), lower: 0, upper: Infinity });
  if (max !== undefined) rows.push({ name: `${name} max`, values: part(max), lower: -Infinity, upper: 0 });
  return rows;
}

function applyDoses(order: Order, built: OrderRows): void {
  for (const dose of order.doses ?? []) {
    const place = built.stocks.findIndex((stock) => stock.id === dose.stockId);
    const min = dose.exactly ?? dose.min;
    const max = dose.exactly ?? dose.max;
    if (place < 0) continue;
    if (dose.of === 'base oil') {
      const member = built.stocks.map((_, i) => i === place);
      built.rows.push(...shareRows(`dose ${dose.stockId}`, member, built.stocks.map(isBase), min, max));
      continue;
    }
    if (max !== undefined) built.upper[place] = Math.min(built.upper[place], max);
    if (min === undefined || min <= 0) continue;
    if (dose.required === false) built.least[place] = Math.max(built.least[place], min);
    else built.lower[place] = Math.max(built.lower[place], min);
  }
}

function applyShares(order: Order, built: OrderRows): void {
  const { stocks } = built;
  for (const [place, rule] of (order.shares ?? []).entries()) {
    const name = `share rule ${place}`;
    if (rule.kind === 'flag') continue;
    const members = stocks.map((stock) => inSet(stock, rule.set));
    const places = members.flatMap((member, i) => (member ? [i] : []));
    if (rule.kind === 'share') {
      const whole = stocks.map((stock) => rule.of !== 'base oil' || isBase(stock));
      built.rows.push(...shareRows(name, members, whole, rule.min, rule.max));
    } else if (rule.kind === 'ratio') {
      const to = stocks.map((stock) => inSet(stock, rule.to));
      built.rows.push(...shareRows(name, members, to, rule.min, rule.max));
    } else if (rule.kind === 'count') {
      if (rule.min !== undefined) throw new Error('The oracle does not read "at least so many of a set".');
      if (rule.max !== undefined) built.choices.counts.push({ members: places, max: rule.max });
    } else {
      const from = stocks.findIndex((stock) => stock.id === rule.stockId);
      if (from >= 0) built.choices.excludes.push({ from, members: places.filter((i) => i !== from) });
    }
  }
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
    rows: [],
    window: { low: 0, high: Infinity },
    choices: { ...(order.mostStocks === undefined ? {} : { most: order.mostStocks }), counts: [], excludes: [] },
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
