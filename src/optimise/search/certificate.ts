import type { SearchModel } from '../rows/searchModel';

/** The least or greatest share of a stock in the model. */
export interface StockBound {
  stock: number;
  end: 'least' | 'most';
}

/** A proof that nothing meets the rows: places of the rows, and bounds of stocks, that it leans on. */
export interface Certificate {
  proven: boolean;
  rows: number[];
  usesVi: boolean;
  bounds: StockBound[];
}

/** Bounds of stocks that a proof needs: those that cannot all be loosened to 0 or 1 with the proof still standing. */
export function neededBounds(
  proof: number,
  reduced: Float64Array,
  { stocks, lower, upper }: SearchModel,
): StockBound[] {
  const losses = stocks.flatMap((_, stock): { bound: StockBound; loss: number }[] => {
    const price = reduced[stock];
    if (price > 0 && lower[stock] > 0) return [{ bound: { stock, end: 'least' }, loss: price * lower[stock] }];
    if (price < 0 && upper[stock] < 1) return [{ bound: { stock, end: 'most' }, loss: -price * (1 - upper[stock]) }];
    return [];
  });
  let slack = proof;
  return losses
    .sort((a, b) => a.loss - b.loss)
    .flatMap(({ bound, loss }) => {
      if (slack - loss <= 0) return [bound];
      slack -= loss;
      return [];
    });
}
