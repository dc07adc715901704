import { type Answer, LinearModel } from './linearModel';
import { meetsVi } from './mixVi';
import type { OrderRows } from './orderRows';
import { movingRowCount, type Slice, sliceRows } from './viSlices';

/** A run of slices that adjoin, and the least cost its outer lines leave. */
interface Part {
  slices: readonly Slice[];
  bound: number;
  /** The choices were kept (integer programming), not relaxed. */
  whole: boolean;
}

const GAP = 2e-7;
const MOST_PARTS = 20_000;

/** Best-first search over slices of KV100: halves runs of slices, then slices, until both sides of the cost agree. */
export class BranchOnSlices {
  best = Infinity;
  bestX: number[] = [];
  /** Something could not be settled: the answer is no answer. */
  doubtful = false;
  private readonly relaxed: LinearModel;
  private readonly full: LinearModel;

  constructor(
    readonly order: OrderRows,
    private readonly cutoff = Infinity,
  ) {
    const moving = movingRowCount(order);
    this.relaxed = new LinearModel(order, moving, false);
    this.full = this.relaxed.hasChoices ? new LinearModel(order, moving, true) : this.relaxed;
  }

  get solves(): number {
    return this.relaxed.solves + (this.full === this.relaxed ? 0 : this.full.solves);
  }

  solve(slices: readonly Slice[], side: 'outer' | 'inner', whole: boolean): Answer {
    const answer = (whole ? this.full : this.relaxed).solve(sliceRows(this.order, slices, side));
    if (answer.status === 'unknown') this.doubtful = true;
    return answer;
  }

  /** Takes a mix as the best one if it is cheaper and keeps the exact limit. */
  keep(answer: Answer): void {
    if (answer.status === 'optimal' && answer.cost < this.best && meetsVi(this.order, answer.x)) {
      this.best = answer.cost;
      this.bestX = answer.x;
    }
  }

  private part(slices: readonly Slice[], whole: boolean): Part[] {
    const answer = this.solve(slices, 'outer', whole);
    if (answer.status === 'infeasible') return [];
    if (whole || !this.relaxed.hasChoices) this.keep(answer);
    return [{ slices, bound: answer.status === 'optimal' ? answer.cost : -Infinity, whole }];
  }

  private halves({ slices, whole }: Part): Part[] {
    if (slices.length > 1) {
      const middle = slices.length >> 1;
      return [...this.part(slices.slice(0, middle), false), ...this.part(slices.slice(middle), false)];
    }
    const [{ low, high }] = slices;
    if (!whole && this.relaxed.hasChoices) return this.part(slices, true);
    this.keep(this.solve(slices, 'inner', true));
    const middle = (low + high) / 2;
    if (!(high - low > 1e-12 * high)) {
      this.doubtful = true;
      return [];
    }
    return [...this.part([{ low, high: middle }], true), ...this.part([{ low: middle, high }], true)];
  }

  /** Searches the slices; returns a lower bound of the cost, infinite where there is no mix. */
  run(slices: readonly Slice[]): number {
    const open = slices.length > 0 ? this.part(slices, false) : [];
    for (let parts = 0; parts < MOST_PARTS; parts++) {
      open.sort((a, b) => b.bound - a.bound);
      const part = open.pop();
      const target = Math.min(this.best, this.cutoff);
      const settled = part && part.bound >= target - GAP * Math.abs(target);
      if (!part || settled) return Math.min(this.best, part?.bound ?? Infinity);
      open.push(...this.halves(part));
    }
    this.doubtful = true;
    return -Infinity;
  }

  dispose(): void {
    this.relaxed.dispose();
    if (this.full !== this.relaxed) this.full.dispose();
  }
}
