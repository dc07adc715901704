import type { LinearEngine } from '../linear/linearEngine';
import type { ModelRow, SearchModel } from '../rows/searchModel';
import type { ResolvedOptions } from '../solveOptions';
import { keepsPresences, keepsWholeLots, nextChoice, presenceRows, roundedBounds } from './discreteChoices';
import { splitPoints } from './kv100Split';
import { mixViscosity } from './mixViscosity';
import { NodeHeap, type SearchNode } from './nodeHeap';
import { SearchProgram } from './searchProgram';
import { lowerLine, outerLines } from './viLine';
import { curveAt } from './viCurve';
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
const NEAR = 5e-4;
/** A viscosity index that misses its limit by less than this many points is on it. */
const ON_LIMIT = 1e-7;
/** An interval of KV100 narrower than this (relative) is not split; it keeps its bound. */
const NARROWEST = 1e-11;
const PAUSE_EVERY_MS = 8;
const PROGRESS_EVERY_MS = 100;

/** Accepts shares as a recipe: the exact check in physical units. */
export type RecipeCheck = (values: Float64Array) => boolean;

/** Branch and bound over the discrete choices and KV100, on one linear program re-solved hot. */
export class BranchAndBound {
  readonly #program: SearchProgram;
  readonly #rows: ModelRow[];
  readonly #open = new NodeHeap();
  readonly #conflictRows = new Set<number>();
  #usesVi = false;
  #best: { values: Float64Array; cost: number } | undefined;
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
    if (!this.#load(node)) return;
    const result = this.#program.solve();
    if (result.status === 'infeasible') {
      if (result.ray && this.#isCertified(result.ray)) return;
      this.#splitBlindly(node);
      return;
    }
    if (result.status === 'unknown') {
      this.#splitBlindly(node);
      return;
    }
    const bound = Math.max(node.bound, this.#program.boundOf(result.duals));
    const open: SearchNode = { ...node, bound };
    if (bound >= this.#cutoff()) {
      this.#close(bound);
      return;
    }
    const { values } = result;
    if (this.#isSettledBy(values) && this.#offer(values)) {
      // The recipe sits a rounding above the bound: nothing is left to split.
      this.#close(bound);
      return;
    }
    this.#tryNear(open, values);
    if (bound >= this.#cutoff()) {
      this.#close(bound);
      return;
    }
    this.#split(open, values);
  }

  /** Puts the bounds and lines of a part into the program; false where the part is empty. */
  #load(node: SearchNode): boolean {
    const { model } = this;
    const lower = Float64Array.from(model.lower);
    const upper = Float64Array.from(model.upper);
    for (let change = node.changes; change; change = change.parent) {
      lower[change.column] = Math.max(lower[change.column], change.lower);
      upper[change.column] = Math.min(upper[change.column], change.upper);
    }
    for (let column = 0; column < lower.length; column++) {
      if (lower[column] > upper[column]) return false;
    }
    for (let column = 0; column < lower.length; column++) this.#program.setBounds(column, lower[column], upper[column]);
    if (node.kv100) this.#setOuterRows(node.kv100);
    return true;
  }

  #setOuterRows({ from, to }: { from: number; to: number }): void {
    const { vi } = this.model;
    if (!vi) return;
    const { index, min, max } = vi;
    this.#program.setViRows({
      from: index.toIndex(from),
      to: index.toIndex(to),
      ...(min ? { above: outerLines({ index, vi: min.value }, from, to) } : {}),
      ...(max ? { below: lowerLine({ index, vi: max.value }, from, to) } : {}),
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
  #offer(values: Float64Array): boolean {
    const cost = this.#costOf(values);
    if (this.#best && cost >= this.#best.cost) return this.isRecipe(values);
    if (!this.isRecipe(values)) return false;
    this.#best = { values: Float64Array.from(values), cost };
    return true;
  }

  /** Looks for a recipe near a solution: choices rounded, KV100 close by, the curve's own line in place of the outer one. */
  #tryNear(node: SearchNode, values: Float64Array): void {
    const { model } = this;
    const { lower, upper } = this.#program;
    const discrete = roundedBounds(model, this.#rows, values, lower, upper);
    if (discrete.some((bound) => bound.lower > bound.upper)) return;
    for (const bound of discrete) this.#program.setBounds(bound.column, bound.lower, bound.upper);
    if (model.vi && node.kv100) this.#setInnerRows(mixViscosity(model.vi, values).kv100, node.kv100);
    const result = this.#program.solve();
    if (result.status === 'optimal' && this.#isSettledBy(result.values)) this.#offer(result.values);
  }

  /** Rows for a narrow interval around a KV100, within one piece, that only mixes on the right side of the curve keep. */
  #setInnerRows(kv100: number, within: { from: number; to: number }): void {
    const { vi } = this.model;
    if (!vi) return;
    const centre = Math.min(within.to, Math.max(within.from, Number.isFinite(kv100) ? kv100 : within.from));
    const piece = pieceOf(centre);
    const from = Math.max(within.from, knot(piece), centre * (1 - NEAR));
    const to = Math.max(from, Math.min(within.to, knot(piece + 1), centre * (1 + NEAR)));
    const chord = (value: number) => {
      const a = curveAt({ index: vi.index, vi: value }, piece, from);
      const b = curveAt({ index: vi.index, vi: value }, piece, to);
      const slope = b.u > a.u ? (b.g - a.g) / (b.u - a.u) : a.slope;
      return { offset: a.g - slope * a.u, slope };
    };
    const tangent = (value: number) => {
      const a = curveAt({ index: vi.index, vi: value }, piece, centre > to ? to : Math.max(from, centre));
      return { offset: a.g - a.slope * a.u, slope: a.slope };
    };
    const line = vi.min && chord(vi.min.value);
    this.#program.setViRows({
      from: vi.index.toIndex(from),
      to: vi.index.toIndex(to),
      ...(line ? { above: [line, line] as const } : {}),
      ...(vi.max ? { below: tangent(vi.max.value) } : {}),
    });
  }

  #split(node: SearchNode, values: Float64Array): void {
    const { model } = this;
    const missed = model.vi ? mixViscosity(model.vi, values) : undefined;
    if (!this.#load(node)) return;
    const choice = nextChoice(model, this.#rows, values, this.#program.lower, this.#program.upper);
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
    if (!best || !this.#load({ bound: 0, depth: 0 })) return;
    const program = this.#program;
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
      if (again.values[column] <= program.lower[column] + 1e-9) program.setBounds(column, program.lower[column], program.lower[column]);
    });
    const { length } = model.stocks;
    const ranks = Float64Array.from(model.cost, (_, column) => (column < length ? 1 + column / length : 0));
    const result = program.solveForTie(ranks, best.cost);
    if (result.status !== 'optimal' || !this.#isSettledBy(result.values) || !this.isRecipe(result.values)) return;
    const cost = this.#costOf(result.values);
    if (cost <= best.cost + 1e-9 * Math.abs(best.cost)) this.#best = { values: Float64Array.from(result.values), cost };
  }

  #costOf(values: Float64Array): number {
    return this.model.cost.reduce((sum, price, column) => sum + price * values[column], 0);
  }

  #result(stopped: SearchResult['stopped']): SearchResult {
    return {
      stopped,
      ...(this.#best ? { best: this.#best } : {}),
      lowerBound: this.#lowerBound(),
      conflict: { rows: [...this.#conflictRows].map((row) => this.model.rows[row]), usesVi: this.#usesVi },
      nodes: this.#nodes,
      linearPrograms: this.#program.solves,
    };
  }
}
