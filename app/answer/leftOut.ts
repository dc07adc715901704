import type { BlendOutcome, Order } from '../../src';
import type { Answer } from '../state/answerStore';

/** What a claim does not speak of: products without a price, stocks without the figures, cells nobody could read. */
export type NotCounted = Pick<Answer, 'omitted' | 'unread'>;

export const NOTHING_OMITTED: NotCounted = { omitted: [], unread: [] };

/** Stocks left out because something about them is not known. A stock without a flag asked for is ruled out instead. */
export function leftOutCount({ leftOut }: Pick<BlendOutcome, 'leftOut'>, { omitted }: NotCounted): number {
  return omitted.length + unknownStocks(leftOut).size;
}

function unknownStocks(leftOut: BlendOutcome['leftOut']): Set<string> {
  return new Set(leftOut.filter(({ reason }) => reason !== 'missing flag').map(({ stockId }) => stockId));
}

/** The stocks that the search could choose from, as far as their price and figures are known. */
export function countedStocks({ leftOut }: Pick<BlendOutcome, 'leftOut'>, { stocks }: Pick<Order, 'stocks'>): number {
  return stocks.length - new Set(leftOut.map(({ stockId }) => stockId)).size;
}

/** Cells not read of stocks that count all the same: their limits on use, say. */
export function unreadCount({ omitted, unread }: NotCounted): number {
  const left = new Set(omitted.map(({ productId }) => productId));
  return unread.filter(({ productId }) => !left.has(productId)).length;
}
