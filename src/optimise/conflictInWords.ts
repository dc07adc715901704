import type { Order } from './order';
import type { ModelRow, SearchModel } from './rows/searchModel';
import { doseInWords, percent, ruleInWords } from './ruleInWords';
import type { SearchResult } from './search/branchAndBound';
import type { StockBound } from './search/searchProgram';

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
  if (source.kind === 'most stocks') return `at most ${order.mostStocks} stocks`;
  if (source.kind === 'presence') return `the least dose of ${model.stocks[source.stock].name}`;
  return undefined;
}

/** Stocks that must be used more than they may: no search is needed to see that. */
export function impossibleBounds(model: SearchModel): string[] {
  return model.stocks.flatMap((stock, i) =>
    model.lower[i] > model.upper[i]
      ? [
          `${stock.name} must be at least ${percent(model.lower[i])} of the mix, but may be at most ${percent(model.upper[i])}`,
        ]
      : [],
  );
}

function boundInWords({ stock, end }: StockBound, { stocks, lower, upper }: SearchModel): string {
  const { name } = stocks[stock];
  if (end === 'least') return `${name} at least ${percent(lower[stock])} of the mix`;
  return `${name} at most ${percent(upper[stock])} of the mix, by its dose or by what is on hand`;
}

/** The limits and rules that the proofs of impossibility lean on. */
export function conflictOf(order: Order, model: SearchModel, found: SearchResult['conflict']): Conflict {
  const limits = new Set<number>();
  const rules = new Set(impossibleBounds(model));
  for (const row of found.rows) {
    if (row.source.kind === 'limit') limits.add(row.source.limit);
    const words = rowInWords(row, order, model);
    if (words) rules.add(words);
  }
  for (const bound of found.bounds) rules.add(boundInWords(bound, model));
  if (found.usesVi && model.vi?.min) limits.add(model.vi.min.limit);
  if (found.usesVi && model.vi?.max) limits.add(model.vi.max.limit);
  return { limits: [...limits].sort((a, b) => a - b), rules: [...rules] };
}
