import type { Figure } from '../stock/figure';
import type { Stock } from '../stock/stock';
import { boundProblems, isAmount, notANumber, unreadAmount } from './amountProblems';
import { isUndosedAdditive } from './undosedAdditives';
import type { Lot, Product, Workbook, WorkbookOrder } from './workbook';

/** A product that an order cannot use, and why. */
export interface OmittedProduct {
  productId: string;
  name: string;
  /** The sentence for the user: what is wrong and what to do. */
  message: string;
}

/** A cell whose text could not be read, in a product that is used all the same: the figure counts as unknown. */
export interface UnreadCell {
  productId: string;
  /** Column, as in `Product.unread`: "pricePerTonne", "kv@40". */
  cell: string;
  message: string;
}

/** The column of a figure, "noack" or "kv@40": the key of `Product.unread`. */
export function cellOf({ property, celsius }: Pick<Figure, 'property' | 'celsius'>): string {
  return celsius === undefined ? property : `${property}@${celsius}`;
}

/** The product's figures that count: those whose cell stands unread do not. */
function readFigures({ figures, unread = {} }: Product): Figure[] {
  return figures.filter((figure) => !Object.hasOwn(unread, cellOf(figure)));
}

/** The lot's figures, and the product's where the lot has none. */
function lotFigures(product: Product, lot: Lot): Figure[] {
  const own = new Set(lot.figures.map(cellOf));
  return [...lot.figures, ...readFigures(product).filter((figure) => !own.has(cellOf(figure)))];
}

/** Tonnes on hand: the sum over the lots where all are known, since unknown is not zero [t]. */
function tonnesOnHand(lots: readonly Lot[]): number | undefined {
  if (lots.length === 0) return undefined;
  let sum = 0;
  for (const { availableTonnes } of lots) {
    if (availableTonnes === undefined) return undefined;
    sum += availableTonnes;
  }
  return sum;
}

function stockOf(
  product: Product,
  own: Pick<Stock, 'id' | 'name' | 'pricePerTonne' | 'figures' | 'availableTonnes'>,
): Stock {
  const { family, blendWeight, leastDoseIfUsed, greatestDose, lotTonnes, flushCost, priceSteps, priceStepsFor, flags } =
    product;
  const optional = {
    blendWeight,
    leastDoseIfUsed,
    greatestDose,
    lotTonnes,
    flushCost,
    priceSteps,
    priceStepsFor,
    flags,
  };
  const given = Object.entries(optional).filter(([, value]) => value !== undefined);
  const { availableTonnes, ...rest } = own;
  const onHand = availableTonnes === undefined ? {} : { availableTonnes };
  return { ...rest, family, ...Object.fromEntries(given), ...onHand };
}

const isPrice = (price: number | undefined): price is number => price !== undefined;

function priceMessage(product: Product, lot?: Lot): string {
  const typed = unreadAmount(product, 'pricePerTonne');
  const name = lot ? `${product.name} · ${lot.name}` : product.name;
  return typed === undefined
    ? `${name} has no price: give one or exclude it.`
    : notANumber(name, 'pricePerTonne', typed);
}

/** One product as the engine's stocks: itself, or its lots. Empty where `trouble` says why. */
export interface ProductStocks {
  product: Product;
  stocks: Stock[];
  trouble: string[];
}

function typicalStock(product: Product): ProductStocks {
  const { id, name } = product;
  const price = product.unread?.pricePerTonne === undefined ? product.pricePerTonne : undefined;
  if (!isPrice(price)) return { product, stocks: [], trouble: [priceMessage(product)] };
  const own = {
    id,
    name,
    pricePerTonne: price,
    figures: readFigures(product),
    availableTonnes: tonnesOnHand(product.lots),
  };
  return { product, stocks: [stockOf(product, own)], trouble: [] };
}

function lotStocks(product: Product): ProductStocks {
  if (product.lots.length === 0) {
    const message = `${product.name} has no lots: add one, exclude it, or solve on products.`;
    return { product, stocks: [], trouble: [message] };
  }
  const productPrice = product.unread?.pricePerTonne === undefined ? product.pricePerTonne : undefined;
  const result: ProductStocks = { product, stocks: [], trouble: [] };
  for (const lot of product.lots) {
    const price = lot.pricePerTonne ?? productPrice;
    if (!isPrice(price)) {
      result.trouble.push(priceMessage(product, lot));
      continue;
    }
    const name = `${product.name} · ${lot.name}`;
    const { id, availableTonnes } = lot;
    const figures = lotFigures(product, lot);
    result.stocks.push(stockOf(product, { id, name, pricePerTonne: price, figures, availableTonnes }));
  }
  return result;
}

/** The stocks of every product the order may use: products, or lots on hand. */
export function productStocks({ products }: Workbook, order: WorkbookOrder): ProductStocks[] {
  const excluded = new Set(order.excludedProductIds);
  const usable = products.filter((product) => !excluded.has(product.id) && !isUndosedAdditive(product, order));
  const asStocks = order.solveOn === 'lots' ? lotStocks : typicalStock;
  return usable.map((product) => {
    const trouble = boundProblems(product);
    return trouble.length > 0 ? { product, stocks: [], trouble } : asStocks(product);
  });
}

/** The unread cells of a product's figures, each with what was typed. Amounts leave their product out, which says so. */
export function unreadCells({ id, name, unread = {} }: Product): UnreadCell[] {
  return Object.entries(unread)
    .filter(([cell]) => !isAmount(cell))
    .map(([cell, text]) => ({
      productId: id,
      cell,
      message: `${name}: “${text}” is not a number, so the figure counts as unknown. Type it again.`,
    }));
}
