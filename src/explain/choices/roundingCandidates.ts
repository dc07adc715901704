import type { Recipe, Stock } from '../../stock/stock';
import { type RoundingGrid, shareOfSteps } from './roundingGrid';

/** Most stocks of which every combination of up and down is tried; others go to the nearest step. */
const MOST_COMBINED = 12;
/** Most stocks of which steps beyond the next are tried too. */
const MOST_WIDENED = 6;

interface Place {
  stockId: string;
  /** Whole steps below the share. */
  floor: number;
  /** What is above them, in steps [0..1). */
  over: number;
  /** Taken up by the stock that makes up the mix [mass fraction]. */
  rest: number;
}

function placesOf({ step, stepped, fill }: RoundingGrid): Place[] {
  return stepped.map(({ stockId, massFraction }) => {
    const rest = fill?.stockId === stockId ? fill.rest : 0;
    const steps = (massFraction - rest) / step;
    const floor = Math.floor(steps + 1e-7);
    return { stockId, floor, over: Math.max(0, steps - floor), rest };
  });
}

/** Every way to move the places by one of the offsets each, so that together they move by `total`. */
function movesOf(places: readonly Place[], offsets: (place: Place) => readonly number[], total: number): number[][] {
  const moves: number[][] = [];
  const move: number[] = [];
  const ranges = places.map((place) => offsets(place));
  const most = ranges.map((range) => Math.max(...range));
  const least = ranges.map((range) => Math.min(...range));
  const sumFrom = (ends: number[], from: number) => ends.slice(from).reduce((sum, end) => sum + end, 0);
  const go = (left: number): void => {
    const at = move.length;
    if (left > sumFrom(most, at) || left < sumFrom(least, at)) return;
    if (at === places.length) {
      moves.push([...move]);
      return;
    }
    for (const offset of ranges[at]) {
      move.push(offset);
      go(left - offset);
      move.pop();
    }
  };
  go(total);
  return moves;
}

function nearest({ over }: Place): readonly number[] {
  return [Math.round(over)];
}

/** Stocks near half a step, of which both neighbours are tried. */
function combined(places: readonly Place[]): ReadonlySet<Place> {
  const byDoubt = [...places].sort((a, b) => Math.abs(a.over - 0.5) - Math.abs(b.over - 0.5));
  return new Set(byDoubt.slice(0, MOST_COMBINED));
}

/**
 * Recipes in steps near a recipe, each adding up to the mix: every share rounded up or down; then, for few stocks, up to
 * two steps away. The cheapest by price first in either group.
 */
export function roundingCandidates(grid: RoundingGrid, stocks: readonly Stock[]): Recipe[] {
  const { step, kept } = grid;
  const places = placesOf(grid);
  const price = new Map(stocks.map((stock) => [stock.id, stock.pricePerTonne]));
  const left = 1 - kept.reduce((sum, line) => sum + line.massFraction, 0) - (grid.fill?.rest ?? 0);
  const total = Math.round(left / step) - places.reduce((sum, place) => sum + place.floor, 0);
  const both = combined(places);
  const next = movesOf(places, (place) => (both.has(place) ? [0, 1] : nearest(place)), total);
  const wide = places.length <= MOST_WIDENED ? movesOf(places, () => [-1, 0, 1, 2], total) : [];
  const recipeOf = (move: readonly number[]): Recipe =>
    [
      ...kept,
      ...places.map(({ stockId, floor, rest }, i) => ({
        stockId,
        massFraction: floor + move[i] < 0 ? -1 : shareOfSteps(floor + move[i], step) + rest,
      })),
    ].filter((line) => line.massFraction !== 0);
  const costOf = (recipe: Recipe) =>
    recipe.reduce((sum, { stockId, massFraction }) => sum + massFraction * (price.get(stockId) ?? 0), 0);
  const ordered = (moves: number[][]) =>
    moves
      .map(recipeOf)
      .filter((recipe) => recipe.every((line) => line.massFraction > 0))
      .map((recipe) => ({ recipe, cost: costOf(recipe) }))
      .sort((a, b) => a.cost - b.cost)
      .map(({ recipe }) => recipe);
  return [...ordered(next), ...ordered(wide)];
}
