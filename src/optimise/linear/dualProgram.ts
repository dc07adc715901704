import type { LinearProgram, LinearRow } from './linearEngine';

/** A program whose solution gives multipliers for the rows of another one. */
export interface MultiplierProgram {
  program: LinearProgram;
  /** Multipliers of the rows, signed as in LinearResult.duals. */
  multipliers(solution: Float64Array): Float64Array;
}

/** A non-negative variable of the dual: a finite side of a row or of a column. */
interface Side {
  row?: number;
  column?: number;
  sign: 1 | -1;
  value: number;
}

function sidesOf({ rows, lower, upper }: LinearProgram): Side[] {
  const sides: Side[] = [];
  const add = (at: Pick<Side, 'row' | 'column'>, low: number, high: number) => {
    if (Number.isFinite(low)) sides.push({ ...at, sign: 1, value: low });
    if (Number.isFinite(high)) sides.push({ ...at, sign: -1, value: high });
  };
  rows.forEach((row, place) => void add({ row: place }, row.lower, row.upper));
  lower.forEach((low, column) => void add({ column }, low, upper[column]));
  return sides;
}

/** Rows Aᵀ y + d = cost, one a column. */
function balanceRows(program: LinearProgram, sides: readonly Side[], cost: ArrayLike<number>): LinearRow[] {
  const entries: { columns: number[]; values: number[] }[] = [...program.cost.keys()].map(() => ({
    columns: [],
    values: [],
  }));
  sides.forEach(({ row, column, sign }, place) => {
    if (column !== undefined) {
      entries[column].columns.push(place);
      entries[column].values.push(sign);
    } else if (row !== undefined) {
      program.rows[row].columns.forEach((at, k) => {
        entries[at].columns.push(place);
        entries[at].values.push(sign * program.rows[row].values[k]);
      });
    }
  });
  return entries.map(({ columns, values }, column) => ({ lower: cost[column], upper: cost[column], columns, values }));
}

function fromSides(
  program: LinearProgram,
  cost: ArrayLike<number>,
  extra: (count: number) => LinearRow[],
): MultiplierProgram {
  const sides = sidesOf(program);
  const count = sides.length;
  return {
    program: {
      cost: Float64Array.from(sides, ({ sign, value }) => -sign * value),
      lower: new Float64Array(count),
      upper: new Float64Array(count).fill(Infinity),
      rows: [...balanceRows(program, sides, cost), ...extra(count)],
    },
    multipliers(solution) {
      const multipliers = new Float64Array(program.rows.length);
      sides.forEach(({ row, sign }, place) => {
        if (row !== undefined) multipliers[row] += sign * solution[place];
      });
      return multipliers;
    },
  };
}

/** The dual of a linear program: maximise Σ side · y over y ≥ 0 with Aᵀ y = cost (bounds are rows of their own). */
export function dualProgram(program: LinearProgram): MultiplierProgram {
  return fromSides(program, program.cost, () => []);
}

/** Multipliers that prove a program to have no solution, if any do: the dual without a cost, of total size 1. */
export function rayProgram(program: LinearProgram): MultiplierProgram {
  return fromSides(program, new Float64Array(program.cost.length), (count) => [
    {
      lower: 0,
      upper: 1,
      columns: Array.from({ length: count }, (_, k) => k),
      values: new Array<number>(count).fill(1),
    },
  ]);
}
