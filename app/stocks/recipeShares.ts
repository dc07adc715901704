import type { Product, Recipe } from '../../src';

/** Share of each product in a recipe [0..1]; a recipe on lots counts for their products. */
export function recipeShares(products: readonly Product[], recipe: Recipe | undefined): ReadonlyMap<string, number> {
  const shares = new Map<string, number>();
  if (!recipe) return shares;
  const productOf = new Map(
    products.flatMap(({ id, lots }) => [[id, id], ...lots.map((lot) => [lot.id, id] as const)] as const),
  );
  for (const { stockId, massFraction } of recipe) {
    const id = productOf.get(stockId);
    if (id !== undefined && massFraction > 0) shares.set(id, (shares.get(id) ?? 0) + massFraction);
  }
  return shares;
}
