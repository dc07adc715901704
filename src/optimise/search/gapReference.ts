/**
 * What a relative gap is counted on: the cost, or a thousandth of the greatest price of a stock where the cost is
 * near zero (free stocks, disposal prices), since no gap is small against nothing.
 */
export function gapReference(cost: number, prices: ArrayLike<number>): number {
  let greatest = 0;
  for (let j = 0; j < prices.length; j++) greatest = Math.max(greatest, Math.abs(prices[j]));
  return Math.max(Math.abs(cost), greatest / 1000);
}
