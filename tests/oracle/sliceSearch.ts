import type { Order, Recipe } from '../../src/index';
import { BranchOnSlices } from './branchOnSlices';
import { viActive } from './mixVi';
import { type OrderRows, orderRows } from './orderRows';
import { startingSlices } from './viSlices';

export interface OracleAnswer {
  /** `undecided`: the two sides of the cost did not meet. */
  status: 'solved' | 'impossible' | 'refused' | 'undecided';
  /** Cost of the best mix found, and bounds on the least cost. */
  cost: number;
  lower: number;
  upper: number;
  recipe: Recipe;
  leftOut: OrderRows['leftOut'];
  /** The viscosity-index limit is active at the best mix. */
  viBinds: boolean;
  solves: number;
}

function nothing(status: OracleAnswer['status'], { leftOut }: OrderRows, solves = 0): OracleAnswer {
  const lower = status === 'impossible' ? Infinity : -Infinity;
  return { status, cost: Number.NaN, lower, upper: Infinity, recipe: [], leftOut, viBinds: false, solves };
}

function recipeOf({ stocks }: OrderRows, x: readonly number[]): Recipe {
  const total = x.reduce((sum, share) => sum + share, 0);
  return stocks.flatMap((stock, i) => (x[i] > 1e-12 ? [{ stockId: stock.id, massFraction: x[i] / total }] : []));
}

/** Least cost of rows already built, by slices of KV100. `cutoff`: costs from here up are of no interest. */
export function searchRows(rows: OrderRows, cutoff = Infinity): OracleAnswer {
  if (rows.refused.length > 0) return nothing('refused', rows);
  if (rows.stocks.length === 0) return nothing('impossible', rows);
  const search = new BranchOnSlices(rows, cutoff);
  try {
    let lower: number;
    if (rows.vi) lower = search.run(startingSlices(rows));
    else {
      const answer = search.solve([], 'outer', true);
      search.keep(answer);
      lower = answer.status === 'optimal' ? answer.cost : Infinity;
    }
    const { best, bestX, solves } = search;
    if (search.doubtful) return nothing('undecided', rows, solves);
    if (best === Infinity) return nothing('impossible', rows, solves);
    return {
      status: 'solved',
      cost: best,
      lower,
      upper: best,
      recipe: recipeOf(rows, bestX),
      leftOut: rows.leftOut,
      viBinds: viActive(rows, bestX),
      solves,
    };
  } finally {
    search.dispose();
  }
}

/** Least cost of an order, by slices of KV100 and HiGHS; shares no code with the engine. */
export function sliceSearch(order: Order): OracleAnswer {
  return searchRows(orderRows(order));
}
