import type { LinearEngine, LinearProgram, LinearResult, LinearSession } from '../linearEngine';
import { Dictionary } from './dictionary';
import { dualSimplex, FEASIBLE, makeDualFeasible } from './dualSimplex';
import { primalSimplex } from './primalSimplex';

/** Programs with more entries than this go to the reserve: a dense dictionary is slow there. */
const MOST_ENTRIES = 60_000;
/** Exchanges after which the dictionary is made anew. */
const MOST_EXCHANGES = 60;
/** More changed rows than this, or longer ones, are not taken in one by one. */
const MOST_CHANGED_ROWS = 8;
const MOST_CHANGED_COLUMNS = 4;
/** A solution that misses a row by more than this has lost its digits. */
const TRUSTED = 100 * FEASIBLE;

class CompactProgram {
  readonly #dictionary: Dictionary;
  readonly #reserve: LinearEngine;
  readonly #program: LinearProgram;
  /** Rows with changed coefficients. */
  readonly #changed = new Set<number>();

  constructor(program: LinearProgram, reserve: LinearEngine) {
    this.#program = program;
    this.#dictionary = new Dictionary(program);
    this.#reserve = reserve;
  }

  setCost(column: number, cost: number): void {
    this.#dictionary.cost[column] = cost;
  }

  setColumnBounds(column: number, lower: number, upper: number): void {
    this.#dictionary.lower[column] = lower;
    this.#dictionary.upper[column] = upper;
  }

  setRowBounds(row: number, lower: number, upper: number): void {
    this.setColumnBounds(this.#dictionary.columns + row, lower, upper);
  }

  setCoefficient(row: number, column: number, value: number): void {
    const { matrix, columns } = this.#dictionary;
    matrix[row * columns + column] = value;
    this.#changed.add(row);
  }

  forget(): void {
    this.#dictionary.reset();
    this.#changed.clear();
  }

  solve(): LinearResult {
    const dictionary = this.#dictionary;
    if (dictionary.exchanges > MOST_EXCHANGES || !this.#takeChanges()) dictionary.rebuild();
    this.#changed.clear();
    const result = this.#run();
    if (this.#stands(result)) return result;
    dictionary.reset();
    const cold = this.#run();
    return this.#stands(cold) ? cold : this.#askReserve();
  }

  /** Takes changed rows into the dictionary where they are few and short; false where it must be made anew. */
  #takeChanges(): boolean {
    if (this.#changed.size > MOST_CHANGED_ROWS) return false;
    for (const row of this.#changed) {
      const { columns } = this.#program.rows[row];
      if (columns.length > MOST_CHANGED_COLUMNS || !this.#dictionary.replaceRow(row, columns)) return false;
    }
    return true;
  }

  #run(): LinearResult {
    const dictionary = this.#dictionary;
    const mostSteps = 50 + 5 * (dictionary.rows + dictionary.columns);
    dictionary.price();
    const { changed } = makeDualFeasible(dictionary);
    dictionary.evaluate();
    const end = dualSimplex(dictionary, mostSteps);
    if (end.status === 'infeasible') return { status: 'infeasible', ray: this.#ray(end.row) };
    if (end.status === 'unknown') return end;
    if (changed) {
      dictionary.price();
      if (primalSimplex(dictionary, mostSteps) !== 'optimal') return { status: 'unknown' };
    }
    const values = this.#values();
    return this.#keepsRows(values) ? { status: 'optimal', values, duals: this.#duals() } : { status: 'unknown' };
  }

  /** Whether an answer can be used: known, and an infeasible one with a ray that proves it on the program's own rows. */
  #stands(result: LinearResult): boolean {
    if (result.status !== 'infeasible') return result.status === 'optimal';
    return result.ray !== undefined && this.#proves(result.ray);
  }

  /** Whether Σ ray · (row - activity) = 0 has no solution within all bounds. */
  #proves(ray: Float64Array): boolean {
    const { rows, columns, matrix, lower, upper } = this.#dictionary;
    let least = 0;
    let most = 0;
    const add = (factor: number, low: number, high: number) => {
      if (factor === 0) return;
      least += factor > 0 ? factor * low : factor * high;
      most += factor > 0 ? factor * high : factor * low;
    };
    for (let column = 0; column < columns; column++) {
      let factor = 0;
      let size = 0;
      for (let row = 0; row < rows; row++) {
        const part = ray[row] * matrix[row * columns + column];
        factor += part;
        size += Math.abs(part);
      }
      // What cancels to a rounding is zero: a free column would otherwise undo any proof.
      if (Math.abs(factor) > 1e-12 * size) add(factor, lower[column], upper[column]);
    }
    for (let row = 0; row < rows; row++) add(-ray[row], lower[columns + row], upper[columns + row]);
    return least > 0 || most < 0;
  }

  #values(): Float64Array {
    const dictionary = this.#dictionary;
    const { rows, columns, basic, nonbasic, value } = dictionary;
    const values = new Float64Array(columns);
    for (let column = 0; column < columns; column++) {
      if (nonbasic[column] < columns) values[nonbasic[column]] = dictionary.at(column);
    }
    for (let row = 0; row < rows; row++) if (basic[row] < columns) values[basic[row]] = value[row];
    return values;
  }

  /** Whether a solution keeps the program's own rows: the dictionary is not believed. */
  #keepsRows(values: Float64Array): boolean {
    const { rows, columns, matrix, lower, upper } = this.#dictionary;
    for (let row = 0; row < rows; row++) {
      const low = lower[columns + row];
      const high = upper[columns + row];
      if (low === -Infinity && high === Infinity) continue;
      let activity = 0;
      const start = row * columns;
      for (let column = 0; column < columns; column++) activity += matrix[start + column] * values[column];
      if (!(activity >= low - TRUSTED && activity <= high + TRUSTED)) return false;
    }
    return true;
  }

