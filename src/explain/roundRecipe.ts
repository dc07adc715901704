import type { Order } from '../optimise/order';
import type { BlendOutcome } from '../optimise/outcome';
import { doseShares } from '../optimise/rows/doseShares';
import type { SolveOptions } from '../optimise/solveOptions';
import type { Recipe } from '../stock/stock';
import type { RoundedRecipe } from './explanation';
import { fixedRecipe, quickCheck } from './fixedRecipe';
import { kv100Of, LimitedSolves } from './limitedSolves';
import { roundingCandidates } from './roundingCandidates';
import { comesInDrums, exactShare, isWholeSteps, type RoundingGrid, roundingGrid, shareOfSteps } from './roundingGrid';

/** A recipe in steps, and the stocks whose share is no whole number of them. */
export interface RecipeInSteps extends RoundedRecipe {
  /** Exact doses and whole drums that are no whole number of steps, and the stock that makes up the mix for them. */
  offStep: string[];
}

interface Checked {
  recipe: Recipe;
  costPerTonne: number;
  objective: number;
}

/**
 * The order with every stock in lots of a step, so that solving it finds the cheapest recipe in steps. Exact doses and
 * drums stay as they are; the stock that makes up the mix is free, and so follows from the others.
 */
function inLots(order: Order, { step, fill }: RoundingGrid): Order {
  const { batchTonnes } = order;
  const isFixed = typeof batchTonnes === 'number';
  const batch = typeof batchTonnes === 'object' ? batchTonnes.min : (batchTonnes ?? 1);
  const stocks = order.stocks.map((stock) => {
    const { lotTonnes: _, flushCost, availableTonnes, ...rest } = stock;
    const kept = exactShare(order, stock.id) !== undefined || fill?.stockId === stock.id;
    return {
      ...rest,
      // Without a batch nothing on hand is counted, without a fixed one no flush cost: nor are they here.
      ...(availableTonnes !== undefined && batchTonnes !== undefined ? { availableTonnes } : {}),
      ...(flushCost !== undefined && isFixed ? { flushCost } : {}),
      ...(comesInDrums(order, stock.id) ? { lotTonnes: stock.lotTonnes } : kept ? {} : { lotTonnes: step * batch }),
    };
  });
  const doses = order.doses?.map((dose) => doseShares(dose, order));
  return { ...order, stocks, batchTonnes: batch, ...(doses ? { doses } : {}) };
}

/** The exact shares that a solution in lots stands for. */
function snapped(order: Order, { step, fill }: RoundingGrid, recipe: Recipe): Recipe {
  const lines = recipe.map(({ stockId, massFraction }) => {
    const exactly = exactShare(order, stockId);
    if (exactly !== undefined) return { stockId, massFraction: exactly };
    if (comesInDrums(order, stockId)) return { stockId, massFraction };
    return { stockId, massFraction: shareOfSteps(Math.round(massFraction / step), step) };
  });
  if (!fill) return lines.filter((line) => line.massFraction > 0);
  const others = lines.filter((line) => line.stockId !== fill.stockId && line.massFraction > 0);
  const massFraction = 1 - others.reduce((sum, line) => sum + line.massFraction, 0);
  return massFraction > 1e-9 ? [...others, { stockId: fill.stockId, massFraction }] : others;
}

/**
 * The recipe in whole steps of the mass fraction, on specification still. First every share of the recipe is rounded up
 * or down so that they add up, the cheapest on specification first; then the order is solved with every stock in lots
 * of a step, unused ones too, which betters the recipe or proves it. What keeps the order is judged by solving it with
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
  const nearby = await firstThatKeeps(roundingCandidates(grid, order.stocks), quickCheck(order), check, solves);
  const lots = solves.stopped ? undefined : await solves.solve(inLots(order, grid), near);
  const solved = lots?.recipe && (await check(snapped(order, grid, lots.recipe)));
  const best = solved && !(nearby && nearby.objective <= solved.objective) ? solved : nearby;
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
