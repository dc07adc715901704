import type { BlendOutcome } from '../../optimise/outcome';
import type { Recipe } from '../../stock/stock';

/** A recipe found for another aim than least cost, under a cost ceiling. */
export interface AimedRecipe {
  recipe: Recipe;
  costPerTonne: number;
  /** Cost above the cheapest, per tonne. */
  dearerBy: number;
  /** No recipe under the ceiling serves the aim better, to the step or gap stated. */
  proven: boolean;
  stopped: 'finished' | 'time limit' | 'cancelled';
  solves: number;
}

/** Greatest cost above the cheapest, as a part of it [-]. */
export const USUAL_CEILING = 0.05;

/** Time for all solves of an aim together [ms], where nothing else is said. */
export const AIM_TIME_MS = 5000;

/** The ceiling in the order's cost basis, deviations from aims included; the gap of a proof more than stated. */
export function ceilingOf({ objective = Number.NaN }: BlendOutcome, within: number, relativeGap: number): number {
  return objective + (within + 2 * relativeGap) * Math.abs(objective);
}

/** True where an outcome has a recipe under the ceiling. */
export function isUnder({ recipe, objective }: BlendOutcome, ceiling: number): boolean {
  return recipe !== undefined && objective !== undefined && objective <= ceiling;
}

/** True where it is proven that the order has no recipe under the ceiling. */
export function isProvenAbove({ proof }: BlendOutcome, ceiling: number): boolean {
  return proof.kind.startsWith('impossible') || (proof.lowerBound ?? -Infinity) > ceiling;
}
