import type { Order } from '../../optimise/order';
import type { BlendOutcome } from '../../optimise/outcome';
import { isCompulsory } from '../../optimise/rows/candidates';
import type { SolveOptions } from '../../optimise/solveOptions';
import type { Recipe } from '../../stock/stock';
import type { RoundedRecipe } from '../explanation';
import { kv100Of, LimitedSolves } from '../limitedSolves';
import { withoutStocks } from '../withoutStocks';
import { fixedRecipe, quickCheck } from './fixedRecipe';
import { inLots, snapped } from './orderInLots';
import { roundingCandidates } from './roundingCandidates';
import { isWholeSteps, roundingGrid } from './roundingGrid';

/** A recipe in steps, and the stocks whose share is no whole number of them. */
export interface RecipeInSteps extends RoundedRecipe {
  /** Exact doses and whole drums that are no whole number of steps, and the stock that makes up the mix for them. */
  offStep: string[];
}

/** Part of the time for steps of the stocks in use alone: few enough for a quick answer where there are many stocks. */
const PART_FOR_OWN_STOCKS = 0.3;
/** What is left after them is for looking at what was found. */
const PART_FOR_ALL_STOCKS = 0.9;

interface Checked {
  recipe: Recipe;
  costPerTonne: number;
  objective: number;
}

/**
 * The recipe in whole steps of the mass fraction, on specification still. First every share of the recipe is rounded up
 * or down so that they add up, the cheapest on specification first; then the order is solved with every stock in lots
 * of a step, those of the recipe alone and then all, which betters the recipe or proves it. What keeps the order is judged by solving it with
 * the rounded shares as exact doses, so every rule counts.
 *
 * An exact dose stays what it is, and so does a stock in whole drums. Where these are no whole number of steps, or one
 * is no whole number of them, the stock of the greatest share makes up the mix (`offStep` names them all); `proven`
 * then counts recipes in which that stock does so. A dose that is exact on the base oil can seldom be kept in steps.
 *
 * Undefined where no such recipe was found. One time limit covers all: `timeLimitMs`, default 500 ms. Throws RangeError
 * for a step that is not above 0 and below 1.
 */
export async function roundRecipe(
  order: Order,
  outcome: BlendOutcome,
  step: number,
  options: SolveOptions = {},
): Promise<RecipeInSteps | undefined> {
  if (!(step > 0 && step < 1)) throw new RangeError(`The step must be above 0 and below 1, not ${step}.`);
  const { recipe, costPerTonne: cost } = outcome;
  if (!recipe || cost === undefined) return undefined;
  const solves = new LimitedSolves(options, 500);
  const near = kv100Of(outcome);
  const grid = roundingGrid(order, recipe, step);

  const check = async (candidate: Recipe): Promise<Checked | undefined> => {
    const fixed = fixedRecipe(order, candidate);
    const found = fixed && (await solves.solve(fixed, near));
    if (found?.costPerTonne === undefined || found.objective === undefined) return undefined;
    const sorted = [...candidate].sort((a, b) => (a.stockId < b.stockId ? -1 : 1));
    return { recipe: sorted, costPerTonne: found.costPerTonne, objective: found.objective };
  };
  let best = await firstThatKeeps(roundingCandidates(grid, order.stocks), quickCheck(order), check, solves);
  const solveInLots = async (offered: Order, part: number): Promise<BlendOutcome | undefined> => {
    if (solves.stopped) return undefined;
    const lots = await solves.solve(inLots(offered, grid), near, part);
    const found = lots.recipe && (await check(snapped(order, grid, lots.recipe)));
    if (found && !(best && best.objective <= found.objective)) best = found;
    return lots;
  };
  await solveInLots(onlyStocksOf(order, recipe), PART_FOR_OWN_STOCKS);
  const lots = await solveInLots(order, PART_FOR_ALL_STOCKS);
  if (!best) return undefined;

  const least = lots?.proof.kind === 'least cost' ? lots.objective : lots?.proof.lowerBound;
  const roundingCosts = best.costPerTonne - cost;
  return {
    recipe: best.recipe,
    step,
    costPerTonne: best.costPerTonne,
    roundingCosts: Math.abs(roundingCosts) < 1e-9 * Math.abs(cost) ? 0 : roundingCosts,
    proven: least !== undefined && best.objective <= least + 2 * solves.relativeGap * Math.abs(best.objective),
    offStep: best.recipe.filter((line) => !isWholeSteps(line.massFraction, step)).map((line) => line.stockId),
  };
}

/** The order with what a recipe does not use left out, but for compulsory stocks. */
function onlyStocksOf(order: Order, recipe: Recipe): Order {
  const used = new Set(recipe.map((line) => line.stockId));
  const others = order.stocks.filter(({ id }) => !used.has(id) && !isCompulsory(order, id));
  return withoutStocks(
    order,
    others.map((stock) => stock.id),
  );
}

async function firstThatKeeps(
  candidates: readonly Recipe[],
  isLikely: (recipe: Recipe) => boolean,
  check: (recipe: Recipe) => Promise<Checked | undefined>,
  solves: LimitedSolves,
): Promise<Checked | undefined> {
  for (const candidate of candidates) {
    if (solves.stopped) return undefined;
    const found = isLikely(candidate) ? await check(candidate) : undefined;
    if (found) return found;
  }
  return undefined;
}
