import type { MovingRow } from './linearModel';
import type { OrderRows } from './orderRows';
import { breakpoints, kv40OfVi } from './viscosityIndex';

/**
 * A slice of KV100 [mm²/s], and the lines that stand in for the viscosity-index limit inside it. In the plane of
 * blending indices (u of KV100, g of KV40) the limit is g ≤ G(u). Inside a slice G - slope·u is sampled; between
 * samples it strays by at most max|G''|·d²/8, taken as twice the largest second difference seen.
 */
export interface Slice {
  low: number;
  high: number;
}

const SAMPLES = 8;

interface Sampled {
  u: number[];
  g: number[];
  /** How far G may stray between samples. */
  stray: number;
}

/** Samples of G over a slice that lies within one piece of D2270. */
function sample(vi: number, slice: Slice, index: (kv: number) => number): Sampled {
  const above = slice.high > 70;
  const u: number[] = [];
  const g: number[] = [];
  const uLow = index(slice.low);
  const uHigh = index(slice.high);
  for (let k = 0; k <= SAMPLES; k++) {
    const y = k === SAMPLES ? slice.high : slice.low + ((slice.high - slice.low) * k) / SAMPLES;
    u.push(k === 0 ? uLow : k === SAMPLES ? uHigh : index(y));
    g.push(index(kv40OfVi(vi, y, above && y >= 70)));
  }
  let bend = 0;
  for (let k = 1; k < SAMPLES; k++) {
    const left = (g[k] - g[k - 1]) / (u[k] - u[k - 1] || 1);
    const right = (g[k + 1] - g[k]) / (u[k + 1] - u[k] || 1);
    bend = Math.max(bend, Math.abs(right - left) * (u[k + 1] - u[k - 1]));
  }
  return { u, g, stray: bend / 4 + 1e-15 };
}

/** Samples already taken, by limit and slice: runs of slices are halved over the same ones. */
const taken = new WeakMap<Slice, Map<number, Sampled>>();

function sampleOnce(vi: number, slice: Slice, index: (kv: number) => number): Sampled {
  const known = taken.get(slice) ?? new Map<number, Sampled>();
  const found = known.get(vi) ?? sample(vi, slice, index);
  taken.set(slice, known.set(vi, found));
  return found;
}

/** Lines a + b·u above and below G over slices that adjoin; one slice a piece of D2270. */
export function lines(vi: number, slices: readonly Slice[], index: (kv: number) => number) {
  const parts = slices.map((slice) => sampleOnce(vi, slice, index));
  const first = parts[0];
  const last = parts[parts.length - 1];
  const rise = last.g[SAMPLES] - first.g[0];
  const run = last.u[SAMPLES] - first.u[0];
  const slope = run > 0 ? rise / run : 0;
  let above = -Infinity;
  let below = Infinity;
  for (const { u, g, stray } of parts) {
    for (let k = 0; k <= SAMPLES; k++) {
      above = Math.max(above, g[k] - slope * u[k] + stray);
      below = Math.min(below, g[k] - slope * u[k] - stray);
    }
  }
  return { slope, above, below };
}

/** The thickest stock [mm²/s at 100 °C]: no mix is thicker. */
function thickest({ stocks }: OrderRows): number {
  const figures = stocks.flatMap((stock) => stock.figures.filter((f) => f.property === 'kv' && f.celsius === 100));
  return Math.max(0, ...figures.map((figure) => figure.value ?? 0));
}

/** The window cut at every change of formula of D2270; viscosity index is not defined below KV100 = 2. */
export function startingSlices(order: OrderRows): Slice[] {
  const from = Math.max(2, order.window.low);
  const to = Math.min(order.window.high, thickest(order));
  if (!(from <= to)) return [];
  const cuts = breakpoints(from, to);
  // At 70 itself the table still holds: a window that begins there begins with a slice of no width.
  if (from === 70 && to > 70) cuts.unshift(70);
  return cuts.slice(1).map((cut, k) => ({ low: cuts[k], high: cut }));
}

/** Rows that hold the mix inside a slice and under (above) the lines of the viscosity-index limits. */
export function sliceRows(order: OrderRows, slices: readonly Slice[], side: 'outer' | 'inner'): MovingRow[] {
  const { viscosity, vi } = order;
  if (!viscosity || !vi) return [];
  const { terms, index } = viscosity;
  const typical = Math.max(...terms.map((t) => t.weight)) * 0.1;
  const row = (part: (t: (typeof terms)[number]) => number, lower: number, upper: number): MovingRow => ({
    values: terms.map((t) => (t.weight * part(t)) / typical),
    lower,
    upper,
  });
  const uLow = index(slices[0].low);
  const uHigh = index(slices[slices.length - 1].high);
  const rows = [row((t) => t.index100 - uLow, 0, Infinity), row((t) => t.index100 - uHigh, -Infinity, 0)];
  if (vi.min !== undefined) {
    const line = lines(vi.min, slices, index);
    const offset = side === 'outer' ? line.above : line.below;
    rows.push(row((t) => t.index40 - offset - line.slope * t.index100, -Infinity, 0));
  }
  if (vi.max !== undefined) {
    const line = lines(vi.max, slices, index);
    const offset = side === 'outer' ? line.below : line.above;
    rows.push(row((t) => t.index40 - offset - line.slope * t.index100, 0, Infinity));
  }
  return rows;
}

export function movingRowCount({ vi }: OrderRows): number {
  return vi ? 2 + (vi.min === undefined ? 0 : 1) + (vi.max === undefined ? 0 : 1) : 0;
}
