import type { Dictionary } from './dictionary';
import { FEASIBLE, INDIFFERENT } from './dualSimplex';

/** The column whose move off its bound saves most per unit; -1 where none saves anything. */
function enteringColumn({ columns, nonbasic, lower, upper, atUpper, reduced }: Dictionary): number {
  let most = INDIFFERENT;
  let found = -1;
  for (let column = 0; column < columns; column++) {
    const variable = nonbasic[column];
    if (lower[variable] === upper[variable]) continue;
    const isFree = lower[variable] === -Infinity && upper[variable] === Infinity;
    const saving = isFree ? Math.abs(reduced[column]) : atUpper[variable] ? reduced[column] : -reduced[column];
    if (saving > most) {
      most = saving;
      found = column;
    }
  }
  return found;
}

/** The row that stops the move of a column first, and how far that is; row -1 where its own box, or nothing, does. */
function blockingRow(dictionary: Dictionary, column: number, direction: number): { row: number; step: number } {
  const { rows, columns, body, basic, nonbasic, lower, upper, value } = dictionary;
  const variable = nonbasic[column];
  let step = upper[variable] - lower[variable];
  let found = -1;
  let size = 0;
  for (let row = 0; row < rows; row++) {
    const rate = body[row * columns + column] * direction;
    if (Math.abs(rate) <= 1e-9) continue;
    const bound = rate > 0 ? upper[basic[row]] : lower[basic[row]];
    const reach = Math.max(0, (bound - value[row]) / rate);
    const isTie = reach <= step + FEASIBLE && Math.abs(rate) > size;
    if (reach < step - FEASIBLE || (isTie && found >= 0) || (reach <= step && found < 0)) {
      step = Math.min(step, reach);
      found = row;
      size = Math.abs(rate);
    }
  }
  return { row: found, step };
}

/** Primal simplex method: from values inside their bounds to the least cost. */
export function primalSimplex(dictionary: Dictionary, mostSteps: number): 'optimal' | 'unknown' {
  const { basic, nonbasic, lower, upper, atUpper, reduced, value } = dictionary;
  for (let count = 0; count < mostSteps; count++) {
    const column = enteringColumn(dictionary);
    if (column < 0) return 'optimal';
    const direction = reduced[column] < 0 ? 1 : -1;
    const { row, step } = blockingRow(dictionary, column, direction);
    if (!Number.isFinite(step)) return 'unknown';
    const entering = nonbasic[column];
    const before = dictionary.at(column);
    dictionary.shift(column, direction * step);
    if (row < 0) {
      atUpper[entering] = atUpper[entering] ? 0 : 1;
      continue;
    }
    const leaving = basic[row];
    const isCloserToUpper = Math.abs(upper[leaving] - value[row]) < Math.abs(value[row] - lower[leaving]);
    dictionary.exchange(row, column);
    atUpper[leaving] = isCloserToUpper ? 1 : 0;
    value[row] = before + direction * step;
  }
  return 'unknown';
}
