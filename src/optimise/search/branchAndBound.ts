import type { LinearEngine, LinearResult } from '../linear/linearEngine';
import type { ModelRow, SearchModel, ViLimits } from '../rows/searchModel';
import type { ResolvedOptions } from '../solveOptions';
import { keepsPresences, keepsWholeLots, nextChoice, presenceRows, roundedBounds } from './discreteChoices';
import { splitPoints } from './kv100Split';
import { mixViscosity } from './mixViscosity';
import { NodeHeap, type SearchNode } from './nodeHeap';
import { SearchProgram, type ShadowPrices } from './searchProgram';
import { viCurve } from './viCurve';
import { chord, lowerLine, offsetAbove, outerLines, tangent } from './viLine';
import { knot, pieceOf } from './viPieces';

/** What a search found: shares of the best recipe if any, its cost, and the proven bound. */
export interface SearchResult {
  stopped: 'finished' | 'time limit' | 'cancelled';
  /** All structural columns of the best recipe. */
  best?: { values: Float64Array; cost: number };
  /** Proven lower bound of the cost; +Infinity where it is proven that there is no recipe. */
  lowerBound: number;
  /** Rows that the proofs of impossibility lean on, and whether the viscosity index is among them. */
  conflict: { rows: ModelRow[]; usesVi: boolean };
  nodes: number;
  linearPrograms: number;
}

/** Half width of the interval around a solution in which a recipe is sought, relative to KV100 [-]. */
const NEAR = 2e-4;
/** An interval of KV100 that spans less than this factor is narrow: its outer lines are as good as the curve. */
const NARROW = 1.002;
/** Rounds of moving the tangent to where the solution goes. */
const MOST_TANGENTS = 4;
/** A viscosity index that misses its limit by less than this many points is on it. */
const ON_LIMIT = 1e-7;
/** An interval of KV100 narrower than this (relative) is not split; it keeps its bound. */
const NARROWEST = 1e-11;
const PAUSE_EVERY_MS = 8;
const PROGRESS_EVERY_MS = 100;

type Solution = Extract<LinearResult, { status: 'optimal' }>;

/** Bounds of the columns in a part of the search. */
interface Box {
  lower: Float64Array;
  upper: Float64Array;
}

const MOST_PRICES = 3;

function isNarrow({ kv100 }: SearchNode): boolean {
  return kv100 !== undefined && kv100.to <= kv100.from * NARROW;
}

/** Accepts shares as a recipe: the exact check in physical units. */
export type RecipeCheck = (values: Float64Array) => boolean;

/** Branch and bound over the discrete choices and KV100, on one linear program re-solved hot. */
export class BranchAndBound {
  readonly #program: SearchProgram;
  readonly #rows: ModelRow[];
  readonly #open = new NodeHeap();
  readonly #conflictRows = new Set<number>();
  #usesVi = false;
  /** Prices of the latest solves near a recipe, newest first. */
  readonly #prices: ShadowPrices[] = [];
  /** `tied`: a stock could come in, or go, at no change in cost. */
  #best: { values: Float64Array; cost: number; tied: boolean } | undefined;
  /** Least bound among the parts that were closed by cost, or could not be settled. */
  #closedBound = Infinity;
  #nodes = 0;

  constructor(
    engine: LinearEngine,
    readonly model: SearchModel,
    readonly options: ResolvedOptions,
    readonly isRecipe: RecipeCheck,
  ) {
    this.#program = new SearchProgram(engine, model);
    this.#rows = presenceRows(model);
  }

  async run(): Promise<SearchResult> {
    try {
      this.#open.push(this.#root());
      const stopped = await this.#loop();
      if (stopped === 'finished') this.#chooseAmongEquals();
      return this.#result(stopped);
    } finally {
      this.#program.dispose();
    }
  }

