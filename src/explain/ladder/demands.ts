import type { Order } from '../../optimise/order';
import type { Stock } from '../../stock/stock';
import type { Demand } from '../explanation';
import { statedEnds, withoutEnd } from '../limitEnd';

type StockDemand = Extract<Demand, { stockId: string }>;

function demandsOfStock({ id, ...stock }: Stock, batch: Order['batchTonnes']): StockDemand[] {
  const demands: StockDemand[] = [];
  if (stock.availableTonnes !== undefined && batch !== undefined) {
    demands.push({ kind: 'amount on hand', stockId: id });
  }
  if (stock.greatestDose !== undefined) demands.push({ kind: 'greatest dose', stockId: id });
  if ((stock.leastDoseIfUsed ?? 0) > 0) demands.push({ kind: 'least dose', stockId: id });
  if (stock.lotTonnes !== undefined && typeof batch === 'number') demands.push({ kind: 'whole drums', stockId: id });
  return demands;
}

/** Everything an order asks for: limits first, stocks last and by their id, whatever the order of the list. */
export function demandsOf(order: Order): Demand[] {
  const byId = [...order.stocks].sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0));
  return [
    ...statedEnds(order).map((end) => ({ kind: 'limit' as const, ...end })),
    ...(order.shares ?? []).map((_, share) => ({ kind: 'share' as const, share })),
    ...(order.doses ?? []).map((_, dose) => ({ kind: 'dose' as const, dose })),
    ...(order.mostStocks === undefined ? [] : [{ kind: 'most stocks' as const }]),
    ...byId.flatMap((stock) => demandsOfStock(stock, order.batchTonnes)),
  ];
}

function withoutBound(stock: Stock, kind: StockDemand['kind']): Stock {
  const { availableTonnes, greatestDose, leastDoseIfUsed, lotTonnes, ...rest } = stock;
  return {
    ...rest,
    ...(availableTonnes === undefined || kind === 'amount on hand' ? {} : { availableTonnes }),
    ...(greatestDose === undefined || kind === 'greatest dose' ? {} : { greatestDose }),
    ...(leastDoseIfUsed === undefined || kind === 'least dose' ? {} : { leastDoseIfUsed }),
    ...(lotTonnes === undefined || kind === 'whole drums' ? {} : { lotTonnes }),
  };
}

function withoutOne(order: Order, demand: Demand): Order {
  if (demand.kind === 'limit') return withoutEnd(order, demand);
  if (demand.kind === 'most stocks') {
    const { mostStocks: _, ...rest } = order;
    return rest;
  }
  if (demand.kind === 'dose')
    return { ...order, doses: order.doses?.filter((_, place) => place !== demand.dose) ?? [] };
  if (demand.kind === 'share') {
    return { ...order, shares: order.shares?.filter((_, place) => place !== demand.share) ?? [] };
  }
  const stocks = order.stocks.map((stock) => (stock.id === demand.stockId ? withoutBound(stock, demand.kind) : stock));
  return { ...order, stocks };
}

function placeOf(demand: Demand): number {
  return demand.kind === 'dose' ? demand.dose : demand.kind === 'share' ? demand.share : 0;
}

/**
 * A copy of the order that no longer asks for these demands. Limits keep their places; doses and share rules after a
 * dropped one move up. Stocks left out for unknown figures stay left out; a flag that is no longer asked for lets its
 * stocks in.
 */
export function withoutDemands(order: Order, demands: readonly Demand[]): Order {
  const lastFirst = [...demands].sort((a, b) => placeOf(b) - placeOf(a));
  return lastFirst.reduce(withoutOne, order);
}

/** A copy of the order without one demand; see `withoutDemands`. */
export function withoutDemand(order: Order, demand: Demand): Order {
  return withoutDemands(order, [demand]);
}

export function sameDemand(a: Demand, b: Demand): boolean {
  return JSON.stringify(a) === JSON.stringify(b);
}

/** A copy of the order that asks for these demands and no others. */
export function onlyDemands(order: Order, demands: readonly Demand[]): Order {
  return withoutDemands(
    order,
    demandsOf(order).filter((demand) => !demands.some((kept) => sameDemand(kept, demand))),
  );
}
