import type { LinearRow } from '../linear/linearEngine';

/** What bounds a node: minimise cost·x over the rows and the box. */
export interface BoundedProgram {
  cost: Float64Array;
  lower: Float64Array;
  upper: Float64Array;
  rows: readonly LinearRow[];
}

/**
 * Rows over three sums of the stocks, kept apart from `rows` and held against zero: each stock is pulled by
 * weight · (sums[0] + sums[1] · index100 + sums[2] · index40). `sizes`: the same in magnitudes, for the rounding.
 */
export interface PulledSums {
  weights: Float64Array;
  index100: Float64Array;
  index40: Float64Array;
  sums: readonly [number, number, number];
  sizes: readonly [number, number, number];
}

/** What multipliers make of the rows: reduced costs, and the sides they lean on. */
export interface PricedRows {
  reduced: Float64Array;
  /** Magnitude of what was added up for each column, for the rounding allowance. */
  magnitude: Float64Array;
  side: number;
  sideSize: number;
  rows: number;
}

const EPSILON = 2 ** -52;

/** Prices the rows out of the cost. A multiplier that leans on an infinite side is dropped. */
export function priceRows(cost: Float64Array, rows: readonly LinearRow[], multipliers: ArrayLike<number>): PricedRows {
  const reduced = Float64Array.from(cost);
  const magnitude = new Float64Array(cost.length);
  for (let j = 0; j < cost.length; j++) magnitude[j] = Math.abs(cost[j]);
  let side = 0;
  let sideSize = 0;
  for (let r = 0; r < rows.length; r++) {
    const multiplier = multipliers[r];
    if (!(Math.abs(multiplier) > 0) || !Number.isFinite(multiplier)) continue;
    const { lower, upper, columns, values } = rows[r];
    const held = multiplier > 0 ? lower : upper;
    if (!Number.isFinite(held)) continue;
    side += multiplier * held;
    sideSize += Math.abs(multiplier * held);
    for (let k = 0; k < columns.length; k++) {
      const pull = multiplier * values[k];
      reduced[columns[k]] -= pull;
      magnitude[columns[k]] += Math.abs(pull);
    }
  }
  return { reduced, magnitude, side, sideSize, rows: rows.length };
}

/** Takes the pull of the sums out of the reduced costs. */
export function withSums(priced: PricedRows, { weights, index100, index40, sums, sizes }: PulledSums): PricedRows {
  const reduced = Float64Array.from(priced.reduced);
  const magnitude = Float64Array.from(priced.magnitude);
  for (let i = 0; i < weights.length; i++) {
    reduced[i] -= weights[i] * (sums[0] + sums[1] * index100[i] + sums[2] * index40[i]);
    magnitude[i] += weights[i] * (sizes[0] + sizes[1] * Math.abs(index100[i]) + sizes[2] * Math.abs(index40[i]));
  }
  return { ...priced, reduced, magnitude };
}

/**
 * A lower bound of the least cost over a box from any multipliers whatever, good or bad: for every x of the box that
 * meets the rows, cost·x ≥ Σ_r (side of r at the sign of its multiplier) + Σ_j min over the box of (cost - Aᵀλ)_j x_j,
 * less an allowance for rounding. The only source of a bound in the search. With cost zero, a result above zero
 * proves that nothing meets the rows.
 */
export function boundOverBox(
  { reduced, magnitude, side, sideSize, rows }: PricedRows,
  lower: Float64Array,
  upper: Float64Array,
): number {
  const columns = reduced.length;
  let bound = side;
  let size = sideSize;
  for (let j = 0; j < columns; j++) {
    const low = lower[j];
    const high = upper[j];
    bound += reduced[j] > 0 ? reduced[j] * low : reduced[j] * high;
    size += magnitude[j] * Math.max(Math.abs(low), Math.abs(high));
  }
  return bound - (rows + columns + 8) * EPSILON * size;
}

/** The bound from multipliers of the rows alone: see `boundOverBox`. */
export function safeBound({ cost, lower, upper, rows }: BoundedProgram, multipliers: ArrayLike<number>): number {
  return boundOverBox(priceRows(cost, rows, multipliers), lower, upper);
}
