/**
 * The port to linear programming: minimise cost·x over rowLower ≤ A x ≤ rowUpper, lower ≤ x ≤ upper. A session keeps
 * one program and re-solves it after edits, hot where the engine can. No bound is ever taken from an engine on
 * trust: see search/safeBound.ts.
 */
export interface LinearProgram {
  cost: Float64Array;
  lower: Float64Array;
  upper: Float64Array;
  rows: LinearRow[];
}

export interface LinearRow {
  lower: number;
  upper: number;
  columns: readonly number[];
  values: readonly number[];
}

/**
 * `duals`: one a row, such that cost - Aᵀ·duals is the reduced cost (positive on an active lower side, negative on
 * an active upper one). `ray`: the same shape, a direction that proves there is no solution; either sign.
 */
export type LinearResult =
  | { status: 'optimal'; values: Float64Array; duals: Float64Array }
  | { status: 'infeasible'; ray?: Float64Array }
  | { status: 'unknown' };

export interface LinearSession {
  setCost(column: number, cost: number): void;
  setColumnBounds(column: number, lower: number, upper: number): void;
  setRowBounds(row: number, lower: number, upper: number): void;
  /** Only for coefficients that stand in the row already. */
  setCoefficient(row: number, column: number, value: number): void;
  solve(): LinearResult;
  /** Forgets the basis: the next solve starts cold. */
  forget(): void;
  dispose(): void;
}

export interface LinearEngine {
  name: string;
  open(program: LinearProgram): LinearSession;
}
