import type { Order } from '../../optimise/order';
import { doseShares } from '../../optimise/rows/doseShares';
import type { Recipe, RecipeLine } from '../../stock/stock';

/** How the stocks of a recipe are to be rounded. Shares are mass fractions. */
export interface RoundingGrid {
  step: number;
  /** Stocks whose share stays: exact doses, and whole drums. */
  kept: RecipeLine[];
  /** Stocks whose share becomes a whole number of steps. */
  stepped: RecipeLine[];
  /**
   * Where the steps cannot make up the mix (an exact dose or a drum is no whole number of steps, or the batch is none),
   * the stock of the greatest share takes what is left of a step [mass fraction].
   */
  fill?: { stockId: string; rest: number };
}

const WHOLE = 1e-9;

export function isWholeSteps(share: number, step: number): boolean {
  const count = share / step;
  return Math.abs(count - Math.round(count)) <= WHOLE * Math.max(1, count);
}

/** A number of steps as a share, without the digits that binary fractions leave behind. */
export function shareOfSteps(count: number, step: number): number {
  return Number((count * step).toPrecision(12));
}

/** The exact share of the mix that a stock's dose asks for, if it does. */
export function exactShare(order: Order, stockId: string): number | undefined {
  const doses = (order.doses ?? []).filter((dose) => dose.stockId === stockId && dose.of !== 'base oil');
  return doses.map((dose) => doseShares(dose, order).exactly).find((share) => share !== undefined && share > 0);
}

/** True where the stock is charged in whole drums already. */
export function comesInDrums(order: Order, stockId: string): boolean {
  return (
    typeof order.batchTonnes === 'number' && order.stocks.some((s) => s.id === stockId && s.lotTonnes !== undefined)
  );
}

export function roundingGrid(order: Order, recipe: Recipe, step: number): RoundingGrid {
  const kept: RecipeLine[] = [];
  const stepped: RecipeLine[] = [];
  for (const line of recipe) {
    const exactly = exactShare(order, line.stockId);
    if (exactly !== undefined) kept.push({ stockId: line.stockId, massFraction: exactly });
    else if (comesInDrums(order, line.stockId)) kept.push(line);
    else stepped.push(line);
  }
  const left = 1 - kept.reduce((sum, line) => sum + line.massFraction, 0);
  if (isWholeSteps(left, step) || stepped.length === 0) return { step, kept, stepped };
  const greatest = stepped.reduce((a, b) => (b.massFraction > a.massFraction ? b : a));
  return { step, kept, stepped, fill: { stockId: greatest.stockId, rest: left - Math.floor(left / step) * step } };
}
