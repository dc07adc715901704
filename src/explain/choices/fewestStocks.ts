import type { Order } from '../../optimise/order';
import type { BlendOutcome } from '../../optimise/outcome';
import type { SolveOptions } from '../../optimise/solveOptions';
import { kv100Of, LimitedSolves } from '../limitedSolves';
import { AIM_TIME_MS, type AimedRecipe, ceilingOf, isProvenAbove, isUnder, USUAL_CEILING } from './aimedRecipe';

/**
 * The cheapest recipe with the fewest stocks that costs at most `within` (default 5 %) more than the cheapest: "most
 * stocks" is lowered below what the last recipe uses until no recipe under the ceiling is left. Since the least cost
 * rises as fewer stocks are allowed, the first number that is proven to be too dear proves all smaller ones so.
 *
 * The ceiling is in the order's cost basis. One time limit covers all solves, default 5 s. Undefined without a recipe.
 */
export async function fewestStocks(
  order: Order,
  outcome: BlendOutcome,
  options: SolveOptions & { within?: number } = {},
): Promise<AimedRecipe | undefined> {
  const { within = USUAL_CEILING, ...solveOptions } = options;
  const { recipe, costPerTonne } = outcome;
  if (!recipe || costPerTonne === undefined) return undefined;
  const solves = new LimitedSolves(solveOptions, AIM_TIME_MS);
  const ceiling = ceilingOf(outcome, within, solves.relativeGap);
  const best = { recipe, costPerTonne };
  let proven = true;
  let stopped: AimedRecipe['stopped'] = 'finished';

  while (best.recipe.length > 1) {
    const found = solves.stopped
      ? undefined
      : await solves.solve(atMost(order, best.recipe.length - 1), kv100Of(outcome));
    if (found?.recipe && found.costPerTonne !== undefined && isUnder(found, ceiling)) {
      best.recipe = found.recipe;
      best.costPerTonne = found.costPerTonne;
      // A search that was stopped may not have the cheapest recipe with so many stocks.
      proven = found.proof.kind === 'least cost';
      continue;
    }
    proven &&= found !== undefined && isProvenAbove(found, ceiling);
    const why = found ? found.stopped : solves.stopped;
    if (why === 'time limit' || why === 'cancelled') stopped = why;
    break;
  }
  return { ...best, dearerBy: best.costPerTonne - costPerTonne, proven, stopped, solves: solves.count };
}

function atMost(order: Order, mostStocks: number): Order {
  return { ...order, mostStocks };
}
