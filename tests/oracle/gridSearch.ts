import type { Order } from '../../src/index';
import { costOf, predictedViolation } from './predictedViolation';

/** Every mix of 2 or 3 stocks on a grid, then finer grids around the best: `predictBlend` alone judges. */
export interface GridAnswer {
  cost: number;
  x: number[];
}

const SLACK = 1e-9;

function mixes(stocks: number, a: number, b: number): number[] | undefined {
  const x = stocks === 2 ? [a, 1 - a] : [a, b, 1 - a - b];
  return x.every((share) => share >= -1e-12) ? x.map((share) => Math.max(0, share)) : undefined;
}

function scan(order: Order, a0: number, b0: number, step: number, reach: number, keep: (x: number[], cost: number) => void): void {
  const three = order.stocks.length === 3;
  for (let i = -reach; i <= reach; i++) {
    for (let k = three ? -reach : 0; k <= (three ? reach : 0); k++) {
      const x = mixes(order.stocks.length, a0 + i * step, b0 + k * step);
      if (x && predictedViolation(order, x) <= SLACK) keep(x, costOf(order, x));
    }
  }
}

/** Cheapest mix found on the grids, or undefined where no grid point meets the limits. */
export function gridSearch(order: Order, points: number, kept = 6): GridAnswer | undefined {
  const step = 1 / points;
  let front: GridAnswer[] = [];
  scan(order, 0.5, order.stocks.length === 3 ? 0.5 : 0, step, Math.ceil(points / 2), (x, cost) => front.push({ x, cost }));
  front.sort((p, q) => p.cost - q.cost);
  front = front.slice(0, kept);
  for (let size = step / 2; size > 1e-9 && front.length > 0; size /= 2) {
    const next: GridAnswer[] = [];
    for (const { x } of front) scan(order, x[0], x.length === 3 ? x[1] : 0, size, 2, (y, cost) => next.push({ x: y, cost }));
    next.sort((p, q) => p.cost - q.cost);
    const distinct = next.filter((p, i) => i === 0 || Math.abs(p.x[0] - next[i - 1].x[0]) + Math.abs(p.x[1] - next[i - 1].x[1]) > size / 4);
    front = distinct.slice(0, kept);
  }
  return front[0];
}
