import type { LinearProgram } from '../linearEngine';

/** A changed row keeps its place in the basis where it still leans on itself by this much; unchanged it does by 1. */
const LEAST_KEPT = 0.01;

/**
 * A linear program as a dense dictionary: every basic variable as a sum over the nonbasic ones. Variables are the
 * program's columns (0 to columns - 1), then one a row, its activity. Nonbasic variables sit on a bound; free ones at 0.
 */
export class Dictionary {
  readonly rows: number;
  readonly columns: number;
  /** The program's own coefficients, row after row. */
  readonly matrix: Float64Array;
  readonly cost: Float64Array;
  /** Bounds of the variables: columns, then rows. */
  readonly lower: Float64Array;
  readonly upper: Float64Array;
  /** Coefficients of the basic variables over the nonbasic ones, row after row. */
  readonly body: Float64Array;
  /** The variable of each row, and of each column, of the body. */
  readonly basic: Int32Array;
  readonly nonbasic: Int32Array;
  /** Whether a variable sits, or sat last, on its upper bound. */
  readonly atUpper: Uint8Array;
  /** Values of the basic variables, and reduced costs of the nonbasic ones. */
  readonly value: Float64Array;
  readonly reduced: Float64Array;
  /** Room for one number a column. */
  readonly scratch: Float64Array;
  /** Exchanges since the body was last made from the matrix: they add up rounding. */
  exchanges = 0;

  constructor({ cost, lower, upper, rows }: LinearProgram) {
    const m = rows.length;
    const n = cost.length;
    this.rows = m;
    this.columns = n;
    this.matrix = new Float64Array(m * n);
    rows.forEach((row, place) => {
      row.columns.forEach((column, k) => {
        this.matrix[place * n + column] = row.values[k];
      });
    });
    this.cost = Float64Array.from(cost);
    this.lower = new Float64Array(n + m);
    this.upper = new Float64Array(n + m);
    this.lower.set(lower);
    this.upper.set(upper);
    rows.forEach((row, place) => {
      this.lower[n + place] = row.lower;
      this.upper[n + place] = row.upper;
    });
    // One row more than the program has: room to work a row out anew.
    this.body = new Float64Array((m + 1) * n);
    this.body.set(this.matrix);
    this.basic = Int32Array.from({ length: m }, (_, row) => n + row);
    this.nonbasic = Int32Array.from({ length: n }, (_, column) => column);
    this.atUpper = new Uint8Array(n + m);
    this.value = new Float64Array(m);
    this.reduced = new Float64Array(n);
    this.scratch = new Float64Array(n);
  }

  /** The basis of row activities alone, every column on its lower bound. */
  reset(): void {
    this.body.set(this.matrix);
    for (let row = 0; row < this.rows; row++) this.basic[row] = this.columns + row;
    for (let column = 0; column < this.columns; column++) this.nonbasic[column] = column;
    this.atUpper.fill(0);
    this.exchanges = 0;
  }

  /** Makes the body anew from the matrix, for the same basis as far as it is one. */
  rebuild(): void {
    const { rows, columns, body, basic, nonbasic } = this;
    const wanted = basic.filter((variable) => variable < columns);
    const stays = new Uint8Array(rows);
    for (const variable of basic) if (variable >= columns) stays[variable - columns] = 1;
    body.set(this.matrix);
    for (let row = 0; row < rows; row++) basic[row] = columns + row;
    for (let column = 0; column < columns; column++) nonbasic[column] = column;
    this.exchanges = 0;
    for (const variable of wanted) {
      let best = -1;
      let size = 1e-9;
      for (let row = 0; row < rows; row++) {
        if (stays[row] || basic[row] < columns) continue;
        const entry = Math.abs(body[row * columns + variable]);
        if (entry > size) {
          size = entry;
          best = row;
        }
      }
      // A column is still at its own place here: only rows have been exchanged for columns named before it.
      if (best >= 0) this.exchange(best, variable);
    }
    this.exchanges = 0;
  }

