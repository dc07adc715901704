/**
 * Orders with discrete rules against HiGHS as a mixed-integer solver, in one run: least doses on every stock and at most
 * so many stocks; then drums and flush costs. HiGHS gets our root program (the viscosity index as its two outer lines,
 * an easier problem than ours), every presence an integer, its own presolve, gap 1e-6. Seeded.
 */
import loadHighs from 'highs';
import { createCompactEngine, createHighsEngine, type Order, solveBlend } from '../../src/index';
import type { LinearProgram } from '../../src/optimise/linear/linearEngine';
import { buildModel } from '../../src/optimise/rows/buildModel';
import { findCandidates } from '../../src/optimise/rows/candidates';
import { Draw } from '../oracle/mulberry32';
import { CONTINUOUS, randomOrder } from '../oracle/randomOrder';
import { median, printTable, quantile } from './figures';
import { recording } from './rootProgram';

const highs = await loadHighs();
const engine = createCompactEngine(await createHighsEngine());
const recorder = recording(engine);
const now = () => performance.now();
const LIMIT_MS = 10_000;
/** Each order is solved so often by either; the median counts. */
const REPEATS = 3;

interface Kind {
  name: string;
  sizes: number[];
  orders: number;
  change(order: Order, draw: Draw): void;
}

function leastDoses(order: Order, draw: Draw): void {
  for (const stock of order.stocks) stock.leastDoseIfUsed = draw.between(0.02, 0.1);
}

const KINDS: Kind[] = [
  {
    name: 'least doses, at most 3 to 6',
    sizes: [12, 30, 80],
    orders: 24,
    change(order, draw) {
      leastDoses(order, draw);
      order.mostStocks = draw.whole(3, 6);
    },
  },
  {
    name: 'least doses, at most 2',
    sizes: [12, 30, 80],
    orders: 16,
    change(order, draw) {
      leastDoses(order, draw);
      order.mostStocks = 2;
    },
  },
  {
    name: 'flush costs, at most 5',
    sizes: [12, 30],
    orders: 16,
    change(order, draw) {
      order.batchTonnes = 10;
      for (const stock of order.stocks) stock.flushCost = draw.between(20, 400);
      order.mostStocks = 5;
    },
  },
  {
    name: 'drums and flush costs',
    sizes: [12],
    orders: 12,
    change(order, draw) {
      order.batchTonnes = 20;
      const [dearest] = [...order.stocks].sort((a, b) => b.pricePerTonne - a.pricePerTonne);
      for (const stock of order.stocks) stock.flushCost = draw.between(20, 400);
      dearest.lotTonnes = 0.2;
    },
  },
];

/** The rows that carry the viscosity index stand last in the root: three sums, and five rows over them. */
const VI_ROWS = 8;
const SUMS = 3;

/** The whole program of an order, presences included (our search folds them away), with the lines of its root. */
function wholeProgram(order: Order, root: LinearProgram): { program: LinearProgram; integers: number[] } {
  const { model } = buildModel(order, findCandidates(order));
  const scale = 1000 / model.cost.reduce((most, cost) => Math.max(most, Math.abs(cost)), 1e-300);
  const sums = model.vi ? SUMS : 0;
  const firstSum = root.cost.length - sums;
  const moved = (column: number) => (column < firstSum ? column : model.cost.length + column - firstSum);
  const viRows = model.vi ? root.rows.slice(-VI_ROWS) : [];
  const free = (sign: number) => Array.from({ length: sums }, () => sign * Infinity);
  return {
    program: {
      cost: Float64Array.from([...model.cost.map((cost) => cost * scale), ...free(1).map(() => 0)]),
      lower: Float64Array.from([...model.lower, ...free(-1)]),
      upper: Float64Array.from([...model.upper, ...free(1)]),
      rows: [...model.rows, ...viRows.map((row) => ({ ...row, columns: row.columns.map(moved) }))],
    },
    integers: model.presences.map(({ column }) => column),
  };
}

