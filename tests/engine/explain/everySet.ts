import type { Order } from '../../../src/index';
import { orderRows } from '../../oracle/orderRows';
import { searchRows } from '../../oracle/sliceSearch';

export interface Found {
  cost: number;
  stocks: string[];
}

/** The cheapest recipe of every set of stocks, each set solved alone by the second way (slices over KV100, HiGHS). */
export function cheapestOfEverySet(order: Order): Found[] | undefined {
  const rows = orderRows(order);
  const found: Found[] = [];
  for (let mask = 1; mask < 1 << rows.stocks.length; mask++) {
    const upper = rows.upper.map((high, i) => (mask & (1 << i) ? high : 0));
    if (rows.lower.some((low, i) => low > upper[i])) continue;
    const answer = searchRows({ ...rows, upper }, Infinity);
    if (answer.status === 'undecided') return undefined;
    if (answer.status !== 'solved') continue;
    const used = answer.recipe.filter((line) => line.massFraction > 1e-7);
    found.push({ cost: answer.cost, stocks: used.map((line) => line.stockId) });
  }
  return found.sort((a, b) => a.cost - b.cost);
}
