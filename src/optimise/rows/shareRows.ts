import { isBaseOil } from '../../stock/family';
import type { Order, ShareRule, StockSet } from '../order';
import { isInSet } from '../stockSet';
import { LEAST_SHARE_THAT_COUNTS, type ModelBuilder } from './modelBuilder';
import type { RowSource } from './searchModel';

type Entries = (readonly [number, number])[];

/** Entries of Σ set - share · Σ base over the stocks. */
function shareOfBase(builder: ModelBuilder, set: StockSet, share: number): Entries {
  return builder.stocks.map(
    (stock, column) => [column, (isInSet(stock, set) ? 1 : 0) - (isBaseOil(stock.family) ? share : 0)] as const,
  );
}

function addShare(builder: ModelBuilder, rule: Extract<ShareRule, { kind: 'share' }>, source: RowSource): void {
  if (rule.of === 'base oil') {
    if (rule.min !== undefined) builder.addRow(source, 0, Infinity, shareOfBase(builder, rule.set, rule.min));
    if (rule.max !== undefined) builder.addRow(source, -Infinity, 0, shareOfBase(builder, rule.set, rule.max));
    return;
  }
  const entries: Entries = builder.stocks.map((stock, column) => [column, isInSet(stock, rule.set) ? 1 : 0] as const);
  builder.addRow(source, rule.min ?? -Infinity, rule.max ?? Infinity, entries);
}

function addRatio(builder: ModelBuilder, rule: Extract<ShareRule, { kind: 'ratio' }>, source: RowSource): void {
  const row = (ratio: number): Entries =>
    builder.stocks.map(
      (stock, column) => [column, (isInSet(stock, rule.set) ? 1 : 0) - (isInSet(stock, rule.to) ? ratio : 0)] as const,
    );
  if (rule.min !== undefined) builder.addRow(source, 0, Infinity, row(rule.min));
  if (rule.max !== undefined) builder.addRow(source, -Infinity, 0, row(rule.max));
}

function addCount(builder: ModelBuilder, rule: Extract<ShareRule, { kind: 'count' }>, source: RowSource): void {
  const entries: Entries = [];
  builder.stocks.forEach((stock, place) => {
    if (!isInSet(stock, rule.set)) return;
    const presence = builder.presenceOf(place);
    const counts = (rule.min ?? 0) > 0 && builder.lower(place) === 0;
    if (counts) presence.least = Math.max(presence.least, Math.min(LEAST_SHARE_THAT_COUNTS, builder.upper(place)));
    entries.push([presence.column, 1]);
  });
  builder.addRow(source, rule.min ?? -Infinity, rule.max ?? Infinity, entries);
}

/** A place in a formula: the share of the set, and a count of its stocks. */
function addOneOf(
  builder: ModelBuilder,
  { set, min, max }: Extract<ShareRule, { kind: 'one of' }>,
  source: RowSource,
): void {
  addShare(
    builder,
    { kind: 'share', set, ...(min === undefined ? {} : { min }), ...(max === undefined ? {} : { max }) },
    source,
  );
  addCount(builder, { kind: 'count', set, max: 1 }, source);
}

function addExcludes(builder: ModelBuilder, rule: Extract<ShareRule, { kind: 'excludes' }>, source: RowSource): void {
  const place = builder.placeOf(rule.stockId);
  if (place === undefined) return;
  const own = builder.presenceOf(place).column;
  builder.stocks.forEach((stock, other) => {
    if (other === place || !isInSet(stock, rule.set)) return;
    builder.addRow(source, -Infinity, 1, [
      [own, 1],
      [builder.presenceOf(other).column, 1],
    ]);
  });
}

function addNeeds(builder: ModelBuilder, rule: Extract<ShareRule, { kind: 'needs' }>, source: RowSource): void {
  const place = builder.placeOf(rule.stockId);
  if (place === undefined) return;
  const entries: [number, number][] = [[builder.presenceOf(place).column, 1]];
  builder.stocks.forEach((stock, other) => {
    if (other === place || !isInSet(stock, rule.set)) return;
    const presence = builder.presenceOf(other);
    if (builder.lower(other) === 0) {
      presence.least = Math.max(presence.least, Math.min(LEAST_SHARE_THAT_COUNTS, builder.upper(other)));
    }
    entries.push([presence.column, -1]);
  });
  builder.addRow(source, -Infinity, 0, entries);
}

/** The share rules of the order; flags were applied when the candidates were chosen. */
export function addShares(builder: ModelBuilder, order: Order): void {
  order.shares?.forEach((rule, share) => {
    const source: RowSource = { kind: 'share', share };
    if (rule.kind === 'share') addShare(builder, rule, source);
    else if (rule.kind === 'ratio') addRatio(builder, rule, source);
    else if (rule.kind === 'count') addCount(builder, rule, source);
    else if (rule.kind === 'one of') addOneOf(builder, rule, source);
    else if (rule.kind === 'excludes') addExcludes(builder, rule, source);
    else if (rule.kind === 'needs') addNeeds(builder, rule, source);
  });
}

/** At most so many stocks in the mix. */
export function addMostStocks(builder: ModelBuilder, order: Order): void {
  if (order.mostStocks === undefined || order.mostStocks >= builder.stocks.length) return;
  const entries: Entries = builder.stocks.map((_, place) => [builder.presenceOf(place).column, 1] as const);
  builder.addRow({ kind: 'most stocks' }, -Infinity, order.mostStocks, entries);
}
