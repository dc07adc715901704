import type { Dictionary } from './dictionary';

/** A basic variable may miss a bound by this much: a billionth of a reporting unit, or of a share. */
export const FEASIBLE = 1e-9;
/** A reduced cost this close to zero is zero; costs are scaled to 1000 for the dearest stock. */
export const INDIFFERENT = 1e-9;
/** Entries of the dictionary below this are no pivots. */
const LEAST_PIVOT = 1e-9;

/** Brings nonbasic variables to the side their reduced cost wants; costs that want an infinite side are set to zero. */
export function makeDualFeasible(dictionary: Dictionary): { changed: boolean } {
  const { columns, nonbasic, lower, upper, atUpper, reduced } = dictionary;
  let changed = false;
  for (let column = 0; column < columns; column++) {
    const variable = nonbasic[column];
    const hasLower = lower[variable] > -Infinity;
    const hasUpper = upper[variable] < Infinity;
    if (hasLower && hasUpper) {
      if (reduced[column] > INDIFFERENT) atUpper[variable] = 0;
      else if (reduced[column] < -INDIFFERENT) atUpper[variable] = 1;
      continue;
    }
    atUpper[variable] = hasUpper ? 1 : 0;
    const isWrong = (reduced[column] < -INDIFFERENT && !hasUpper) || (reduced[column] > INDIFFERENT && !hasLower);
    if (!isWrong) continue;
    reduced[column] = 0;
    changed = true;
  }
  return { changed };
}

/** The row whose basic variable is furthest outside its bounds; -1 where all are inside. */
function leavingRow({ rows, basic, lower, upper, value }: Dictionary): number {
  let worst = FEASIBLE;
  let found = -1;
  for (let row = 0; row < rows; row++) {
    const variable = basic[row];
    const outside = Math.max(lower[variable] - value[row], value[row] - upper[variable]);
    if (outside > worst) {
      worst = outside;
      found = row;
    }
  }
  return found;
}

/** How fast each column moves a row towards `sign` on its way off its bound; 0 where it cannot, or hardly does. */
function usefulPulls(
  { columns, body, nonbasic, lower, upper, atUpper, scratch }: Dictionary,
  row: number,
  sign: number,
): Float64Array {
  const start = row * columns;
  for (let column = 0; column < columns; column++) {
    const entry = body[start + column] * sign;
    const variable = nonbasic[column];
    const low = lower[variable];
    const high = upper[variable];
    let pull = atUpper[variable] ? -entry : entry;
    if (low === -Infinity && high === Infinity) pull = Math.abs(entry);
    scratch[column] = low === high || pull <= LEAST_PIVOT ? 0 : pull;
  }
  return scratch;
}

/**
 * The column that enters for a row that must move by `gap`: least ratio of reduced cost to entry, and of those within
 * a rounding the greatest entry. Boxed variables whose whole box does not close the gap are carried to their other
 * side on the way. -1 where nothing can close the gap.
 */
function enteringColumn(dictionary: Dictionary, row: number, gap: number): number {
  const { columns, nonbasic, lower, upper, atUpper, reduced } = dictionary;
  const pulls = usefulPulls(dictionary, row, Math.sign(gap));
  let left = Math.abs(gap);
  for (;;) {
    let limit = Infinity;
    for (let column = 0; column < columns; column++) {
      if (pulls[column] > 0) limit = Math.min(limit, (Math.abs(reduced[column]) + INDIFFERENT) / pulls[column]);
    }
    let best = -1;
    let size = 0;
    for (let column = 0; column < columns; column++) {
      if (pulls[column] > size && Math.abs(reduced[column]) <= limit * pulls[column]) {
        size = pulls[column];
        best = column;
      }
    }
    if (best < 0) return -1;
    const variable = nonbasic[best];
    const range = upper[variable] - lower[variable];
    left -= size * range;
    if (!(left > FEASIBLE)) return best;
    dictionary.shift(best, atUpper[variable] ? -range : range);
    atUpper[variable] = atUpper[variable] ? 0 : 1;
    pulls[best] = 0;
  }
}

export type DualEnd = { status: 'feasible' } | { status: 'infeasible'; row: number } | { status: 'unknown' };

/** Dual simplex method: from reduced costs of the right signs to values inside their bounds. */
export function dualSimplex(dictionary: Dictionary, mostSteps: number): DualEnd {
  const { columns, body, basic, lower, upper, atUpper, value } = dictionary;
  for (let step = 0; step < mostSteps; step++) {
    const row = leavingRow(dictionary);
    if (row < 0) return { status: 'feasible' };
    const leaving = basic[row];
    const goesUp = value[row] < lower[leaving];
    const target = goesUp ? lower[leaving] : upper[leaving];
    const column = enteringColumn(dictionary, row, target - value[row]);
    if (column < 0) return { status: 'infeasible', row };
    const before = dictionary.at(column);
    const move = (target - value[row]) / body[row * columns + column];
    dictionary.shift(column, move);
    dictionary.exchange(row, column);
    atUpper[leaving] = goesUp ? 0 : 1;
    value[row] = before + move;
  }
  return { status: 'unknown' };
}
