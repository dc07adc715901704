/** Memory over 5 000 solves on one engine: it must not grow. Printed every 1 000. */
import { createEngine, solveBlend } from '../../src/index';
import { CONTINUOUS, DISCRETE, randomOrder } from '../oracle/randomOrder';
import { printTable } from './figures';

const engine = await createEngine();
const now = () => performance.now();
const collect = (globalThis as { gc?: () => void }).gc;
const megabytes = (bytes: number) => (bytes / 1e6).toFixed(1);

const rows: (string | number)[][] = [];
for (let solved = 0; solved <= 5000; solved++) {
  if (solved % 1000 === 0) {
    collect?.();
    const { heapUsed, arrayBuffers, rss } = process.memoryUsage();
    rows.push([solved, megabytes(heapUsed), megabytes(arrayBuffers), megabytes(rss)]);
  }
  const seed = 1 + (solved % 100);
  await solveBlend(randomOrder(seed, solved % 10 === 0 ? DISCRETE : CONTINUOUS), { linearEngine: engine, now });
}
printTable(['solves', 'heap MB', 'array buffers (wasm) MB', 'resident MB'], rows);
