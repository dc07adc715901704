/**
 * What a relative gap is counted on: the cost, or a thousandth of the greatest cost of a column where the cost is
 * near zero (free stocks, disposal prices), since no gap is small against nothing.
 */
export function gapReference(cost: number, columnCosts: ArrayLike<number>): number {
  let greatest = 0;
  for (let j = 0; j < columnCosts.length; j++) greatest = Math.max(greatest, Math.abs(columnCosts[j]));
  return Math.max(Math.abs(cost), greatest / 1000);
}
