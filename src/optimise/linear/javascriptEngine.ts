import solver from 'javascript-lp-solver';
import { dualProgram, rayProgram } from './dualProgram';
import type { LinearEngine, LinearProgram, LinearResult, LinearRow, LinearSession } from './linearEngine';
import { withoutFreeColumns } from './withoutFreeColumns';

/**
 * The second engine: javascript-lp-solver (Unlicense), small and pure JavaScript, for machines without WebAssembly
 * and for second opinions. Linear programs only. It gives no duals, so the dual program is solved as a program of
 * its own. A few programs in ten thousand never end: run it in a worker that can be ended from outside.
 */

/** The package rounds its results to this, and pivots by it; limits are checked to 1e-6 of a reporting unit. */
const PRECISION = 1e-11;
/** Multipliers need not be exact, any give a valid bound; the package pivots better at its usual precision. */
const DUAL_PRECISION = 1e-9;
/** Names of our own for every key: a variable called "result" would overwrite the package's answer. */
const COST = 'cost';

interface Bound {
  min?: number;
  max?: number;
  equal?: number;
}

/** A variable of the package, which knows only x ≥ 0: column = shift + sign · variable. */
interface Part {
  name: string;
  column: number;
  sign: 1 | -1;
  shift: number;
}

function partsOf({ lower, upper }: LinearProgram): Part[] {
  return [...lower.keys()].flatMap((column): Part[] => {
    const name = `x${column}`;
    if (Number.isFinite(lower[column])) return [{ name, column, sign: 1, shift: lower[column] }];
    if (Number.isFinite(upper[column])) return [{ name, column, sign: -1, shift: upper[column] }];
    return [
      { name: `${name}p`, column, sign: 1, shift: 0 },
      { name: `${name}n`, column, sign: -1, shift: 0 },
    ];
  });
}

function boundOf(lower: number, upper: number, shift: number): Bound | undefined {
  if (lower === upper) return { equal: lower - shift };
  const bound: Bound = {};
  if (Number.isFinite(lower)) bound.min = lower - shift;
  if (Number.isFinite(upper)) bound.max = upper - shift;
  return bound.min === undefined && bound.max === undefined ? undefined : bound;
}

/** Minimises a program; undefined where the package finds no bounded solution. */
function minimise(program: LinearProgram, precision: number): Float64Array | undefined {
  const parts = partsOf(program);
  const shift = new Float64Array(program.cost.length);
  for (const part of parts) shift[part.column] = part.shift;
  const constraints: Record<string, Bound> = {};
  const variables: Record<string, Record<string, number>> = {};
  for (const { name, column, sign } of parts) variables[name] = { [COST]: sign * program.cost[column] };
  const partsAt = new Map<number, Part[]>();
  for (const part of parts) partsAt.set(part.column, [...(partsAt.get(part.column) ?? []), part]);
  program.rows.forEach((row, place) => {
    const moved = row.columns.reduce((sum, column, k) => sum + row.values[k] * shift[column], 0);
    const bound = boundOf(row.lower, row.upper, moved);
    if (!bound) return;
    constraints[`r${place}`] = bound;
    row.columns.forEach((column, k) => {
      for (const part of partsAt.get(column) ?? []) variables[part.name][`r${place}`] = part.sign * row.values[k];
    });
  });
  for (const { name, column, sign } of parts) {
    const width = program.upper[column] - program.lower[column];
    if (!Number.isFinite(width)) continue;
    constraints[`b${column}`] = { max: width };
    variables[name][`b${column}`] = sign;
  }
  const model = { optimize: COST, opType: 'min' as const, constraints, variables };
  const result = solver.Solve(model, precision) as { feasible: boolean; bounded?: boolean } & Record<string, unknown>;
  if (!result.feasible || result.bounded === false) return undefined;
  const values = Float64Array.from(shift);
  for (const { name, column, sign } of parts) {
    const value = result[name];
    if (typeof value === 'number') values[column] += sign * value;
  }
  return values;
}

function solveProgram(full: LinearProgram): LinearResult {
  const { program, restore } = withoutFreeColumns(full);
  const values = minimise(program, PRECISION);
  if (!values) {
    const ray = rayProgram(program);
    const solution = minimise(ray.program, DUAL_PRECISION);
    return solution ? { status: 'infeasible', ray: ray.multipliers(solution) } : { status: 'infeasible' };
  }
  const dual = dualProgram(program);
  const solution = minimise(dual.program, DUAL_PRECISION);
  return solution
    ? { status: 'optimal', values: restore(values), duals: dual.multipliers(solution) }
    : { status: 'unknown' };
}

/** Keeps a program of its own to edit; every solve is cold. */
function openSession(initial: LinearProgram): LinearSession {
  const program = {
    cost: Float64Array.from(initial.cost),
    lower: Float64Array.from(initial.lower),
    upper: Float64Array.from(initial.upper),
    rows: initial.rows.map((row) => ({ ...row, columns: [...row.columns], values: [...row.values] })),
  } satisfies LinearProgram & { rows: (LinearRow & { values: number[] })[] };
  return {
    setCost: (column, cost) => {
      program.cost[column] = cost;
    },
    setColumnBounds: (column, lower, upper) => {
      program.lower[column] = lower;
      program.upper[column] = upper;
    },
    setRowBounds: (row, lower, upper) => {
      program.rows[row].lower = lower;
      program.rows[row].upper = upper;
    },
    setCoefficient: (row, column, value) => {
      const { columns, values } = program.rows[row];
      values[columns.indexOf(column)] = value;
    },
    solve: () => {
      try {
        return solveProgram(program);
      } catch {
        return { status: 'unknown' };
      }
    },
    forget: () => {},
    dispose: () => {},
  };
}

/** javascript-lp-solver behind the port. Can hang: only for a worker of its own. */
export function createJavascriptEngine(): LinearEngine {
  return { name: 'javascript-lp-solver', open: openSession };
}
