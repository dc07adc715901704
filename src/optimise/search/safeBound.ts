import type { LinearRow } from '../linear/linearEngine';

/** What bounds a node: minimise cost·x over the rows and the box. `extra` are rows kept apart from `rows`. */
export interface BoundedProgram {
  cost: Float64Array;
  lower: Float64Array;
  upper: Float64Array;
  rows: readonly LinearRow[];
}

/** A dense row that is not among `rows`: multiplier times coefficients, and the side it is held against (zero). */
export interface ExtraTerms {
  /** Σ multiplier · coefficient for each column. */
  pull: Float64Array;
  /** Magnitude of what was added up for each column, for the rounding allowance. */
  magnitude: Float64Array;
}

const EPSILON = 2 ** -52;

/**
 * A lower bound of the least cost from any multipliers whatever, good or bad: for every x of the box that meets the
 * rows, cost·x ≥ Σ_r (side of r at the sign of its multiplier) + Σ_j min over the box of (cost - Aᵀλ)_j x_j, less an
 * allowance for rounding. The only source of a bound in the search. With cost zero, a result above zero proves that
 * nothing meets the rows. A multiplier that leans on an infinite side is dropped.
 */
export function safeBound(program: BoundedProgram, multipliers: ArrayLike<number>, extra?: ExtraTerms): number {
  return priceOut(program, multipliers, extra).bound;
}

/** The bound together with the reduced costs it rests on. */
export function priceOut(
  { cost, lower, upper, rows }: BoundedProgram,
  multipliers: ArrayLike<number>,
  extra?: ExtraTerms,
): { bound: number; reduced: Float64Array } {
  const columns = cost.length;
  const reduced = Float64Array.from(cost);
  const magnitude = Float64Array.from(cost, Math.abs);
  let bound = 0;
  let size = 0;
  for (let r = 0; r < rows.length; r++) {
    const row = rows[r];
    const multiplier = multipliers[r];
    const side = multiplier > 0 ? row.lower : row.upper;
    if (!(Math.abs(multiplier) > 0) || !Number.isFinite(side) || !Number.isFinite(multiplier)) continue;
    bound += multiplier * side;
    size += Math.abs(multiplier * side);
    for (let k = 0; k < row.columns.length; k++) {
      const pull = multiplier * row.values[k];
      reduced[row.columns[k]] -= pull;
      magnitude[row.columns[k]] += Math.abs(pull);
    }
  }
  for (let j = 0; j < columns; j++) {
    if (extra) {
      reduced[j] -= extra.pull[j];
      magnitude[j] += extra.magnitude[j];
    }
    bound += reduced[j] > 0 ? reduced[j] * lower[j] : reduced[j] * upper[j];
    size += magnitude[j] * Math.max(Math.abs(lower[j]), Math.abs(upper[j]));
  }
  return { bound: bound - (rows.length + columns + 8) * EPSILON * size, reduced };
}
