import type { Order } from '../../optimise/order';

/** As low as prices are looked at: zero, or below the lowest by as much as the greatest is from zero. */
export function lowestPrice({ stocks }: Order): number {
  const prices = stocks.map((stock) => stock.pricePerTonne);
  const lowest = Math.min(...prices);
  return lowest > 0 ? 0 : lowest - Math.max(1, ...prices.map(Math.abs));
}

/** As high as prices are looked at: ten times the greatest. */
export function highestPrice({ stocks }: Order): number {
  return 10 * Math.max(1, ...stocks.map((stock) => Math.abs(stock.pricePerTonne)));
}
