import type { LinearEngine } from '../linear/linearEngine';
import type { SearchModel } from '../rows/searchModel';
import type { ResolvedOptions } from '../solveOptions';
import { BranchAndBound, type SearchResult } from './branchAndBound';
import type { RecipeCheck } from './recipeFinder';

/** Least cost per tonne: one search. */
export function leastCostPerTonne(
  engine: LinearEngine,
  model: SearchModel,
  options: ResolvedOptions,
  isRecipe: RecipeCheck,
): Promise<SearchResult> {
  return new BranchAndBound(engine, model, options, isRecipe).run();
}

const MOST_ROUNDS = 12;

function volumeOf(specificVolumes: Float64Array, values: ArrayLike<number>): number {
  return specificVolumes.reduce((sum, volume, i) => sum + volume * values[i], 0);
}

function costOf(model: SearchModel, values: ArrayLike<number>): number {
  return model.cost.reduce((sum, price, j) => sum + price * values[j], 0);
}

/**
 * Least cost per cubic metre: Dinkelbach's method. With a trial price θ per m³ the search minimises cost - θ·volume;
 * where the least difference is zero, θ is the least cost per m³. Two or three searches. A lower bound D of the
 * difference proves cost/volume ≥ θ + D/(least volume) for D ≤ 0.
 *
 * @param specificVolumes m³ per tonne of each stock, along the model's stocks.
 */
export async function leastCostPerCubicMetre(
  engine: LinearEngine,
  model: SearchModel,
  specificVolumes: Float64Array,
  options: ResolvedOptions,
  isRecipe: RecipeCheck,
): Promise<SearchResult> {
  const leastVolume = Math.min(...specificVolumes);
  const greatestVolume = Math.max(...specificVolumes);
  const start = options.now();
  // Costs and bounds of the single searches are not those of the whole: only its work is told.
  const quiet: ResolvedOptions = {
    ...options,
    onProgress: ({ nodes }) => options.onProgress({ milliseconds: options.now() - start, nodes }),
  };
  let found = await leastCostPerTonne(engine, model, quiet, isRecipe);
  let { best } = found;
  let lowerBound = perCubicMetre(found.lowerBound, leastVolume, greatestVolume);
  if (!best) return { ...found, lowerBound };
  let price = best.cost / volumeOf(specificVolumes, best.values);
  let { nodes, linearPrograms } = found;
  for (let round = 0; round < MOST_ROUNDS && found.stopped === 'finished'; round++) {
    const trial = price;
    const cost = model.cost.map((value, j) => value - (j < specificVolumes.length ? trial * specificVolumes[j] : 0));
    const gapReference = Math.max(1e-12, Math.abs(trial) * leastVolume) / 2;
    const rest = { ...quiet, timeLimitMs: Math.max(0, options.timeLimitMs - (options.now() - start)) };
    found = await leastCostPerTonne(engine, { ...model, cost, gapReference }, rest, isRecipe);
    nodes += found.nodes;
    linearPrograms += found.linearPrograms;
    if (found.best) {
      const ratio = costOf(model, found.best.values) / volumeOf(specificVolumes, found.best.values);
      if (ratio < price) {
        price = ratio;
        best = found.best;
      }
    }
    lowerBound = Math.max(lowerBound, trial + Math.min(0, found.lowerBound) / leastVolume);
    if (price - lowerBound <= options.relativeGap * Math.abs(price) || price >= trial) break;
  }
  const { stopped, conflict } = found;
  const { values } = best;
  return {
    stopped,
    conflict,
    best: { values, cost: price },
    lowerBound: Math.min(price, lowerBound),
    nodes,
    linearPrograms,
  };
}

/** A bound of the cost per tonne as one per m³, with the volume that makes it least. */
function perCubicMetre(perTonne: number, leastVolume: number, greatestVolume: number): number {
  return perTonne / (perTonne >= 0 ? greatestVolume : leastVolume);
}
