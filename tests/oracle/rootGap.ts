import type { Order } from '../../src/index';
import { BranchOnSlices } from './branchOnSlices';
import { orderRows } from './orderRows';
import { startingSlices } from './viSlices';

/**
 * How much one line cannot see [-]: (least cost - cost under a single valid line for the viscosity index)/least cost.
 * The line spans only those KV100 that mixes of the order reach, so that an open window does not flatter the figure.
 */
export function rootGap(order: Order, leastCost: number): number {
  const rows = orderRows(order);
  if (!rows.vi) return 0;
  const search = new BranchOnSlices(rows);
  try {
    const slices = startingSlices(rows);
    const reached = slices.map((slice) => search.solve([slice], 'outer', false).status !== 'infeasible');
    const window = slices.slice(reached.indexOf(true), reached.lastIndexOf(true) + 1);
    return (leastCost - search.solve(window, 'outer', false).cost) / Math.abs(leastCost);
  } finally {
    search.dispose();
  }
}
