import type { Order } from '../../optimise/order';
import { doseShares } from '../../optimise/rows/doseShares';
import type { Recipe } from '../../stock/stock';
import { comesInDrums, exactShare, type RoundingGrid, shareOfSteps } from './roundingGrid';

/**
 * The order with every stock in lots of a step, so that solving it finds the cheapest recipe in steps. Exact doses and
 * drums stay as they are; the stock that makes up the mix is free, and so follows from the others.
 */
export function inLots(order: Order, { step, fill }: RoundingGrid): Order {
  const { batchTonnes } = order;
  const isFixed = typeof batchTonnes === 'number';
  const batch = typeof batchTonnes === 'object' ? batchTonnes.min : (batchTonnes ?? 1);
  const stocks = order.stocks.map((stock) => {
    const { lotTonnes: _, flushCost, priceSteps, availableTonnes, ...rest } = stock;
    const kept = exactShare(order, stock.id) !== undefined || fill?.stockId === stock.id;
    return {
      ...rest,
      // Without a batch nothing on hand is counted, without a fixed one no flush cost and no price step: nor are they here.
      ...(availableTonnes !== undefined && batchTonnes !== undefined ? { availableTonnes } : {}),
      ...(flushCost !== undefined && isFixed ? { flushCost } : {}),
      ...(priceSteps !== undefined && isFixed ? { priceSteps } : {}),
      ...(comesInDrums(order, stock.id) ? { lotTonnes: stock.lotTonnes } : kept ? {} : { lotTonnes: step * batch }),
    };
  });
  const doses = order.doses?.map((dose) => doseShares(dose, order));
  return { ...order, stocks, batchTonnes: batch, ...(doses ? { doses } : {}) };
}

/** The exact shares that a solution in lots stands for. */
export function snapped(order: Order, { step, fill }: RoundingGrid, recipe: Recipe): Recipe {
  const lines = recipe.map(({ stockId, massFraction }) => {
    const exactly = exactShare(order, stockId);
    if (exactly !== undefined) return { stockId, massFraction: exactly };
    if (comesInDrums(order, stockId)) return { stockId, massFraction };
    return { stockId, massFraction: shareOfSteps(Math.round(massFraction / step), step) };
  });
  if (!fill) return lines.filter((line) => line.massFraction > 0);
  const others = lines.filter((line) => line.stockId !== fill.stockId && line.massFraction > 0);
  const massFraction = 1 - others.reduce((sum, line) => sum + line.massFraction, 0);
  return massFraction > 1e-9 ? [...others, { stockId: fill.stockId, massFraction }] : others;
}
