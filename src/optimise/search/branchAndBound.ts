import type { LinearEngine } from '../linear/linearEngine';
import type { ModelRow, SearchModel } from '../rows/searchModel';
import type { ResolvedOptions } from '../solveOptions';
import { type Box, boxOf } from './box';
import type { StockBound } from './certificate';
import { type Choice, nextChoice, presenceRows, undecidedChoice } from './discreteChoices';
import { gapReference } from './gapReference';
import { splitPoints } from './kv100Split';
import { mixViscosity } from './mixViscosity';
import { NodeHeap, type SearchNode } from './nodeHeap';
import { loadPart, type RecipeCheck, RecipeFinder } from './recipeFinder';
import { SearchProgram, type ShadowPrices } from './searchProgram';
import { viCurve } from './viCurve';
import { offsetAbove } from './viLine';
import { isNarrow, type Kv100Interval } from './viRows';

/** What a search found: shares of the best recipe if any, its cost, and the proven bound. */
export interface SearchResult {
  stopped: 'finished' | 'time limit' | 'cancelled';
  /** All structural columns of the best recipe. */
  best?: { values: Float64Array; cost: number };
  /** Proven lower bound of the cost; +Infinity where it is proven that there is no recipe. */
  lowerBound: number;
  /** What the proofs of impossibility lean on: rows, bounds of stocks, the viscosity index. */
  conflict: { rows: ModelRow[]; usesVi: boolean; bounds: StockBound[] };
  nodes: number;
  linearPrograms: number;
}

/** An interval of KV100 narrower than this (relative) is not split; it keeps its bound. */
const NARROWEST = 1e-11;
/** A viscosity index that misses its limit by more points than this is split on before any discrete choice. */
const FAR_OFF = 1;
const PAUSE_EVERY_MS = 8;
const PROGRESS_EVERY_MS = 100;

/** Branch and bound over the discrete choices and KV100, on one linear program re-solved hot. */
export class BranchAndBound {
  readonly #program: SearchProgram;
  readonly #rows: ModelRow[];
  readonly #finder: RecipeFinder;
  readonly #open = new NodeHeap();
  readonly #conflictRows = new Set<number>();
  readonly #conflictBounds = new Map<string, StockBound>();
  #usesVi = false;
  /** Least bound among the parts that were closed by cost, or could not be settled. */
  #closedBound = Infinity;
  #nodes = 0;

  constructor(
    engine: LinearEngine,
    readonly model: SearchModel,
    readonly options: ResolvedOptions,
    isRecipe: RecipeCheck,
  ) {
    this.#program = new SearchProgram(engine, model);
    this.#rows = presenceRows(model);
    this.#finder = new RecipeFinder(this.#program, this.#rows, isRecipe);
  }

  async run(): Promise<SearchResult> {
    try {
      this.#start();
      const stopped = await this.#loop();
      const box = boxOf(this.model);
      if (stopped === 'finished' && box) this.#finder.chooseAmongEquals(box, wholeInterval(this.model));
      return this.#result(stopped);
    } finally {
      this.#program.dispose();
    }
  }

  /** Opens the whole search, split at once where a similar order had its recipe and this one has one too. */
  #start(): void {
    const kv100 = wholeInterval(this.model);
    const root: SearchNode = { bound: -Infinity, depth: 0, ...(kv100 ? { kv100 } : {}) };
    const { near } = this.options;
    const { vi } = this.model;
    if (near !== undefined && vi && kv100 && this.#finder.startNear(near, kv100)) {
      const { best } = this.#finder;
      if (best && this.#splitKv100(root, mixViscosity(vi, best.values).kv100)) return;
    }
    this.#open.push(root);
  }