  #root(): SearchNode {
    const { vi } = this.model;
    if (!vi) return { bound: -Infinity, depth: 0 };
    return { bound: -Infinity, depth: 0, kv100: { from: vi.kv100.from, to: Math.max(vi.kv100.from, vi.kv100.to) } };
  }

  async #loop(): Promise<SearchResult['stopped']> {
    const { now, timeLimitMs, isCancelled, pause, onProgress } = this.options;
    const start = now();
    let lastPause = start;
    let lastProgress = start;
    for (let node = this.#open.pop(); node; node = this.#open.pop()) {
      if (node.bound >= this.#cutoff()) {
        this.#close(node.bound);
        continue;
      }
      const time = now();
      if (isCancelled()) return this.#putBack(node, 'cancelled');
      if (time - start > timeLimitMs) return this.#putBack(node, 'time limit');
      if (time - lastPause > PAUSE_EVERY_MS) {
        await pause();
        lastPause = now();
      }
      this.#settle(node);
      if (time - lastProgress > PROGRESS_EVERY_MS) {
        onProgress(this.#progress(time - start));
        lastProgress = time;
      }
    }
    return 'finished';
  }

  #putBack(node: SearchNode, stopped: SearchResult['stopped']): SearchResult['stopped'] {
    this.#open.push(node);
    return stopped;
  }

  #progress(milliseconds: number) {
    const lowerBound = this.#lowerBound();
    return {
      milliseconds,
      nodes: this.#nodes,
      ...(this.#best ? { bestCost: this.#best.cost } : {}),
      ...(Number.isFinite(lowerBound) ? { lowerBound } : {}),
    };
  }

  /** A part whose bound reaches this holds nothing better by more than the gap asked for. */
  #cutoff(): number {
    if (!this.#best) return Infinity;
    return this.#best.cost - this.options.relativeGap * (this.model.gapReference ?? Math.abs(this.#best.cost));
  }

  #close(bound: number): void {
    this.#closedBound = Math.min(this.#closedBound, bound);
  }

  /** Solves one part: bounds it, tries a recipe in it, and splits it unless it is settled. */
  #settle(node: SearchNode): void {
    this.#nodes++;
    const box = this.#boxOf(node);
    if (!box || this.#isClosedByPrices(node, box)) return;
    this.#load(node, box);
    const result = this.#program.solve();
    if (result.status === 'infeasible' && result.ray && this.#isCertified(result.ray)) return;
    if (result.status !== 'optimal') {
      this.#splitBlindly(node);
      return;
    }
    const open: SearchNode = { ...node, bound: Math.max(node.bound, this.#program.boundOf(result.duals)) };
    if (open.bound >= this.#cutoff()) {
      this.#close(open.bound);
      return;
    }
    if (this.#isSettledBy(result.values) && this.#offer(result)) {
      // The recipe sits a rounding above the bound: nothing is left to split.
      this.#close(open.bound);
      return;
    }
    if (this.#isWorthTrying(open)) this.#tryNear(open, result.values);
    if (!this.#isClosedByPrices(open, box)) this.#split(open, box, result.values);
  }

  /** Bounds of the columns in a part; undefined where the part is empty. */
  #boxOf(node: SearchNode): Box | undefined {
    const lower = Float64Array.from(this.model.lower);
    const upper = Float64Array.from(this.model.upper);
    for (let change = node.changes; change; change = change.parent) {
      lower[change.column] = Math.max(lower[change.column], change.lower);
      upper[change.column] = Math.min(upper[change.column], change.upper);
    }
    for (let column = 0; column < lower.length; column++) {
      if (lower[column] > upper[column]) return undefined;
    }
    return { lower, upper };
  }

  /** Puts the bounds and lines of a part into the program. */
  #load(node: SearchNode, { lower, upper }: Box): void {
    for (let column = 0; column < lower.length; column++) this.#program.setBounds(column, lower[column], upper[column]);
    if (node.kv100) this.#setOuterRows(node.kv100);
  }

  /** Closes a part without a solve where prices found near the best recipe already bound it far enough. */
  #isClosedByPrices(node: SearchNode, { lower, upper }: Box): boolean {
    for (const prices of this.#prices) {
      const bound = this.#program.shadowBound(prices, this.#offsetAbove(prices, node), lower, upper);
      node.bound = Math.max(node.bound, bound);
    }
    if (node.bound < this.#cutoff()) return false;
    this.#close(node.bound);
    return true;
  }

  /** How high a line of the prices' slope must lie to be above the curve over a part. */
  #offsetAbove({ line }: ShadowPrices, { kv100 }: SearchNode): number {
    const { vi } = this.model;
    if (!vi?.min || !kv100 || !line) return 0;
    return offsetAbove(viCurve(vi.index, vi.min.value), kv100.from, kv100.to, line.slope);
  }

  #setOuterRows({ from, to }: { from: number; to: number }): void {
    const { vi } = this.model;
    if (!vi) return;
    const { index, min, max } = vi;
    this.#program.setViRows({
      from: index.toIndex(from),
      to: index.toIndex(to),
      ...(min ? { above: outerLines(viCurve(index, min.value), from, to) } : {}),
      ...(max ? { below: lowerLine(viCurve(index, max.value), from, to) } : {}),
    });
  }

  #isCertified(ray: Float64Array): boolean {
    const { proven, rows, usesVi } = this.#program.certifies(ray);
    if (!proven) return false;
    for (const row of rows) this.#conflictRows.add(row);
    this.#usesVi ||= usesVi;
    return true;
  }

  #isSettledBy(values: Float64Array): boolean {
    const { model } = this;
    if (!keepsPresences(model, this.#rows, values) || !keepsWholeLots(model, values)) return false;
    return !model.vi || mixViscosity(model.vi, values).missed <= ON_LIMIT;
  }

  /** Takes a solution as the best recipe if it is one and cheaper; true where it is a recipe. */
  #offer({ values, duals }: Solution): boolean {
    if (!this.isRecipe(values)) return false;
    const cost = this.#costOf(values);
    if (this.#best && cost >= this.#best.cost) return true;
    const tied = this.#program.idleColumns(values, duals).includes(true);
    this.#best = { values: Float64Array.from(values), cost, tied };
    return true;
  }

  /**
   * A recipe is sought in every part until there is one, and in narrow parts, where it is the answer. Elsewhere now and
   * then: with discrete choices in every fourth part after the first twenty, else ever more rarely.
   */
  #isWorthTrying(node: SearchNode): boolean {
    if (!this.#best || isNarrow(node)) return true;
    if (this.model.presences.length > 0 || this.model.wholeLots.length > 0)
      return this.#nodes <= 20 || this.#nodes % 4 === 0;
    return Number.isInteger(Math.log2(this.#nodes) / 2);
  }

  /** Looks for a recipe near a solution: choices rounded, KV100 close by, the curve's own line in place of the outer one. */
  #tryNear(node: SearchNode, values: Float64Array): void {
    const { model } = this;
    const { lower, upper } = this.#program;
    const discrete = roundedBounds(model, this.#rows, values, lower, upper);
    if (discrete.some((bound) => bound.lower > bound.upper)) return;
    for (const bound of discrete) this.#program.setBounds(bound.column, bound.lower, bound.upper);
    if (model.vi && node.kv100) this.#setInnerRows(this.#followTangents(model.vi, node.kv100, values), node.kv100);
    const result = this.#program.solve();
    if (result.status !== 'optimal') return;
    if (this.#isSettledBy(result.values) && this.#offer(result)) this.#remember(result.duals);
  }

  /** Moves the tangent of the curve to where the solution goes, until it stays: KV100 of a recipe worth trying. */
  #followTangents(vi: ViLimits, within: { from: number; to: number }, values: Float64Array): number {
    let { kv100 } = mixViscosity(vi, values);
    if (!vi.min || within.to <= within.from * NARROW) return kv100;
    const curve = viCurve(vi.index, vi.min.value);
    for (let round = 0; round < MOST_TANGENTS; round++) {
      const line = tangent(curve, Math.min(within.to, Math.max(within.from, kv100)));
      this.#program.setViRows({
        from: vi.index.toIndex(within.from),
        to: vi.index.toIndex(within.to),
        above: [line, line],
        ...(vi.max ? { below: lowerLine(viCurve(vi.index, vi.max.value), within.from, within.to) } : {}),
      });
      const result = this.#program.solve();
      if (result.status !== 'optimal') return kv100;
      const next = mixViscosity(vi, result.values).kv100;
      const moved = Math.abs(next / kv100 - 1);
      kv100 = next;
      if (!(moved > NEAR / 2)) {
        this.#remember(result.duals);
        return kv100;
      }
    }
    return kv100;
  }

  #remember(duals: Float64Array): void {
    this.#prices.unshift(this.#program.pricesOf(duals));
    this.#prices.length = Math.min(this.#prices.length, MOST_PRICES);
  }

  /** Rows for a narrow interval around a KV100, within one piece, that only mixes on the right side of the curve keep. */
  #setInnerRows(kv100: number, within: { from: number; to: number }): void {
    const { vi } = this.model;
    if (!vi) return;
    const centre = Math.min(within.to, Math.max(within.from, Number.isFinite(kv100) ? kv100 : within.from));
    const piece = pieceOf(centre);
    const from = Math.max(within.from, knot(piece), centre * (1 - NEAR));
    const to = Math.max(from, Math.min(within.to, knot(piece + 1), centre * (1 + NEAR)));
    const line = vi.min && chord(viCurve(vi.index, vi.min.value), from, to);
    this.#program.setViRows({
      from: vi.index.toIndex(from),
      to: vi.index.toIndex(to),
      ...(line ? { above: [line, line] as const } : {}),
      ...(vi.max ? { below: tangent(viCurve(vi.index, vi.max.value), Math.min(to, Math.max(from, centre))) } : {}),
    });
  }

  #split(node: SearchNode, { lower, upper }: Box, values: Float64Array): void {
    const { model } = this;
    const missed = model.vi ? mixViscosity(model.vi, values) : undefined;
    const choice = nextChoice(model, this.#rows, values, lower, upper);
    const farOff = missed !== undefined && missed.missed > 1;
    if (choice && !(farOff && this.#splitKv100(node, missed.kv100))) {
      for (const alternative of choice.alternatives) {
        let changes = node.changes;
        for (const bounds of alternative) changes = changes ? { ...bounds, parent: changes } : { ...bounds };
        this.#open.push({ ...node, depth: node.depth + 1, ...(changes ? { changes } : {}) });
      }
      return;
    }
    if (choice) return;
    if (!missed || !this.#splitKv100(node, missed.kv100)) this.#close(node.bound);
  }

  /** Splits the interval of KV100 at a solution's value; false where it is too narrow. */
  #splitKv100(node: SearchNode, kv100: number): boolean {
    if (!node.kv100) return false;
    const { from, to } = node.kv100;
    if (to - from <= NARROWEST * to) return false;
    const points = splitPoints(from, to, kv100);
    let start = from;
    for (const end of [...points, to]) {
      this.#open.push({ ...node, depth: node.depth + 1, kv100: { from: start, to: end } });
      start = end;
    }
    return true;
  }

  /** The engine gave no answer that can be trusted: split where possible, else the part keeps its bound. */
  #splitBlindly(node: SearchNode): void {
    const middle = node.kv100 ? Math.sqrt(node.kv100.from * node.kv100.to) : 0;
    if (!this.#splitKv100(node, middle)) this.#close(node.bound);
  }

  #lowerBound(): number {
    const bound = Math.min(this.#closedBound, this.#open.leastBound);
    return this.#best ? Math.min(this.#best.cost, bound) : bound;
  }

  /**
   * Among recipes of the proven cost the same one is always taken, the one of least rank sum: only columns that cost
   * nothing to move may move, so that no trace of a dearer stock slips in under the ceiling.
   */
  #chooseAmongEquals(): void {
    const best = this.#best;
    const { model } = this;
    const box = this.#boxOf({ bound: 0, depth: 0 });
    if (!best?.tied || !box) return;
    const program = this.#program;
    this.#load(this.#root(), box);
    for (const bound of roundedBounds(model, this.#rows, best.values, program.lower, program.upper)) {
      program.setBounds(bound.column, bound.lower, bound.upper);
    }
    const root = this.#root().kv100;
    if (model.vi && root) this.#setInnerRows(mixViscosity(model.vi, best.values).kv100, root);
    const again = program.solve();
    if (again.status !== 'optimal') return;
    const idle = program.idleColumns(again.values, again.duals);
    if (!idle.includes(true)) return;
    idle.forEach((isIdle, column) => {
      if (isIdle) return;
      if (again.values[column] <= program.lower[column] + 1e-9)
        program.setBounds(column, program.lower[column], program.lower[column]);
    });
    const { length } = model.stocks;
    const ranks = Float64Array.from(model.cost, (_, column) => (column < length ? 1 + column / length : 0));
    const result = program.solveForTie(ranks, best.cost);
    if (result.status !== 'optimal' || !this.#isSettledBy(result.values) || !this.isRecipe(result.values)) return;
    const cost = this.#costOf(result.values);
    if (cost <= best.cost + 1e-9 * Math.abs(best.cost))
      this.#best = { ...best, values: Float64Array.from(result.values), cost };
  }

  #costOf(values: Float64Array): number {
    return this.model.cost.reduce((sum, price, column) => sum + price * values[column], 0);
  }

  #result(stopped: SearchResult['stopped']): SearchResult {
    return {
      stopped,
      ...(this.#best ? { best: { values: this.#best.values, cost: this.#best.cost } } : {}),
      lowerBound: this.#lowerBound(),
      conflict: { rows: [...this.#conflictRows].map((row) => this.model.rows[row]), usesVi: this.#usesVi },
      nodes: this.#nodes,
      linearPrograms: this.#program.solves,
    };
  }
}
