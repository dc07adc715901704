import { pricesRise } from '../optimise/rows/priceSegments';
import type { Product } from './workbook';

/** What the cells of amounts are called in messages, by their key in `Product.unread`. */
const NAMES: Readonly<Record<string, string>> = {
  pricePerTonne: 'price',
  availableTonnes: 'quantity on hand',
  leastDoseIfUsed: 'least dose',
  greatestDose: 'greatest dose',
  lotTonnes: 'drum size',
  flushCost: 'flush cost',
  priceSteps: 'price steps',
};

/** Amounts that bound how much of a product may be used: unknown, they are not "no bound". */
const BOUNDS = ['greatestDose', 'leastDoseIfUsed', 'availableTonnes', 'lotTonnes', 'flushCost', 'priceSteps'] as const;

/** True where the cell holds an amount of the product, not a figure of it. */
export const isAmount = (cell: string): boolean => Object.hasOwn(NAMES, cell);

export function unreadAmount(product: Product, cell: string): string | undefined {
  return isAmount(cell) && Object.hasOwn(product.unread ?? {}, cell) ? product.unread?.[cell] : undefined;
}

/** "A: the price “9oo” is not a number. Type it again or exclude the product." */
export function notANumber(name: string, cell: string, typed: string): string {
  return `${name}: the ${NAMES[cell]} “${typed}” is not a number. Type it again or exclude the product.`;
}

/**
 * Why a product's bounds keep it out of every order: a bound that was typed and cannot be read, or that cannot be
 * right. Left in without its bound, the product could be used beyond what the user allows.
 */
export function boundProblems(product: Product): string[] {
  return BOUNDS.flatMap((cell) => {
    const typed = unreadAmount(product, cell);
    if (typed !== undefined) return [notANumber(product.name, cell, typed)];
    const wrong = wrongAmount(product, cell);
    return wrong ? [`${product.name}: the ${NAMES[cell]} ${wrong} Correct it or exclude the product.`] : [];
  });
}

function wrongAmount(product: Product, cell: (typeof BOUNDS)[number]): string | undefined {
  if (cell === 'availableTonnes') return wrongQuantity(product);
  if (cell === 'lotTonnes') return (product.lotTonnes ?? 1) > 0 ? undefined : 'must be more than zero.';
  if (cell === 'flushCost') return (product.flushCost ?? 0) >= 0 ? undefined : 'must not be below zero.';
  if (cell === 'priceSteps')
    return pricesRise(product) ? 'must fall with the quantity, or count for the excess.' : undefined;
  return wrongShare(product[cell]);
}

/** Shares are told as the table shows them, in per cent. */
function wrongShare(share: number | undefined): string | undefined {
  if (share === undefined || (share >= 0 && share <= 1)) return undefined;
  return `is ${Number((share * 100).toPrecision(12))} %, and must be 0 to 100 %.`;
}

function wrongQuantity({ lots }: Product): string | undefined {
  const below = lots.find(({ availableTonnes }) => availableTonnes !== undefined && availableTonnes < 0);
  return below && `is ${below.availableTonnes} t, and must not be below zero.`;
}
