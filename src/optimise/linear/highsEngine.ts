import loadHighs from 'highs';
import type { LinearEngine, LinearProgram, LinearResult, LinearSession } from './linearEngine';

type Highs = Awaited<ReturnType<typeof loadHighs>>;

export interface HighsLoading {
  /** Where the wasm file is, for bundlers that move it. */
  locateFile?(file: string): string;
}

const TOLERANCE = 1e-9;

function compressedRows(program: LinearProgram) {
  const starts = new Int32Array(program.rows.length + 1);
  program.rows.forEach((row, place) => {
    starts[place + 1] = starts[place] + row.columns.length;
  });
  return {
    format: 'csr' as const,
    numRows: program.rows.length,
    numCols: program.cost.length,
    starts,
    indices: Int32Array.from(program.rows.flatMap((row) => [...row.columns])),
    values: Float64Array.from(program.rows.flatMap((row) => [...row.values])),
  };
}

function openSession(highs: Highs, program: LinearProgram): LinearSession {
  const model = highs.createModel({
    numCols: program.cost.length,
    numRows: program.rows.length,
    colCost: program.cost,
    colLower: program.lower,
    colUpper: program.upper,
    rowLower: program.rows.map((row) => row.lower),
    rowUpper: program.rows.map((row) => row.upper),
    matrix: compressedRows(program),
  });
  model.options.set({
    output_flag: false,
    presolve: 'off',
    solver: 'simplex',
    primal_feasibility_tolerance: TOLERANCE,
    dual_feasibility_tolerance: TOLERANCE,
  });
  const { modelStatus } = highs.constants;

  function runOnce(): LinearResult {
    model.run();
    const status = model.getModelStatus();
    if (status === modelStatus.optimal) {
      const solution = model.getSolution();
      return {
        status: 'optimal',
        values: Float64Array.from(solution.colValue),
        duals: Float64Array.from(solution.rowDual),
      };
    }
    if (status === modelStatus.infeasible) {
      const ray = model.getDualRay();
      return ray ? { status: 'infeasible', ray: Float64Array.from(ray.values) } : { status: 'infeasible' };
    }
    return { status: 'unknown' };
  }

  /** A hot re-solve can throw or end in "unknown" (3 of 27 546 measured): then once more, cold. */
  function solve(): LinearResult {
    try {
      const result = runOnce();
      if (result.status !== 'unknown') return result;
    } catch {
      // The cold run below answers, or says unknown.
    }
    try {
      model.clearSolver();
      return runOnce();
    } catch {
      return { status: 'unknown' };
    }
  }

  return {
    setCost: (column, cost) => void model.changeColCost(column, cost),
    setColumnBounds: (column, lower, upper) => void model.changeColBounds(column, lower, upper),
    setRowBounds: (row, lower, upper) => void model.changeRowBounds(row, lower, upper),
    setCoefficient: (row, column, value) => void model.changeCoefficient(row, column, value),
    solve,
    forget: () => void model.clearSolver(),
    dispose: () => model.dispose(),
  };
}

/** HiGHS, compiled to WebAssembly (package `highs`, MIT). Rejects where the wasm cannot be loaded. */
export async function createHighsEngine(loading: HighsLoading = {}): Promise<LinearEngine> {
  const highs = await loadHighs(loading.locateFile ? { locateFile: loading.locateFile.bind(loading) } : {});
  return { name: 'HiGHS', open: (program) => openSession(highs, program) };
}
