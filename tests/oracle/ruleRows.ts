import type { Order, Stock, StockSet } from '../../src/index';
import type { OrderRows, Row } from './orderRows';

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

/** Doses as bounds, or as rows where they are of the base oil. */
export function applyDoses(order: Order, built: OrderRows): void {
  for (const dose of order.doses ?? []) {
    const place = built.stocks.findIndex((stock) => stock.id === dose.stockId);
    // Tonnes over the batch: the smallest for what must go in, the largest for what may.
    const { batchTonnes: batch = Number.NaN } = order;
    const [small, large] = typeof batch === 'number' ? [batch, batch] : [batch.min, batch.max];
    const [unitMin, unitMax] = dose.unit === 'tonnes' ? [small, large] : [1, 1];
    const least = dose.exactly ?? dose.min;
    const most = dose.exactly ?? dose.max;
    const min = least === undefined ? undefined : least / unitMin;
    const max = most === undefined ? undefined : most / unitMax;
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

/** Share rules as rows and choices. */
export function applyShares(order: Order, built: OrderRows): void {
  const { stocks } = built;
  for (const [place, rule] of (order.shares ?? []).entries()) {
    const name = `share rule ${place}`;
    if (rule.kind === 'flag') continue;
    const members = stocks.map((stock) => inSet(stock, rule.set));
    const places = members.flatMap((member, i) => (member ? [i] : []));
    if (rule.kind === 'one of') built.choices.counts.push({ members: places, min: 0, max: 1 });
    if (rule.kind === 'share' || rule.kind === 'one of') {
      const whole = stocks.map((stock) => rule.kind === 'one of' || rule.of !== 'base oil' || isBase(stock));
      built.rows.push(...shareRows(name, members, whole, rule.min, rule.max));
    } else if (rule.kind === 'ratio') {
      const to = stocks.map((stock) => inSet(stock, rule.to));
      built.rows.push(...shareRows(name, members, to, rule.min, rule.max));
    } else if (rule.kind === 'count') {
      built.choices.counts.push({ members: places, min: rule.min ?? 0, max: rule.max ?? places.length });
      // "At least so many" needs a share from which on a stock counts: a ten-thousandth.
      if ((rule.min ?? 0) > 0) for (const i of places) built.least[i] = Math.max(built.least[i], 1e-6);
    } else {
      const list = rule.kind === 'needs' ? built.choices.needs : built.choices.excludes;
      // As for "at least so many": a trace is no use.
      if (rule.kind === 'needs') for (const i of places) built.least[i] = Math.max(built.least[i], 1e-6);
      const from = stocks.findIndex((stock) => stock.id === rule.stockId);
      if (from >= 0) list.push({ from, members: places.filter((i) => i !== from) });
    }
  }
}
