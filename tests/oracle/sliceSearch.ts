import type { Order, Recipe } from '../../src/index';
import { type Answer, LinearModel } from './linearModel';
import { type OrderRows, orderRows } from './orderRows';
import { movingRowCount, type Slice, sliceRows, startingSlices } from './viSlices';
import { viOf } from './viscosityIndex';
import { invert } from './walther';

export interface OracleAnswer {
  status: 'solved' | 'impossible' | 'refused' | 'undecided';
  /** Cost of the best mix found, and bounds on the least cost. */
  cost: number;
  lower: number;
  upper: number;
  recipe: Recipe;
  leftOut: OrderRows['leftOut'];
  /** The viscosity-index limit is active at the best mix. */
  viBinds: boolean;
  /** (least cost - relaxation over the whole window with one line for VI)/least cost. */
  rootGap: number;
  solves: number;
}

interface Node extends Slice {
  bound: number;
  x: number[];
  whole: boolean;
}

const GAP = 2e-7;
const MOST_NODES = 20_000;

/** KV40 and KV100 of a mix by the oracle's own formulas. */
export function viscositiesOf(order: OrderRows, x: readonly number[]): { kv40: number; kv100: number } {
  if (!order.viscosity) throw new Error('No viscosity in this order.');
  const { terms, index } = order.viscosity;
  let weight = 0;
  let sum40 = 0;
  let sum100 = 0;
  terms.forEach((term, i) => {
    weight += x[i] * term.weight;
    sum40 += x[i] * term.weight * term.index40;
    sum100 += x[i] * term.weight * term.index100;
  });
  return { kv40: invert(index, sum40 / weight), kv100: invert(index, sum100 / weight) };
}

function meetsVi(order: OrderRows, x: readonly number[], slack = 1e-8): boolean {
  const { vi } = order;
  if (!vi) return true;
  const { kv40, kv100 } = viscositiesOf(order, x);
  if (kv100 < 2 - 1e-9 || kv40 <= kv100) return false;
  const value = viOf(kv40, Math.max(2, kv100));
  return value >= (vi.min ?? -Infinity) - slack && value <= (vi.max ?? Infinity) + slack;
}

class Search {
  best = Infinity;
  bestX: number[] = [];
  doubtful = false;
  private readonly relaxed: LinearModel;
  private readonly full: LinearModel;

  constructor(
    readonly order: OrderRows,
    private readonly cutoff: number,
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

  keep(answer: Answer, surely: boolean): void {
    if (answer.status === 'optimal' && answer.cost < this.best && (surely || meetsVi(this.order, answer.x))) {
      this.best = answer.cost;
      this.bestX = answer.x;
    }
  }

  private node(slice: Slice, whole: boolean): Node[] {
    const answer = this.solve([slice], 'outer', whole);
    if (answer.status === 'infeasible') return [];
    if (whole || !this.relaxed.hasChoices) this.keep(answer, false);
    return [{ ...slice, bound: answer.status === 'optimal' ? answer.cost : -Infinity, x: answer.x, whole }];
  }

  /** Best first over slices of KV100; returns the lower bound. */
  run(slices: readonly Slice[]): { lower: number; reach: Slice[] } {
    const open = slices.flatMap((slice) => this.node(slice, !this.relaxed.hasChoices));
    const reach = open.map(({ low, high }) => ({ low, high }));
    const target = () => Math.min(this.best, this.cutoff);
    for (let nodes = 0; nodes < MOST_NODES; nodes++) {
      open.sort((a, b) => b.bound - a.bound);
      const node = open[open.length - 1];
      if (!node || node.bound >= target() - GAP * Math.abs(target()))
        return { lower: Math.min(this.best, node?.bound ?? Infinity), reach };
      open.pop();
      if (!node.whole) {
        open.push(...this.node(node, true));
        continue;
      }
      this.keep(this.solve([node], 'inner', true), false);
      const middle = (node.low + node.high) / 2;
      if (!(node.high - node.low > 1e-12 * node.high)) {
        this.doubtful = true;
        continue;
      }
      open.push(
        ...this.node({ low: node.low, high: middle }, true),
        ...this.node({ low: middle, high: node.high }, true),
      );
    }
    this.doubtful = true;
    return { lower: Math.min(...open.map((node) => node.bound)), reach };
  }

  dispose(): void {
    this.relaxed.dispose();
    if (this.full !== this.relaxed) this.full.dispose();
  }
}

function nothing(status: OracleAnswer['status'], rows: OrderRows, solves = 0): OracleAnswer {
  return {
    status,
    cost: Number.NaN,
    lower: status === 'impossible' ? Infinity : -Infinity,
    upper: Infinity,
    recipe: [],
    leftOut: rows.leftOut,
    viBinds: false,
    rootGap: 0,
    solves,
  };
}

function viActive(order: OrderRows, x: readonly number[]): boolean {
  if (!order.vi) return false;
  const { kv40, kv100 } = viscositiesOf(order, x);
  const value = viOf(kv40, Math.max(2, kv100));
  return Math.abs(value - (order.vi.min ?? Infinity)) < 1e-4 || Math.abs(value - (order.vi.max ?? Infinity)) < 1e-4;
}

/** The thickest stock [mm²/s at 100 °C]: no mix is thicker. */
function thickest({ stocks }: OrderRows): number {
  const values = stocks.flatMap((s) =>
    s.figures.filter((f) => f.property === 'kv' && f.celsius === 100).map((f) => f.value ?? 0),
  );
  return Math.max(0, ...values);
}

/** Least cost of rows already built, by slices of KV100. `cutoff`: costs from here up are of no interest. */
export function searchRows(rows: OrderRows, cutoff = Infinity): OracleAnswer {
  if (rows.refused.length > 0) return nothing('refused', rows);
  if (rows.stocks.length === 0) return nothing('impossible', rows);
  const search = new Search(rows, cutoff);
  try {
    const slices = rows.vi ? startingSlices(rows.window, thickest(rows)) : [];
    let lower: number;
    let rootGap = 0;
    if (rows.vi) {
      const result = search.run(slices);
      lower = result.lower;
      if (search.best < Infinity) {
        const { reach } = result;
        const from = slices.findIndex((slice) => slice.low === reach[0].low);
        const to = slices.findIndex((slice) => slice.high === reach[reach.length - 1].high);
        const root = search.solve(slices.slice(from, to + 1), 'outer', false);
        rootGap = (search.best - root.cost) / Math.abs(search.best);
      }
    } else {
      const answer = search.solve([], 'outer', true);
      search.keep(answer, true);
      lower = answer.status === 'optimal' ? answer.cost : Infinity;
    }
    if (search.doubtful) return nothing('undecided', rows, search.solves);
    if (search.best === Infinity) return nothing('impossible', rows, search.solves);
    const total = search.bestX.reduce((sum, v) => sum + v, 0);
    const recipe = rows.stocks.flatMap((stock, i) =>
      search.bestX[i] > 1e-12 ? [{ stockId: stock.id, massFraction: search.bestX[i] / total }] : [],
    );
    return {
      status: 'solved',
      cost: search.best,
      lower,
      upper: search.best,
      recipe,
      leftOut: rows.leftOut,
      viBinds: viActive(rows, search.bestX),
      rootGap,
      solves: search.solves,
    };
  } finally {
    search.dispose();
  }
}

/** Least cost of an order, by slices of KV100 and HiGHS; shares no code with the engine. */
export function sliceSearch(order: Order): OracleAnswer {
  return searchRows(orderRows(order));
}
