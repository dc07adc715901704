import type { Order, ShareRule, StockSet } from '../optimise/order';

/** A flag that no stock carries: a set that has lost its last stock is empty, not unstated. */
const NOBODY = '\u0000';

function reducedSet(set: StockSet, gone: ReadonlySet<string>): StockSet {
  if (!set.stockIds?.some((id) => gone.has(id))) return set;
  const stockIds = set.stockIds.filter((id) => !gone.has(id));
  const empty = stockIds.length === 0 && !set.families?.length && set.flag === undefined;
  return empty ? { flag: NOBODY } : { ...set, stockIds };
}

function reducedRule(rule: ShareRule, gone: ReadonlySet<string>): ShareRule[] {
  if ('stockId' in rule && gone.has(rule.stockId)) return [];
  if (!('set' in rule)) return [rule];
  if ('to' in rule) return [{ ...rule, set: reducedSet(rule.set, gone), to: reducedSet(rule.to, gone) }];
  return [{ ...rule, set: reducedSet(rule.set, gone) }];
}

/**
 * The order without some of its stocks: as if they had never been offered. Doses of them go with them (leave compulsory
 * stocks in), rules count the stocks that are left.
 */
export function withoutStocks(order: Order, stockIds: Iterable<string>): Order {
  const gone = new Set(stockIds);
  return {
    ...order,
    stocks: order.stocks.filter((stock) => !gone.has(stock.id)),
    ...(order.doses ? { doses: order.doses.filter((dose) => !gone.has(dose.stockId)) } : {}),
    ...(order.shares ? { shares: order.shares.flatMap((rule) => reducedRule(rule, gone)) } : {}),
  };
}