  async #loop(): Promise<SearchResult['stopped']> {
    const { now, timeLimitMs, isCancelled, pause, onProgress } = this.options;
    const start = now();
    let lastPause = start;
    let lastProgress = start;
    for (let node = this.#open.pop(); node; node = this.#open.pop()) {
      if (this.#isClosed(node)) continue;
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
    const { best } = this.#finder;
    return {
      milliseconds,
      nodes: this.#nodes,
      ...(best ? { bestCost: priceOf(this.model, best.values) } : {}),
      ...(Number.isFinite(lowerBound) ? { lowerBound } : {}),
    };
  }

  /** Solves one part: bounds it, tries a recipe in it, and splits it unless it is settled. */
  #settle(node: SearchNode): void {
    this.#nodes++;
    const box = boxOf(this.model, node.changes);
    if (!box || this.#isClosedByPrices(node, box)) return;
    loadPart(this.#program, box, node.kv100);
    const result = this.#program.solve();
    if (result.status === 'infeasible' && result.ray && this.#isCertified(result.ray)) return;
    if (result.status !== 'optimal') {
      this.#splitBlindly(node);
      return;
    }
    const open: SearchNode = { ...node, bound: Math.max(node.bound, this.#program.boundOf(result.duals)) };
    if (this.#isClosed(open)) return;
    if (this.#finder.take(result)) {
      // The recipe sits a rounding above the bound: nothing is left to split.
      this.#close(open.bound);
      return;
    }
    const known = this.#finder.best;
    if (this.#isWorthTrying(open)) this.#finder.tryNear(result.values, open.kv100);
    if (this.#isClosedByPrices(open, box)) return;
    // Lines are tight where a part is split: a recipe found in this part is the place to have them tight.
    const { best } = this.#finder;
    this.#split(open, box, result.values, best && best !== known ? best.values : result.values);
  }

  /** A part whose bound reaches this holds nothing better by more than the gap asked for. */
  #cutoff(): number {
    const { best } = this.#finder;
    if (!best) return Infinity;
    return (
      best.cost - this.options.relativeGap * (this.model.gapReference ?? gapReference(best.cost, this.model.prices))
    );
  }

  #close(bound: number): void {
    this.#closedBound = Math.min(this.#closedBound, bound);
  }

  #isClosed(node: SearchNode): boolean {
    if (node.bound < this.#cutoff()) return false;
    this.#close(node.bound);
    return true;
  }

  /** Closes a part without a solve where prices found near the best recipe already bound it far enough. */
  #isClosedByPrices(node: SearchNode, box: Box): boolean {
    for (const prices of this.#finder.prices) {
      const bound = this.#program.shadowBound(prices, this.#offsetAbove(prices, node), box);
      node.bound = Math.max(node.bound, bound);
      if (this.#isClosed(node)) return true;
    }
    return false;
  }

  /** How high a line of the prices' slope must lie to be above the curve over a part. */
  #offsetAbove({ line }: ShadowPrices, { kv100 }: SearchNode): number {
    const { vi } = this.model;
    if (!vi?.min || !kv100 || !line) return 0;
    return offsetAbove(viCurve(vi.index, vi.min.value), kv100.from, kv100.to, line.slope);
  }

  #isCertified(ray: Float64Array): boolean {
    const { proven, rows, usesVi, bounds } = this.#program.certifies(ray);
    if (!proven) return false;
    for (const bound of bounds) this.#conflictBounds.set(`${bound.end} ${bound.stock}`, bound);
    for (const row of rows) this.#conflictRows.add(row);
    this.#usesVi ||= usesVi;
    return true;
  }

  /**
   * A recipe is sought in every part until there is one, and in narrow parts, where it is the answer. Elsewhere now and
   * then, and ever more rarely: a best-first search hardly needs them.
   */
  #isWorthTrying(node: SearchNode): boolean {
    const { presences, wholeLots } = this.model;
    if (!this.#finder.best || isNarrow(node.kv100)) return true;
    if (presences.length > 0 || wholeLots.length > 0)
      return Number.isInteger(Math.log2(this.#nodes)) || this.#nodes % 16 === 0;
    return Number.isInteger(Math.log2(this.#nodes) / 2);
  }

  /** Splits on a viscosity index that is far off, else on a discrete choice, else on KV100; else the part keeps its bound. */
  #split(node: SearchNode, { lower, upper }: Box, values: Float64Array, place: Float64Array): void {
    const { vi } = this.model;
    const mix = vi && { missed: mixViscosity(vi, values).missed, kv100: mixViscosity(vi, place).kv100 };
    if (mix && mix.missed > FAR_OFF && this.#splitKv100(node, mix.kv100)) return;
    const choice = nextChoice(this.model, this.#rows, values, lower, upper);
    if (choice) this.#splitChoice(node, choice);
    else if (!mix || !this.#splitKv100(node, mix.kv100)) this.#close(node.bound);
  }

  #splitChoice(node: SearchNode, { alternatives }: Choice): void {
    for (const alternative of alternatives) {
      let { changes } = node;
      for (const bounds of alternative) changes = changes ? { ...bounds, parent: changes } : { ...bounds };
      this.#open.push({ ...node, depth: node.depth + 1, ...(changes ? { changes } : {}) });
    }
  }

  /** Splits the interval of KV100 at a solution's value; false where it is too narrow. */
  #splitKv100(node: SearchNode, kv100: number): boolean {
    if (!node.kv100) return false;
    const { from, to } = node.kv100;
    if (to - from <= NARROWEST * to) return false;
    let start = from;
    for (const end of [...splitPoints(from, to, kv100), to]) {
      this.#open.push({ ...node, depth: node.depth + 1, kv100: { from: start, to: end } });
      start = end;
    }
    return true;
  }

  /** The engine gave no answer that can be trusted: split where possible, else the part keeps its bound. */
  #splitBlindly(node: SearchNode): void {
    const middle = node.kv100 ? Math.sqrt(node.kv100.from * node.kv100.to) : 0;
    if (isNarrow(node.kv100) || !node.kv100) {
      const box = boxOf(this.model, node.changes);
      const choice = box && undecidedChoice(this.model, box.lower, box.upper);
      if (choice) {
        this.#splitChoice(node, choice);
        return;
      }
    }
    if (!this.#splitKv100(node, middle)) this.#close(node.bound);
  }

  #lowerBound(): number {
    const bound = Math.min(this.#closedBound, this.#open.leastBound);
    const { best } = this.#finder;
    return best ? Math.min(best.cost, bound) : bound;
  }

  #result(stopped: SearchResult['stopped']): SearchResult {
    const { best } = this.#finder;
    return {
      stopped,
      ...(best ? { best: { values: best.values, cost: best.cost } } : {}),
      lowerBound: this.#lowerBound(),
      conflict: {
        rows: [...this.#conflictRows].map((row) => this.model.rows[row]),
        usesVi: this.#usesVi,
        bounds: [...this.#conflictBounds.values()],
      },
      nodes: this.#nodes,
      linearPrograms: this.#program.solves,
    };
  }
}

/** What the stocks of a solution cost, using them included, deviations from aims apart. */
function priceOf({ stocks, presences, cost }: SearchModel, values: Float64Array): number {
  const shares = stocks.reduce((sum, _, column) => sum + cost[column] * values[column], 0);
  return presences.reduce((sum, { column }) => sum + cost[column] * values[column], shares);
}

/** The KV100 a mix of the model can have; one point where limits and stocks leave none, for the rows to refute. */
function wholeInterval({ vi }: SearchModel): Kv100Interval | undefined {
  return vi && { from: vi.kv100.from, to: Math.max(vi.kv100.from, vi.kv100.to) };
}
