import type { Stock } from '../stock/stock';
import type { StockSet } from './order';

/** Whether a stock belongs to a set: named, of a family, or carrying the flag. */
export function isInSet(stock: Stock, set: StockSet): boolean {
  return (
    (set.stockIds?.includes(stock.id) ?? false) ||
    (set.families?.includes(stock.family) ?? false) ||
    (set.flag !== undefined && (stock.flags?.includes(set.flag) ?? false))
  );
}