  /** The reduced cost of a row's activity is the row's dual. */
  #duals(): Float64Array {
    const { rows, columns, nonbasic, reduced } = this.#dictionary;
    const duals = new Float64Array(rows);
    for (let column = 0; column < columns; column++) {
      if (nonbasic[column] >= columns) duals[nonbasic[column] - columns] = reduced[column];
    }
    return duals;
  }

  /** A row of the dictionary that cannot be met, as multipliers of the program's rows. */
  #ray(row: number): Float64Array {
    const { rows, columns, basic, nonbasic, body } = this.#dictionary;
    const ray = new Float64Array(rows);
    for (let column = 0; column < columns; column++) {
      if (nonbasic[column] >= columns) ray[nonbasic[column] - columns] = body[row * columns + column];
    }
    if (basic[row] >= columns) ray[basic[row] - columns] = -1;
    return ray;
  }

  #askReserve(): LinearResult {
    const { rows, columns, matrix, cost, lower, upper } = this.#dictionary;
    const session = this.#reserve.open({
      cost: Float64Array.from(cost),
      lower: lower.slice(0, columns),
      upper: upper.slice(0, columns),
      rows: this.#program.rows.map((row, place) => ({
        columns: row.columns,
        values: row.columns.map((column) => matrix[place * columns + column]),
        lower: lower[columns + place],
        upper: upper[columns + place],
      })),
    });
    try {
      return rows === 0 ? { status: 'unknown' } : session.solve();
    } finally {
      session.dispose();
    }
  }
}

function openSession(program: LinearProgram, reserve: LinearEngine): LinearSession {
  const compact = new CompactProgram(program, reserve);
  return {
    setCost: (column, cost) => compact.setCost(column, cost),
    setColumnBounds: (column, lower, upper) => compact.setColumnBounds(column, lower, upper),
    setRowBounds: (row, lower, upper) => compact.setRowBounds(row, lower, upper),
    setCoefficient: (row, column, value) => compact.setCoefficient(row, column, value),
    solve: () => compact.solve(),
    forget: () => compact.forget(),
    dispose: () => undefined,
  };
}

/**
 * A simplex method of our own for the programs of a blend: few rows, dense columns, re-solved many times after small
 * edits. A hot re-solve takes some microseconds where a general engine takes a hundred or more. What it cannot settle,
 * and programs too large for a dense dictionary, go to the reserve. As with any engine, no bound is taken from it.
 */
export function createCompactEngine(reserve: LinearEngine): LinearEngine {
  return {
    name: `compact, ${reserve.name} in reserve`,
    open: (program) =>
      program.cost.length * program.rows.length > MOST_ENTRIES ? reserve.open(program) : openSession(program, reserve),
  };
}
