/**
 * A limit moved a little, as in a drag: the solve from the last recipe's KV100, against a solve from
 * nothing, in one run. Orders as in solve.bench.ts; the viscosity index moves by a tenth to and fro.
 */
import { createEngine, type Order, solveBlend } from '../../src/index';
import { CONTINUOUS, randomOrder } from '../oracle/randomOrder';
import { median, printTable } from './figures';

const WANTED = 40;
const engine = await createEngine();
const now = () => performance.now();

function moved(order: Order, step: number): Order {
  const limits = order.limits.map((limit) =>
    limit.property === 'vi' && limit.min !== undefined ? { ...limit, min: limit.min - 0.1 * step } : limit,
  );
  return { ...order, limits };
}

const rows: (string | number)[][] = [];
for (const size of [12, 30, 80, 200]) {
  const ratios: number[] = [];
  const hotTimes: number[] = [];
  const coldTimes: number[] = [];
  for (let seed = size * 100_000; ratios.length < WANTED && seed < size * 100_000 + 2000; seed++) {
    const order = randomOrder(seed, { ...CONTINUOUS, stocks: [size, size], rules: false });
    const first = await solveBlend(order, { linearEngine: engine, now });
    if (!first.recipe || first.work.linearPrograms < 3) continue;
    let near = first.properties?.properties.find(({ celsius }) => celsius === 100)?.value;
    const hot: number[] = [];
    const cold: number[] = [];
    for (let k = 0; k < 12; k++) {
      const next = moved(order, (k % 4) + 1);
      const start = now();
      const outcome = await solveBlend(next, { linearEngine: engine, now, ...(near === undefined ? {} : { near }) });
      const middle = now();
      const again = await solveBlend(next, { linearEngine: engine, now });
      if (k > 3) {
        hot.push(middle - start);
        cold.push(now() - middle);
      }
      near = outcome.properties?.properties.find(({ celsius }) => celsius === 100)?.value;
      if (Math.abs((outcome.costPerTonne ?? 0) - (again.costPerTonne ?? 0)) > 2e-6 * (again.costPerTonne ?? 1)) {
        throw new Error(
          `seed ${seed}: from the last KV100 it found ${outcome.costPerTonne}, from nothing ${again.costPerTonne}.`,
        );
      }
    }
    hotTimes.push(median(hot));
    coldTimes.push(median(cold));
    ratios.push(median(hot) / median(cold));
  }
  rows.push([
    size,
    ratios.length,
    median(coldTimes).toFixed(2),
    median(hotTimes).toFixed(2),
    median(ratios).toFixed(2),
  ]);
}
printTable(['stocks', 'orders', 'from nothing ms', 'limit moved ms', 'ratio median'], rows);
