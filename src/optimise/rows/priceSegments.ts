import type { Stock } from '../../stock/stock';

/**
 * A stretch of tonnes over which the cost of a stock in a batch is a straight line: fixed + price · tonnes. With prices
 * for all tonnes the line starts at zero; with prices for the excess it carries what the tonnes before cost more.
 */
export interface PriceSegment {
  /** Tonnes [t] from which on, and up to which, the line holds. */
  from: number;
  to: number;
  pricePerTonne: number;
  fixed: number;
}

/** The stretches of a stock's cost, in order. One alone where it has no price steps. */
export function priceSegments({ pricePerTonne, priceSteps = [], priceStepsFor }: Stock): PriceSegment[] {
  const steps = [{ fromTonnes: 0, pricePerTonne }, ...[...priceSteps].sort((a, b) => a.fromTonnes - b.fromTonnes)];
  let before = 0;
  return steps.map((step, place) => {
    const to = steps[place + 1]?.fromTonnes ?? Infinity;
    const fixed = priceStepsFor === 'the excess' ? before - step.pricePerTonne * step.fromTonnes : 0;
    before = fixed + step.pricePerTonne * to;
    return { from: step.fromTonnes, to, pricePerTonne: step.pricePerTonne, fixed };
  });
}

/** Whether a price for all tonnes rises with the quantity: it would have no least cost at the step. */
export function pricesRise({
  pricePerTonne,
  priceSteps = [],
  priceStepsFor,
}: Pick<Stock, 'priceSteps' | 'priceStepsFor'> & { pricePerTonne?: number }): boolean {
  if (priceStepsFor === 'the excess') return false;
  const steps = [...priceSteps].sort((a, b) => a.fromTonnes - b.fromTonnes).map((step) => step.pricePerTonne);
  const prices = pricePerTonne === undefined ? steps : [pricePerTonne, ...steps];
  return prices.some((price, place) => price > prices[place - 1]);
}

/**
 * What so many tonnes of a stock cost in a batch, flush included. From a step on its price holds; a quantity that is
 * below it by no more than `slack` [t] is at it.
 */
export function costOfTonnes(stock: Stock, tonnes: number, slack: number): number {
  if (!(tonnes > 0)) return 0;
  const segment = priceSegments(stock).findLast(({ from }) => tonnes + slack >= from);
  return (segment?.fixed ?? 0) + (segment?.pricePerTonne ?? stock.pricePerTonne) * tonnes + (stock.flushCost ?? 0);
}