/** Time of HiGHS on a program with integers, and its cost in the program's scale; undefined where it did not prove. */
function asIntegers(program: LinearProgram, integers: readonly number[], lots: ReadonlyMap<number, number>) {
  const { variableType, modelStatus } = highs.constants;
  const start = now();
  const extra = [...lots];
  const columns = program.cost.length + extra.length;
  const rows = [
    ...program.rows,
    // share of a stock in drums = drums · share of one
    ...extra.map(([column, share], k) => ({
      lower: 0,
      upper: 0,
      columns: [column, program.cost.length + k],
      values: [1, -share],
    })),
  ];
  const starts = new Int32Array(rows.length + 1);
  rows.forEach((row, place) => {
    starts[place + 1] = starts[place] + row.columns.length;
  });
  const whole = new Set(integers);
  const model = highs.createModel({
    numCols: columns,
    numRows: rows.length,
    colCost: [...program.cost, ...extra.map(() => 0)],
    colLower: [...program.lower, ...extra.map(() => 0)],
    colUpper: [...program.upper, ...extra.map(() => 1e6)],
    rowLower: rows.map((row) => row.lower),
    rowUpper: rows.map((row) => row.upper),
    matrix: {
      format: 'csr',
      numRows: rows.length,
      numCols: columns,
      starts,
      indices: Int32Array.from(rows.flatMap((row) => [...row.columns])),
      values: Float64Array.from(rows.flatMap((row) => [...row.values])),
    },
    integrality: Array.from({ length: columns }, (_, j) =>
      whole.has(j) || j >= program.cost.length ? variableType.integer : variableType.continuous,
    ),
  });
  model.options.set({ output_flag: false, mip_rel_gap: 1e-6, mip_abs_gap: 1e-6, time_limit: LIMIT_MS / 1000 });
  model.run();
  const proven = model.getModelStatus() === modelStatus.optimal;
  model.dispose();
  return { milliseconds: now() - start, proven };
}

const rows: (string | number)[][] = [];
for (const { name, sizes, orders, change } of KINDS) {
  for (const size of sizes) {
    const ours: number[] = [];
    const theirs: number[] = [];
    const ratios: number[] = [];
    let unproven = 0;
    let theirUnproven = 0;
    for (let seed = 700_000 + size * 1000; ours.length < orders && seed < 700_600 + size * 1000; seed++) {
      const order = randomOrder(seed, { ...CONTINUOUS, stocks: [size, size], rules: false });
      change(order, new Draw(seed));
      const first = await solveBlend(order, { linearEngine: recorder, now, timeLimitMs: LIMIT_MS });
      const root = recorder.root();
      if (!first.recipe || !root || first.work.linearPrograms < 4) continue;
      const mineOf: number[] = [];
      let outcome = first;
      for (let k = 0; k < REPEATS; k++) {
        const start = now();
        outcome = await solveBlend(order, { linearEngine: engine, now, timeLimitMs: LIMIT_MS });
        mineOf.push(now() - start);
      }
      const mine = median(mineOf);
      const { program, integers } = wholeProgram(order, root.program);
      const byId = [...order.stocks].sort((a, b) => (a.id < b.id ? -1 : 1));
      const lots = new Map(
        byId.flatMap(({ lotTonnes }, j): [number, number][] => (lotTonnes ? [[j, lotTonnes / 20]] : [])),
      );
      const runs = Array.from({ length: REPEATS }, () => asIntegers(program, integers, lots));
      const other = {
        milliseconds: median(runs.map((run) => run.milliseconds)),
        proven: runs.every((run) => run.proven),
      };
      if (outcome.proof.kind !== 'least cost') unproven++;
      if (!other.proven) theirUnproven++;
      ours.push(mine);
      theirs.push(other.milliseconds);
      ratios.push(other.milliseconds / mine);
    }
    rows.push([
      name,
      size,
      ours.length,
      median(ours).toFixed(1),
      quantile(ours, 0.95).toFixed(1),
      median(theirs).toFixed(1),
      median(ratios).toFixed(1),
      quantile(ratios, 0.05).toFixed(1),
      unproven,
      theirUnproven,
    ]);
    console.log(rows[rows.length - 1].join(' | '));
  }
}
printTable(
  [
    'rules',
    'stocks',
    'orders',
    'ours ms',
    'ours p95',
    'HiGHS ms',
    'HiGHS / ours, median',
    '5th percentile',
    'not proven',
    'HiGHS not proven',
  ],
  rows,
);
