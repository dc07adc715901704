import { predictBlend } from '../blend/predictBlend';
import type { PredictedProperties } from '../blend/predictedProperties';
import { stockValue } from '../blend/stockValue';
import type { Recipe, Stock } from '../stock/stock';
import { cautionsOf } from './cautions';
import { checkLimits, type ValueOf } from './checkLimits';
import { conflictOf } from './conflictInWords';
import { defaultEngine } from './defaultEngine';
import type { LinearEngine } from './linear/linearEngine';
import type { Order } from './order';
import type { BlendOutcome, LeftOut, OrderProblem, Proof } from './outcome';
import { recipeCheck, recipeOf } from './recipeCheck';
import { buildModel } from './rows/buildModel';
import { type Candidates, findCandidates, neededProperties, predictionOptions } from './rows/candidates';
import type { SearchModel } from './rows/searchModel';
import type { SearchResult } from './search/branchAndBound';
import { gapReference } from './search/gapReference';
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

  const invalid = validateOrder(order);
  if (invalid.length > 0) return refused(invalid, [], elapsed());
  const candidates = findCandidates(order);
  const unusable = candidates.stocks.length === 0 ? [nothingToBlend(candidates.leftOut)] : candidates.problems;
  if (unusable.length > 0) return refused(unusable, candidates.leftOut, elapsed());
  const { model, problems } = buildModel(order, candidates);
  if (problems.length > 0) return refused(problems, candidates.leftOut, elapsed());

  try {
    const engine = resolved.linearEngine ?? (await defaultEngine());
    const found = await search(order, candidates, model, engine, resolved);
    return outcomeOf(order, candidates, model, found, resolved, elapsed());
  } catch (error) {
    return engineFailed(error, candidates.leftOut, elapsed());
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

function cubicMetresPerTonne(stock: Stock): number | undefined {
  const density = stockValue(stock, { property: 'density', celsius: 15 }, {});
  return density.state === 'known' ? 1000 / density.value : undefined;
}

function outcomeOf(
  order: Order,
  candidates: Candidates,
  model: SearchModel,
  found: SearchResult,
  options: ResolvedOptions,
  milliseconds: number,
): BlendOutcome {
  const { leftOut } = candidates;
  const base = {
    stopped: found.stopped,
    proof: proofOf(found, model, leftOut, options.relativeGap),
    leftOut,
    problems: [],
    work: { nodes: found.nodes, linearPrograms: found.linearPrograms, milliseconds },
  };
  if (!found.best) {
    const conflict = conflictOf(order, model, found.conflict.rows, found.conflict.usesVi);
    const impossible = base.proof.kind !== 'none';
    return {
      ...base,
      checks: [],
      cautions: [],
      ...(impossible ? { conflict: conflict.limits, conflictRules: conflict.rules } : {}),
    };
  }
  const recipe = recipeOf(model, found.best.values);
  const properties = predictBlend(order.stocks, recipe, {
    ...predictionOptions(order),
    wanted: neededProperties(order),
  });
  const checks = checkLimits(order, valueOfPrediction(properties));
  return {
    ...base,
    recipe,
    ...costsOf(order.stocks, recipe),
    properties,
    checks,
    cautions: cautionsOf(order, recipe, properties, checks),
  };
}

function proofOf(found: SearchResult, model: SearchModel, leftOut: readonly LeftOut[], relativeGap: number): Proof {
  const { best, lowerBound } = found;
  if (!best) {
    if (lowerBound === Infinity) {
      const unknown = leftOut.some((entry) => entry.reason !== 'missing flag');
      return { kind: unknown ? 'impossible with known figures' : 'impossible' };
    }
    return Number.isFinite(lowerBound) ? { kind: 'none', lowerBound } : { kind: 'none' };
  }
  if (!Number.isFinite(lowerBound)) return { kind: 'none' };
  const missing = best.cost - lowerBound;
  const gap = missing > 0 ? missing / gapReference(best.cost, model.cost) : 0;
  // A part closed at the cut-off lies one rounding beyond the gap asked for.
  return { kind: gap <= relativeGap * (1 + 1e-6) + 1e-12 ? 'least cost' : 'within gap', lowerBound, gap };
}

function valueOfPrediction(predicted: PredictedProperties): ValueOf {
  return (property, celsius) =>
    predicted.properties.find((entry) => entry.property === property && entry.celsius === celsius)?.value;
}

/** Cost per tonne from prices and shares alone, and per m³ where every density is known. */
function costsOf(stocks: readonly Stock[], recipe: Recipe): Pick<BlendOutcome, 'costPerTonne' | 'costPerCubicMetre'> {
  let costPerTonne = 0;
  let volume: number | undefined = 0;
  for (const { stockId, massFraction } of recipe) {
    const stock = stocks.find((candidate) => candidate.id === stockId);
    if (!stock) continue;
    costPerTonne += stock.pricePerTonne * massFraction;
    const specific = cubicMetresPerTonne(stock);
    volume = volume === undefined || specific === undefined ? undefined : volume + specific * massFraction;
  }
  return volume ? { costPerTonne, costPerCubicMetre: costPerTonne / volume } : { costPerTonne };
}

function nothingToBlend(leftOut: readonly LeftOut[]): OrderProblem {
  const reasons = leftOut.slice(0, 3).map((entry) => entry.message);
  return { path: ['stocks'], message: `No stock can be used in this order. ${reasons.join(' ')}` };
}

function refused(problems: OrderProblem[], leftOut: LeftOut[], milliseconds: number): BlendOutcome {
  return {
    stopped: 'refused',
    proof: { kind: 'none' },
    checks: [],
    leftOut,
    cautions: [],
    problems,
    work: { nodes: 0, linearPrograms: 0, milliseconds },
  };
}

function engineFailed(error: unknown, leftOut: LeftOut[], milliseconds: number): BlendOutcome {
  const reason = error instanceof Error ? error.message : String(error);
  const message = `The solver failed (${reason}). Nothing is lost: solve again, or reload the page.`;
  return { ...refused([{ path: [], message }], leftOut, milliseconds), stopped: 'engine failed' };
}
