import type { LinearEngine } from '../../src/index';
import type { LinearProgram } from '../../src/optimise/linear/linearEngine';

/** An engine that keeps a copy of the first program it solves, edits included: the root of a search. */
export interface RecordingEngine extends LinearEngine {
  /** The root program of the latest search, and its least cost in the program's own scale. */
  root(): { program: LinearProgram; cost: number } | undefined;
}

export function recording(engine: LinearEngine): RecordingEngine {
  let root: { program: LinearProgram; cost: number } | undefined;
  return {
    name: engine.name,
    root: () => root,
    open(initial) {
      root = undefined;
      const session = engine.open(initial);
      const program = {
        cost: Float64Array.from(initial.cost),
        lower: Float64Array.from(initial.lower),
        upper: Float64Array.from(initial.upper),
        rows: initial.rows.map((row) => ({ ...row, columns: [...row.columns], values: [...row.values] })),
      };
      return {
        ...session,
        setColumnBounds(column, lower, upper) {
          program.lower[column] = lower;
          program.upper[column] = upper;
          session.setColumnBounds(column, lower, upper);
        },
        setRowBounds(row, lower, upper) {
          Object.assign(program.rows[row], { lower, upper });
          session.setRowBounds(row, lower, upper);
        },
        setCoefficient(row, column, value) {
          program.rows[row].values[program.rows[row].columns.indexOf(column)] = value;
          session.setCoefficient(row, column, value);
        },
        solve() {
          const result = session.solve();
          if (!root && result.status === 'optimal') {
            const { values } = result;
            root = {
              program: structuredClone(program),
              cost: program.cost.reduce((sum, c, j) => sum + c * values[j], 0),
            };
          }
          return result;
        },
      };
    },
  };
}
