import type { Order } from '../../src/index';
import { costOf, predictedViolation } from './predictedViolation';

/**
 * Every mix of 2 or 3 stocks on a grid, refined around the cheapest: `predictBlend` alone judges. Along a line of
 * mixes the cost is linear, so the cheapest point of a line is an end of a stretch that meets the limits; ends are
 * bisected. A stretch narrower than the grid is looked for where the miss of the limits has a dip.
 */
export interface GridAnswer {
  cost: number;
  x: number[];
}

const SLACK = 1e-9;

/** Cheapest mix on the line from one mix to another that meets the limits. */
function cheapestOnLine(order: Order, from: number[], to: number[], points: number): GridAnswer | undefined {
  const mixAt = (t: number) => from.map((share, i) => share + t * (to[i] - share));
  const missAt = (t: number) => predictedViolation(order, mixAt(t));
  const towards = costOf(order, to) < costOf(order, from) ? 1 : -1;
  const grid = Array.from({ length: points + 1 }, (_, k) => ({ t: k / points, miss: missAt(k / points) }));
  const inside = grid.filter(({ miss }) => miss <= SLACK).map(({ t }) => t);
  for (let k = 1; k < points; k++) {
    const { t, miss } = grid[k];
    if (miss > SLACK && miss < grid[k - 1].miss && miss < grid[k + 1].miss) {
      const dip = lowest(missAt, grid[k - 1].t, grid[k + 1].t, t);
      if (missAt(dip) <= SLACK) inside.push(dip);
    }
  }
  if (inside.length === 0) return undefined;
  const best = inside.reduce((a, b) => (towards * (b - a) > 0 ? b : a));
  let good = best;
  let bad = Math.min(1, Math.max(0, best + towards / points));
  if (missAt(bad) <= SLACK) good = bad;
  for (let step = 0; step < 30 && good !== bad; step++) {
    const middle = (good + bad) / 2;
    if (missAt(middle) <= SLACK) good = middle;
    else bad = middle;
  }
  const x = mixAt(good);
  return { x, cost: costOf(order, x) };
}

/** Where a dip of a function is lowest, or the first point that is low enough. */
function lowest(f: (t: number) => number, low: number, high: number, start: number): number {
  let [a, b, best] = [low, high, start];
  for (let step = 0; step < 14; step++) {
    const left = a + 0.382 * (b - a);
    const right = a + 0.618 * (b - a);
    const [missLeft, missRight] = [f(left), f(right)];
    best = missLeft < missRight ? left : right;
    if (Math.min(missLeft, missRight) <= SLACK) return best;
    if (missLeft < missRight) b = right;
    else a = left;
  }
  return best;
}

/** Cheapest mix found, or undefined where no mix was found that meets the limits. */
export function gridSearch(order: Order, points: number): GridAnswer | undefined {
  if (order.stocks.length === 2) return cheapestOnLine(order, [1, 0], [0, 1], points);
  const lineAt = (share: number) => cheapestOnLine(order, [1 - share, 0, share], [0, 1 - share, share], points);
  let best: GridAnswer | undefined;
  const offer = (share: number) => {
    if (share < 0 || share > 1) return false;
    const found = lineAt(share);
    if (!found || (best && !(found.cost < best.cost - 1e-10))) return false;
    best = found;
    return true;
  };
  for (let k = 0; k <= points; k++) offer(k / points);
  for (let step = 0.5 / points; step > 1e-7 && best; step /= 3) {
    while (offer(best.x[2] + step) || offer(best.x[2] - step)) {
      // Walk at this step for as long as it gains something.
    }
  }
  return best;
}
