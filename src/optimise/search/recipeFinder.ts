import type { LinearResult } from '../linear/linearEngine';
import type { ModelRow, SearchModel, ViLimits } from '../rows/searchModel';
import type { Box } from './box';
import { keepsPresences, keepsWholeLots, roundedBounds } from './discreteChoices';
import { mixViscosity } from './mixViscosity';
import type { SearchProgram, ShadowPrices, ViRows } from './searchProgram';
import { innerRows, isNarrow, type Kv100Interval, NEAR, outerRows, tangentRows } from './viRows';

export type Solution = Extract<LinearResult, { status: 'optimal' }>;

/** Accepts shares as a recipe: the exact check in physical units. */
export type RecipeCheck = (values: Float64Array) => boolean;

/** The cheapest recipe so far. `tied`: a stock could come in, or go, at no change in cost. */
interface Best {
  values: Float64Array;
  cost: number;
  tied: boolean;
}

/** A viscosity index that misses its limit by less than this many points is on it. */
const ON_LIMIT = 1e-7;
/** Rounds of moving the tangent to where the solution goes. */
const MOST_TANGENTS = 3;
/** Windows of KV100 around a solution, relative: the first, around a guess and around a good one; how they change. */
const WIDE_WINDOW = 0.15;
const CLOSE_WINDOW = 0.0025;
const WINDOW_SHRINKS_BY = 6;
const WINDOW_GROWS_BY = 5;
const MOST_WINDOWS = 8;
/** Prices of this many latest solves are kept to bound other parts with. */
const MOST_PRICES = 3;

/** Finds recipes near solutions of the relaxed program, keeps the cheapest, and the prices around it. */
export class RecipeFinder {
  readonly #program: SearchProgram;
  readonly #model: SearchModel;
  readonly #rows: readonly ModelRow[];
  readonly #isRecipe: RecipeCheck;
  best: Best | undefined;
  /** Prices of the latest solves near a recipe, newest first. */
  readonly prices: ShadowPrices[] = [];

  constructor(program: SearchProgram, presenceRows: readonly ModelRow[], isRecipe: RecipeCheck) {
    this.#program = program;
    this.#model = program.model;
    this.#rows = presenceRows;
    this.#isRecipe = isRecipe;
  }

