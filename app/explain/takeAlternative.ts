import type { Alternative, BlendOutcome, Product } from '../../src';
import { tell } from '../state/viewStore';
import { editWorkbook, useWorkbook } from '../state/workbookStore';

type StockIds = readonly string[];

const stocksOf = (recipe: Alternative['recipe'] | BlendOutcome['recipe']): string[] =>
  (recipe ?? []).filter(({ massFraction }) => massFraction > 0).map(({ stockId }) => stockId);

/**
 * The stocks that have to be kept out for an alternative to be the cheapest: what it does without of every cheaper
 * recipe. It lacks at least one stock of each, so all of these become impossible, and nothing else that is cheaper.
 */
export function stocksToKeepOut(outcome: BlendOutcome, list: readonly Alternative[], place: number): string[] {
  const used = new Set(stocksOf(list[place]?.recipe));
  const cheaper = [stocksOf(outcome.recipe), ...list.slice(0, place).map(({ recipe }) => stocksOf(recipe))];
  return [...new Set(cheaper.flat())].filter((id) => !used.has(id));
}

function productOf(products: readonly Product[], stockId: string): string | undefined {
  return products.find(({ id, lots }) => id === stockId || lots.some((lot) => lot.id === stockId))?.id;
}

/**
 * The products to keep out for an alternative. Undefined where keeping products out cannot tell the two apart: it uses
 * another lot of one of them.
 */
export function productsToKeepOut(products: readonly Product[], out: StockIds, used: StockIds): string[] | undefined {
  const inUse = new Set(used.map((id) => productOf(products, id)));
  const ids = out.map((id) => productOf(products, id));
  if (ids.some((id) => id === undefined || inUse.has(id))) return undefined;
  return [...new Set(ids)].filter((id) => id !== undefined);
}

/** Keeps those products out of the order, as one step back. */
export function takeAlternative(orderId: string, productIds: StockIds): void {
  const { products, orders } = useWorkbook.getState().workbook;
  const order = orders.find(({ id }) => id === orderId);
  if (!order) return;
  editWorkbook('use another recipe', (draft) => {
    const edited = draft.orders.find(({ id }) => id === orderId);
    if (edited) edited.excludedProductIds = [...new Set([...edited.excludedProductIds, ...productIds])];
  });
  const names = products.filter(({ id }) => productIds.includes(id)).map(({ name }) => name);
  tell(`Kept out of ${order.name}: ${names.join(', ')}. Undo takes it back.`);
}
