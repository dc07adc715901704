import { breakEven } from './breakEven';
import type { EntryPrice } from './explanation';
import { lowestPrice } from './farPrices';
import type { SolvesAgain } from './solvesAgain';

/** For each stock that could be used and is not: the price below which it would be. */
export async function* entryPrices(again: SolvesAgain): AsyncGenerator<EntryPrice> {
  const { order, outcome } = again;
  const leftOut = new Set(outcome.leftOut.map((entry) => entry.stockId));
  const used = new Set(outcome.recipe?.map((line) => line.stockId));
  const unused = order.stocks.filter((stock) => !leftOut.has(stock.id) && !used.has(stock.id));
  // By id, as the search does: answers do not depend on the order of the list.
  for (const { id, pricePerTonne } of unused.sort((a, b) => (a.id < b.id ? -1 : 1))) {
    const { price, proven } = await breakEven(again, id, pricePerTonne, lowestPrice(order));
    yield { stockId: id, pricePerTonne, ...(price === undefined ? {} : { entersBelow: price }), proven };
  }
}