  /**
   * Takes a changed row of the matrix into the body as it stands; false where that is not safe and the body must be
   * made anew. The new activity is a sum over columns of the program, whose rows in the body are known.
   */
  replaceRow(row: number, touched: readonly number[]): boolean {
    const { rows, columns, body, matrix } = this;
    const spare = rows * columns;
    body.fill(0, spare, spare + columns);
    for (const variable of touched) {
      const coefficient = matrix[row * columns + variable];
      if (coefficient === 0) continue;
      const place = this.basic.indexOf(variable);
      if (place < 0) body[spare + this.nonbasic.indexOf(variable)] += coefficient;
      else for (let k = 0; k < columns; k++) body[spare + k] += coefficient * body[place * columns + k];
    }
    const activity = columns + row;
    const inBasis = this.basic.indexOf(activity);
    if (inBasis >= 0) {
      body.copyWithin(inBasis * columns, spare, spare + columns);
      return true;
    }
    // The old activity stands among the nonbasic variables: the new one takes its place.
    const column = this.nonbasic.indexOf(activity);
    if (Math.abs(body[spare + column]) < LEAST_KEPT) return false;
    this.#eliminate(rows, column);
    this.exchanges++;
    return true;
  }

  /** Lets the nonbasic variable of a column and the basic variable of a row change places. */
  exchange(row: number, column: number): void {
    this.#eliminate(row, column);
    const leaving = this.basic[row];
    this.basic[row] = this.nonbasic[column];
    this.nonbasic[column] = leaving;
    this.exchanges++;
  }

  /** Solves a row of the body for a column, and puts the result into all other rows. */
  #eliminate(row: number, column: number): void {
    const { rows, columns, body, reduced } = this;
    const first = row * columns;
    const inverse = 1 / body[first + column];
    for (let k = 0; k < columns; k++) body[first + k] *= -inverse;
    body[first + column] = inverse;
    for (let other = 0; other < rows; other++) {
      if (other === row) continue;
      const start = other * columns;
      const factor = body[start + column];
      if (factor === 0) continue;
      for (let k = 0; k < columns; k++) body[start + k] += factor * body[first + k];
      body[start + column] = factor * inverse;
    }
    const factor = reduced[column];
    if (factor === 0) return;
    for (let k = 0; k < columns; k++) reduced[k] += factor * body[first + k];
    reduced[column] = factor * inverse;
  }

  /** Value of the nonbasic variable of a column. */
  at(column: number): number {
    const variable = this.nonbasic[column];
    const bound = this.atUpper[variable] ? this.upper[variable] : this.lower[variable];
    return Number.isFinite(bound) ? bound : 0;
  }

  /** Works out the values of the basic variables. */
  evaluate(): void {
    const { rows, columns, body, value } = this;
    value.fill(0);
    for (let column = 0; column < columns; column++) {
      const at = this.at(column);
      if (at === 0) continue;
      for (let row = 0; row < rows; row++) value[row] += body[row * columns + column] * at;
    }
  }

  /** Works out the reduced costs. */
  price(): void {
    const { rows, columns, body, reduced, cost } = this;
    for (let column = 0; column < columns; column++) {
      const variable = this.nonbasic[column];
      reduced[column] = variable < columns ? cost[variable] : 0;
    }
    for (let row = 0; row < rows; row++) {
      const variable = this.basic[row];
      const price = variable < columns ? cost[variable] : 0;
      if (price === 0) continue;
      const start = row * columns;
      for (let column = 0; column < columns; column++) reduced[column] += price * body[start + column];
    }
  }

  /** Moves the nonbasic variable of a column by a step: the basic ones follow. */
  shift(column: number, step: number): void {
    const { rows, columns, body, value } = this;
    for (let row = 0; row < rows; row++) value[row] += body[row * columns + column] * step;
  }
}
