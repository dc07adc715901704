import type { Order } from '../../optimise/order';
import { recipeCheck } from '../../optimise/recipeCheck';
import { buildModel } from '../../optimise/rows/buildModel';
import { findCandidates, isCompulsory } from '../../optimise/rows/candidates';
import type { Recipe } from '../../stock/stock';
import { withoutStocks } from '../withoutStocks';

/**
 * The order with one recipe left: every share but the greatest is an exact dose beside the order's own doses and rules.
 * Solving it says whether the recipe keeps the order, and what it costs. Undefined where a compulsory stock is missing.
 */
export function fixedRecipe(order: Order, recipe: Recipe): Order | undefined {
  const used = new Set(recipe.map((line) => line.stockId));
  const unused = order.stocks.filter((stock) => !used.has(stock.id)).map((stock) => stock.id);
  if (unused.some((id) => isCompulsory(order, id))) return undefined;
  const greatest = recipe.reduce((a, b) => (b.massFraction > a.massFraction ? b : a));
  const doses = recipe
    .filter((line) => line !== greatest)
    .map(({ stockId, massFraction }) => ({ stockId, exactly: massFraction }));
  const reduced = withoutStocks(order, unused);
  return { ...reduced, doses: [...(reduced.doses ?? []), ...doses] };
}

/** A quick look at recipes before they are solved: false where limits, bounds or share rules are surely missed. */
export function quickCheck(order: Order): (recipe: Recipe) => boolean {
  const candidates = findCandidates(order);
  const { model } = buildModel(order, candidates);
  const isRecipe = recipeCheck(order, candidates, model);
  return (recipe) => {
    const values = new Float64Array(model.cost.length);
    for (const { stockId, massFraction } of recipe) {
      const place = model.stocks.findIndex((stock) => stock.id === stockId);
      if (place < 0) return false;
      values[place] = massFraction;
    }
    return isRecipe(values);
  };
}
