import type { LinearEngine, LinearProgram, LinearRow, LinearSession } from './linearEngine';

/** A session that outlives the search that opened it, with the program as it stands after all edits. */
interface Kept {
  session: LinearSession;
  /** The engine lost its way once: the next program starts on a new session. */
  spoilt: boolean;
  program: LinearProgram & { rows: (LinearRow & { lower: number; upper: number; values: number[] })[] };
}

function copyOf(program: LinearProgram): Kept['program'] {
  return {
    cost: Float64Array.from(program.cost),
    lower: Float64Array.from(program.lower),
    upper: Float64Array.from(program.upper),
    rows: program.rows.map((row) => ({ ...row, values: [...row.values] })),
  };
}

/** The same columns, and rows over the same columns: one can be edited into the other. */
function hasSameShape(a: LinearProgram, b: LinearProgram): boolean {
  return (
    a.cost.length === b.cost.length &&
    a.rows.length === b.rows.length &&
    a.rows.every(({ columns }, place) => {
      const other = b.rows[place].columns;
      return columns.length === other.length && columns.every((column, k) => column === other[k]);
    })
  );
}

/** A session that notes every edit, so that it can be edited into the next program. */
function noting(kept: Kept): LinearSession {
  const { session, program } = kept;
  return {
    ...session,
    solve() {
      const result = session.solve();
      kept.spoilt ||= result.status === 'unknown';
      return result;
    },
    setCost(column, cost) {
      if (program.cost[column] === cost) return;
      program.cost[column] = cost;
      session.setCost(column, cost);
    },
    setColumnBounds(column, lower, upper) {
      if (program.lower[column] === lower && program.upper[column] === upper) return;
      program.lower[column] = lower;
      program.upper[column] = upper;
      session.setColumnBounds(column, lower, upper);
    },
    setRowBounds(row, lower, upper) {
      const known = program.rows[row];
      if (known.lower === lower && known.upper === upper) return;
      known.lower = lower;
      known.upper = upper;
      session.setRowBounds(row, lower, upper);
    },
    setCoefficient(row, column, value) {
      const { columns, values } = program.rows[row];
      const place = columns.indexOf(column);
      if (values[place] === value) return;
      values[place] = value;
      session.setCoefficient(row, column, value);
    },
    dispose() {
      // Kept for the next program of the same shape.
    },
  };
}

function editInto(session: LinearSession, program: LinearProgram): void {
  program.cost.forEach((cost, column) => {
    session.setCost(column, cost);
    session.setColumnBounds(column, program.lower[column], program.upper[column]);
  });
  program.rows.forEach((row, place) => {
    session.setRowBounds(place, row.lower, row.upper);
    row.columns.forEach((column, k) => void session.setCoefficient(place, column, row.values[k]));
  });
}

/**
 * An engine that keeps its last session: the next program, if it has the same shape, is edited into it and solved from
 * the basis that was optimal before. For one search at a time, as when a limit is dragged. Proofs do not suffer: no
 * bound is taken from an engine.
 */
export function reusingSessions(engine: LinearEngine): LinearEngine {
  let kept: Kept | undefined;
  return {
    name: engine.name,
    open(program) {
      if (kept && !kept.spoilt && hasSameShape(kept.program, program)) {
        const session = noting(kept);
        editInto(session, program);
        return session;
      }
      kept?.session.dispose();
      kept = { session: engine.open(program), program: copyOf(program), spoilt: false };
      return noting(kept);
    },
  };
}
