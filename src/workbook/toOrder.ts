import type { Order } from '../optimise/order';
import { engineRules, isRequired } from './engineRules';
import { type OmittedProduct, type ProductStocks, productStocks, type UnreadCell, unreadCells } from './engineStocks';
import { undosedNote } from './undosedAdditives';
import type { Workbook, WorkbookOrder } from './workbook';

/** An order of the workbook in the engine's terms, and what the user should know about the way there. */
export interface EngineOrder {
  order: Order;
  /** Products (or lots of them) that cannot be used, with the reason. Products the order excludes are not named. */
  omitted: OmittedProduct[];
  /** Cells that could not be read; their figures are unknown. */
  unread: UnreadCell[];
  notes: string[];
}

function omittedProducts(products: readonly ProductStocks[], order: WorkbookOrder): OmittedProduct[] {
  const required = new Set(order.doses.filter(isRequired).map(({ stockId }) => stockId));
  return products.flatMap(({ product, stocks, trouble }) =>
    trouble.map((message) => {
      const compulsory = stocks.length === 0 && required.has(product.id);
      const more = compulsory ? ' The order requires it, so nothing can be solved without it.' : '';
      return { productId: product.id, name: product.name, message: message + more };
    }),
  );
}

/** The requirement on products that the order itself excludes, or that are no longer there. */
function contradictions({ products }: Workbook, order: WorkbookOrder): OmittedProduct[] {
  const names = new Map(products.map(({ id, name }) => [id, name]));
  const excluded = new Set(order.excludedProductIds);
  return order.doses.filter(isRequired).flatMap(({ stockId: productId }) => {
    const name = names.get(productId);
    if (name === undefined) {
      const message = `The order requires a product that is not in the workbook (“${productId}”): remove the dose.`;
      return [{ productId, name: productId, message }];
    }
    if (!excluded.has(productId)) return [];
    return [{ productId, name, message: `${name} is required and excluded: allow it here or remove its dose.` }];
  });
}

/** Optional fields of the order that are given, and no others. */
function givenFields(workbook: Workbook, order: WorkbookOrder): Partial<Order> {
  const { batchTonnes, mostStocks, greatestDoseAsTheRest } = order;
  return {
    ...(batchTonnes === undefined ? {} : { batchTonnes }),
    ...(mostStocks === undefined ? {} : { mostStocks }),
    ...(greatestDoseAsTheRest === undefined ? {} : { greatestDoseAsTheRest }),
    ...(workbook.ownProperties.length === 0 ? {} : { ownProperties: workbook.ownProperties }),
  };
}

/**
 * Turns an order of the workbook into an engine order: products or lots become stocks, doses and shares on products
 * become rules on those stocks. Pure; changes neither argument.
 */
export function toOrder(workbook: Workbook, order: WorkbookOrder): EngineOrder {
  const products = productStocks(workbook, order);
  const { doses, shares, notes } = engineRules(order, products);
  return {
    order: {
      stocks: products.flatMap(({ stocks }) => stocks),
      limits: order.limits,
      doses,
      shares,
      depressant: order.depressant,
      viscosityRule: order.viscosityRule,
      costBasis: order.costBasis,
      ...givenFields(workbook, order),
    },
    omitted: [...omittedProducts(products, order), ...contradictions(workbook, order)],
    unread: products.flatMap(({ product }) => unreadCells(product)),
    notes: [...notes, ...undosedNote(workbook, order)],
  };
}
