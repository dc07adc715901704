import type { Order } from '../../optimise/order';
import { cubicMetresPerTonne } from '../../optimise/outcomeOf';
import type { Recipe } from '../../stock/stock';

/**
 * What one recipe costs as the prices change: `cost + Σ weight · (price - stated price)`. A weight is the mass of a
 * stock in a tonne of mix [-], or in a cubic metre of it [t/m³] where the order counts cost per m³. The least cost over
 * all recipes is the lower envelope of such lines: concave, and never falling in a price.
 */
export class CostLine {
  /**
   * @param cost at the prices of `order`.
   * @param weights of the stocks in the recipe.
   */
  constructor(
    readonly cost: number,
    readonly weights: ReadonlyMap<string, number>,
    private readonly prices: ReadonlyMap<string, number>,
  ) {}

  weight(stockId: string): number {
    return this.weights.get(stockId) ?? 0;
  }

  /** The same line, told at the prices of another order over the same stocks. */
  atPrices(order: Order): CostLine {
    const prices = pricesOf(order);
    let cost = this.cost;
    for (const [stockId, weight] of this.weights) {
      cost += weight * ((prices.get(stockId) ?? 0) - (this.prices.get(stockId) ?? 0));
    }
    return new CostLine(cost, this.weights, prices);
  }
}

function pricesOf(order: Order): Map<string, number> {
  return new Map(order.stocks.map((stock) => [stock.id, stock.pricePerTonne]));
}

/** The line of a recipe that costs so much at the prices of the order. */
export function costLine(order: Order, recipe: Recipe, cost: number): CostLine {
  const volume = order.costBasis === 'cubic metre' ? volumePerTonne(order, recipe) : 1;
  const weights = new Map(recipe.map(({ stockId, massFraction }) => [stockId, massFraction / volume]));
  return new CostLine(cost, weights, pricesOf(order));
}

/** m³ at 15 °C of a tonne of mix; every stock of a recipe at a cost per m³ has its density. */
function volumePerTonne(order: Order, recipe: Recipe): number {
  return recipe.reduce((volume, { stockId, massFraction }) => {
    const stock = order.stocks.find((candidate) => candidate.id === stockId);
    return volume + massFraction * ((stock && cubicMetresPerTonne(stock)) ?? Number.NaN);
  }, 0);
}