  /** Takes a solution that keeps every choice and limit, if it is a recipe; true where it is one. */
  take({ values, duals }: Solution): boolean {
    if (!this.#isSettledBy(values) || !this.#isRecipe(values)) return false;
    const cost = this.#costOf(values);
    if (this.best && cost >= this.best.cost) return true;
    const tied = this.#program.idleColumns(values, duals).includes(true);
    this.best = { values: Float64Array.from(values), cost, tied };
    return true;
  }

  /** Looks for a recipe near a solution: choices rounded, KV100 close by, the curve's own line in place of the outer one. */
  tryNear(values: Float64Array, interval: Kv100Interval | undefined): void {
    const { vi } = this.#model;
    if (!this.#settleChoices(values)) return;
    if (vi && interval) this.#program.setViRows(innerRows(vi, interval, this.#kv100Near(vi, interval, values)));
    const result = this.#program.solve();
    if (result.status === 'optimal' && this.take(result)) this.#remember(result.duals);
  }

  /** Looks for a recipe near a KV100 known from a similar order; true where there is one. */
  startNear(kv100: number, interval: Kv100Interval): boolean {
    const { vi, presences, wholeLots } = this.#model;
    if (!vi?.min || presences.length > 0 || wholeLots.length > 0 || Number.isNaN(kv100)) return false;
    const place = this.#closeIn(vi, interval, Math.min(interval.to, Math.max(interval.from, kv100)), CLOSE_WINDOW);
    this.#program.setViRows(innerRows(vi, interval, place));
    const result = this.#program.solve();
    if (result.status !== 'optimal' || !this.take(result)) return false;
    this.#remember(result.duals);
    return true;
  }

  /**
   * Among recipes of the proven cost the same one is always taken, the one of least rank sum: only columns that cost
   * nothing to move may move, so that no trace of a dearer stock slips in under the ceiling.
   */
  chooseAmongEquals(box: Box, interval: Kv100Interval | undefined): void {
    const { best } = this;
    const { vi, stocks, cost } = this.#model;
    if (!best?.tied) return;
    this.#program.setBox(box);
    if (!this.#settleChoices(best.values)) return;
    if (vi && interval) this.#program.setViRows(innerRows(vi, interval, mixViscosity(vi, best.values).kv100));
    const again = this.#program.solve();
    if (again.status !== 'optimal') return;
    this.#program.holdColumns(again.values, this.#program.idleColumns(again.values, again.duals));
    const ranks = Float64Array.from(cost, (_, column) => (column < stocks.length ? 1 + column / stocks.length : 0));
    const result = this.#program.solveForTie(ranks, best.cost);
    if (result.status !== 'optimal' || !this.#isSettledBy(result.values) || !this.#isRecipe(result.values)) return;
    const found = this.#costOf(result.values);
    const isEqual = found <= best.cost + 1e-9 * Math.abs(best.cost);
    if (isEqual) this.best = { ...best, values: Float64Array.from(result.values), cost: found };
  }

  #isSettledBy(values: Float64Array): boolean {
    const { vi } = this.#model;
    if (!keepsPresences(this.#model, this.#rows, values) || !keepsWholeLots(this.#model, values)) return false;
    return !vi || mixViscosity(vi, values).missed <= ON_LIMIT;
  }

  #costOf(values: Float64Array): number {
    return this.#model.cost.reduce((sum, price, column) => sum + price * values[column], 0);
  }

  /** Puts rounded discrete choices into the program; false where they leave nothing. */
  #settleChoices(values: Float64Array): boolean {
    const { lower, upper } = this.#program;
    const bounds = roundedBounds(this.#model, this.#rows, values, lower, upper);
    if (bounds.some((bound) => bound.lower > bound.upper)) return false;
    for (const bound of bounds) this.#program.setBounds(bound.column, bound.lower, bound.upper);
    return true;
  }

  /** KV100 of a recipe worth trying, from that of a relaxed solution. */
  #kv100Near(vi: ViLimits, interval: Kv100Interval, values: Float64Array): number {
    const { kv100 } = mixViscosity(vi, values);
    if (!vi.min || isNarrow(interval)) return kv100;
    return this.#followTangents(vi, interval, kv100) ?? this.#closeIn(vi, interval, kv100, WIDE_WINDOW);
  }

  /** Moves the tangent of the curve to where the solution goes, until it stays; undefined where it does not. */
  #followTangents(vi: ViLimits, interval: Kv100Interval, start: number): number | undefined {
    let kv100 = start;
    let before = 1;
    for (let round = 0; round < MOST_TANGENTS; round++) {
      const found = this.#solutionUnder(vi, tangentRows(vi, interval, kv100));
      if (found === undefined) return undefined;
      const moved = Math.abs(found / kv100 - 1);
      kv100 = found;
      // Steps shrink as their squares (Newton's method), so the next one is known without taking it.
      const next = round === 0 ? moved : (moved * moved) / before;
      if (moved <= NEAR || next <= NEAR / 10) return kv100;
      before = moved;
    }
    return undefined;
  }

  /**
   * Follows the solution under the outer lines of ever smaller windows: for where the curve bends at the knots of
   * Table 1 and a tangent of one piece leads astray.
   */
  #closeIn(vi: ViLimits, interval: Kv100Interval, start: number, widest: number): number {
    let kv100 = start;
    let reach = widest;
    for (let round = 0; round < MOST_WINDOWS && reach > NEAR; round++) {
      const from = Math.max(interval.from, kv100 / (1 + reach));
      const to = Math.min(interval.to, kv100 * (1 + reach));
      const found = this.#solutionUnder(vi, outerRows(vi, { from, to }));
      if (found === undefined) return kv100;
      kv100 = found;
      const atEnd =
        (found < from * (1 + NEAR) && from > interval.from) || (found > to * (1 - NEAR) && to < interval.to);
      if (!atEnd) reach /= WINDOW_SHRINKS_BY;
      else if (round === 0) reach = Math.min(WIDE_WINDOW, reach * WINDOW_GROWS_BY);
    }
    return kv100;
  }

  /** KV100 of the least-cost solution under some rows; undefined where there is none. */
  #solutionUnder(vi: ViLimits, rows: ViRows): number | undefined {
    this.#program.setViRows(rows);
    const result = this.#program.solve();
    if (result.status !== 'optimal') return undefined;
    this.#remember(result.duals);
    return mixViscosity(vi, result.values).kv100;
  }

  #remember(duals: Float64Array): void {
    this.prices.unshift(this.#program.pricesOf(duals));
    this.prices.length = Math.min(this.prices.length, MOST_PRICES);
  }
}

/** Sets the program to a part: its box, and the outer rows of its interval. */
export function loadPart(program: SearchProgram, box: Box, interval: Kv100Interval | undefined): void {
  const { vi } = program.model;
  program.setBox(box);
  if (vi && interval) program.setViRows(outerRows(vi, interval));
}
