import { defaultEngine } from './defaultEngine';
import type { LinearEngine } from './linear/linearEngine';
import type { Order } from './order';
import type { BlendOutcome, LeftOut } from './outcome';
import { cubicMetresPerTonne, engineFailed, nothingUsable, outcomeOf, refused } from './outcomeOf';
import { recipeCheck } from './recipeCheck';
import { buildModel } from './rows/buildModel';
import { type Candidates, findCandidates } from './rows/candidates';
import type { SearchModel } from './rows/searchModel';
import type { SearchResult } from './search/branchAndBound';
import { leastCostPerCubicMetre, leastCostPerTonne } from './search/leastCost';
import { type ResolvedOptions, resolveOptions, type SolveOptions } from './solveOptions';
import { validateOrder } from './validateOrder';

/**
 * Finds the cheapest mix that meets an order, and proves it: the order is checked, stocks that cannot serve are set
 * aside by name, the order becomes linear rows, branch and bound over KV100 and the discrete choices closes the gap,
 * and the recipe is predicted anew and held against every limit in physical units.
 *
 * Never rejects for anything in the order: what is wrong comes back in `problems`. Throws RangeError for options that
 * are no numbers.
 */
export async function solveBlend(order: Order, options: SolveOptions = {}): Promise<BlendOutcome> {
  const resolved = resolveOptions(options);
  const start = resolved.now();
  const elapsed = () => resolved.now() - start;
  let leftOut: LeftOut[] = [];
  try {
    const invalid = validateOrder(order);
    if (invalid.length > 0) return refused(invalid, leftOut, elapsed());
    const candidates = findCandidates(order);
    leftOut = candidates.leftOut;
    if (candidates.problems.length > 0) return refused(candidates.problems, leftOut, elapsed());
    if (candidates.stocks.length === 0) return nothingUsable(leftOut, elapsed());
    const { model, problems } = buildModel(order, candidates);
    if (problems.length > 0) return refused(problems, leftOut, elapsed());
    const engine = resolved.linearEngine ?? (await defaultEngine());
    const found = await search(order, candidates, model, engine, resolved);
    return outcomeOf(order, candidates, model, found, resolved.relativeGap, elapsed());
  } catch (error) {
    return engineFailed(error, leftOut, elapsed());
  }
}

function search(
  order: Order,
  candidates: Candidates,
  model: SearchModel,
  engine: LinearEngine,
  options: ResolvedOptions,
): Promise<SearchResult> {
  const isRecipe = recipeCheck(order, candidates, model);
  if (order.costBasis !== 'cubic metre') return leastCostPerTonne(engine, model, options, isRecipe);
  const volumes = Float64Array.from(candidates.stocks, (stock) => cubicMetresPerTonne(stock) ?? Number.NaN);
  return leastCostPerCubicMetre(engine, model, volumes, options, isRecipe);
}
