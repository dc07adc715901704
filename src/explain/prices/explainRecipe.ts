import type { Order } from '../../optimise/order';
import type { BlendOutcome } from '../../optimise/outcome';
import type { SolveOptions } from '../../optimise/solveOptions';
import type { Explanation } from '../explanation';
import { entryPrices } from './entryPrices';
import { limitPrices } from './limitPrices';
import { SolvesAgain, StoppedEarly } from './solvesAgain';
import { usedStocks } from './usedStocks';

export interface ExplainOptions extends SolveOptions {
  /** Told whenever a figure is done; a copy. */
  onPart?: (soFar: Explanation) => void;
}

/**
 * What a recipe's limits cost, what its stocks may cost, and what would bring the others in: each by solving the order
 * again with one thing changed. Limits come first, then the stocks in use, then the others.
 *
 * All costs are what the search makes least, `objective` of the outcome: per tonne, or per m³ where the order counts
 * cost so, with what deviations from aims count. Prices of stocks are per tonne always.
 *
 * The time limit (default 5 s) is one for all solves together; where it runs out, what was done stays, and `stopped`
 * says so. Throws RangeError for an outcome without a recipe, and for options that are no numbers.
 */
export async function explainRecipe(
  order: Order,
  outcome: BlendOutcome,
  options: ExplainOptions = {},
): Promise<Explanation> {
  const { onPart, ...solveOptions } = options;
  const again = new SolvesAgain(order, outcome, solveOptions);
  const found: Explanation = { limits: [], entries: [], used: [], stopped: 'finished', solves: 0 };
  const add = <T>(list: T[], part: T) => {
    list.push(part);
    found.solves = again.count;
    onPart?.({ ...found, limits: [...found.limits], entries: [...found.entries], used: [...found.used] });
  };
  try {
    for await (const price of limitPrices(again)) add(found.limits, price);
    for await (const stock of usedStocks(again)) add(found.used, stock);
    for await (const price of entryPrices(again)) add(found.entries, price);
  } catch (error) {
    if (!(error instanceof StoppedEarly)) throw error;
    found.stopped = error.reason;
  }
  found.solves = again.count;
  return found;
}
