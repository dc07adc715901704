/**
 * A proven solve against one cold HiGHS LP of the same order (create + run, presolve off), in one run: orders with the
 * viscosity index on its limit and a root gap above 1e-5, no discrete rules. Seeded; see tests/oracle/randomOrder.ts.
 */
import { createCompactEngine, createHighsEngine, type Order, solveBlend } from '../../src/index';
import { CONTINUOUS, randomOrder } from '../oracle/randomOrder';
import { median, printTable, quantile, timed } from './figures';
import { recording } from './rootProgram';

const WANTED = 60;
const highs = await createHighsEngine();
const engine = createCompactEngine(highs);
const recorder = recording(highs);
const now = () => performance.now();

async function isHardEnough(order: Order): Promise<boolean> {
  const outcome = await solveBlend(order, { linearEngine: recorder, now });
  const root = recorder.root();
  if (outcome.costPerTonne === undefined || !root) return false;
  const scale = 1000 / Math.max(...order.stocks.map((stock) => Math.abs(stock.pricePerTonne)));
  const rootGap = 1 - root.cost / (outcome.costPerTonne * scale);
  return rootGap > 1e-5 && outcome.checks.some((check) => check.property === 'vi' && check.onLimit);
}

async function solveTime(order: Order, repeats: number): Promise<number> {
  const times: number[] = [];
  for (let k = 0; k < repeats; k++) {
    const start = now();
    await solveBlend(order, { linearEngine: engine, now });
    times.push(now() - start);
  }
  return median(times);
}

const rows: (string | number)[][] = [];
for (const size of [12, 30, 80, 200]) {
  const solve: number[] = [];
  const cold: number[] = [];
  const programs: number[] = [];
  let seed = size * 100_000;
  while (solve.length < WANTED && seed < size * 100_000 + 2000) {
    const order = randomOrder(seed++, { ...CONTINUOUS, stocks: [size, size], rules: false });
    if (!(await isHardEnough(order))) continue;
    const root = recorder.root();
    if (!root) continue;
    cold.push(
      timed(7, () => {
        const session = highs.open(root.program);
        session.solve();
        session.dispose();
      }),
    );
    solve.push(await solveTime(order, 7));
    programs.push((await solveBlend(order, { linearEngine: engine, now })).work.linearPrograms);
  }
  const ratios = solve.map((time, k) => time / cold[k]);
  rows.push([
    size,
    solve.length,
    cold.length > 0 ? median(cold).toFixed(2) : '-',
    median(solve).toFixed(2),
    quantile(solve, 0.95).toFixed(2),
    median(ratios).toFixed(2),
    quantile(ratios, 0.95).toFixed(2),
    median(programs),
    Math.max(...programs),
  ]);
}
printTable(
  ['stocks', 'orders', 'cold LP ms', 'solve ms', 'p95 ms', 'ratio median', 'ratio p95', 'LPs median', 'LPs most'],
  rows,
);
