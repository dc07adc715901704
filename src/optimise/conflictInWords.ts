import type { Order } from './order';
import type { ModelRow, SearchModel } from './rows/searchModel';
import { doseInWords, percent, ruleInWords } from './ruleInWords';
import type { SearchResult } from './search/branchAndBound';
import type { StockBound } from './search/certificate';

/** What stands in the way of an impossible order, as far as the proofs tell. */
export interface Conflict {
  /** Places in `order.limits`. */
  limits: number[];
  /** Doses, share rules and bounds, in sentences. */
  rules: string[];
}

function rowInWords({ source }: ModelRow, order: Order, model: SearchModel): string | undefined {
  if (source.kind === 'dose') {
    const dose = order.doses?.[source.dose];
    return dose && doseInWords(dose, order.stocks);
  }
  if (source.kind === 'share') {
    const rule = order.shares?.[source.share];
    return rule && ruleInWords(rule, order.stocks);
  }
  if (source.kind === 'most stocks') return `at most ${order.mostStocks} stocks, compulsory ones included`;
  // A stretch of a price has a presence too; its rows tell the user nothing.
  if (source.kind === 'presence' && source.end === 'least' && source.stock < model.stocks.length) {
    const least = model.presences.find(({ stock }) => stock === source.stock)?.least ?? 0;
    return `${model.stocks[source.stock].name} absent or at least ${percent(least)} of the mix`;
  }
  return undefined;
}

/** Stocks that must be used more than they may: no search is needed to see that. */
export function impossibleBounds(order: Order, model: SearchModel): string[] {
  return model.stocks.flatMap((stock, i) =>
    model.lower[i] > model.upper[i]
      ? [`${stock.name} must be at least ${percent(model.lower[i])} of the mix, but ${mostInWords(order, model, i)}`]
      : [],
  );
}

/** The greatest share of a stock, and why: "may be at most 0.44 % of the mix (2.2 t on hand for a batch of 500 t)". */
function mostInWords(order: Order, { stocks, upper }: SearchModel, stock: number): string {
  const { availableTonnes, greatestDose } = stocks[stock];
  const batch = typeof order.batchTonnes === 'object' ? order.batchTonnes.min : order.batchTonnes;
  const onHand = availableTonnes !== undefined && batch !== undefined && availableTonnes / batch === upper[stock];
  const reason = onHand
    ? ` (${availableTonnes} t on hand for a batch of ${batch} t)`
    : greatestDose === upper[stock]
      ? ' (its greatest dose)'
      : '';
  return `may be at most ${percent(upper[stock])} of the mix${reason}`;
}

function boundInWords(order: Order, { stock, end }: StockBound, model: SearchModel): string {
  const { name } = model.stocks[stock];
  if (end === 'least') return `${name} at least ${percent(model.lower[stock])} of the mix`;
  return `${name} ${mostInWords(order, model, stock)}`;
}

/** The limits and rules that the proofs of impossibility lean on. */
export function conflictOf(order: Order, model: SearchModel, found: SearchResult['conflict']): Conflict {
  const limits = new Set<number>();
  const rules = new Set(impossibleBounds(order, model));
  for (const row of found.rows) {
    if (row.source.kind === 'limit') limits.add(row.source.limit);
    const words = rowInWords(row, order, model);
    if (words) rules.add(words);
  }
  for (const bound of found.bounds) rules.add(boundInWords(order, bound, model));
  if (found.usesVi && model.vi?.min) limits.add(model.vi.min.limit);
  if (found.usesVi && model.vi?.max) limits.add(model.vi.max.limit);
  return { limits: [...limits].sort((a, b) => a - b), rules: [...rules] };
}
