import type { ViLimits } from '../rows/searchModel';
import type { ViRows } from './searchProgram';
import { viCurve } from './viCurve';
import { chord, lowerLine, outerLines, tangent } from './viLine';
import { knot, pieceOf } from './viPieces';

/** An interval of KV100 [mm²/s]. */
export interface Kv100Interval {
  from: number;
  to: number;
}

/** Half width of the interval around a solution in which a recipe is sought, relative to KV100 [-]. */
export const NEAR = 5e-4;
/** An interval of KV100 that spans less than this factor is narrow: its outer lines are as good as the curve. */
const NARROW = 1.002;

export function isNarrow(interval: Kv100Interval | undefined): boolean {
  return interval !== undefined && interval.to <= interval.from * NARROW;
}

function inside({ from, to }: Kv100Interval, kv100: number): number {
  return Math.min(to, Math.max(from, Number.isFinite(kv100) ? kv100 : from));
}

/** Rows that every mix in the interval with the viscosity index keeps: they bound the cost from below. */
export function outerRows({ index, min, max }: ViLimits, { from, to }: Kv100Interval): ViRows {
  return {
    from: index.toIndex(from),
    to: index.toIndex(to),
    ...(min ? { above: outerLines(viCurve(index, min.value), from, to) } : {}),
    ...(max ? { below: lowerLine(viCurve(index, max.value), from, to) } : {}),
  };
}

/** The outer rows with the curve's tangent in place of the outer lines: a step towards a recipe, no bound. */
export function tangentRows(vi: ViLimits, interval: Kv100Interval, kv100: number): ViRows {
  const { min } = vi;
  const rows = outerRows(vi, interval);
  return min ? { ...rows, above: [tangent(viCurve(vi.index, min.value), inside(interval, kv100))] } : rows;
}

/** Rows for a narrow interval around a KV100, within one piece, that only mixes on the right side of the curve keep. */
export function innerRows({ index, min, max }: ViLimits, within: Kv100Interval, kv100: number): ViRows {
  const centre = inside(within, kv100);
  const piece = pieceOf(centre);
  const from = Math.max(within.from, knot(piece), centre * (1 - NEAR));
  const to = Math.max(from, Math.min(within.to, knot(piece + 1), centre * (1 + NEAR)));
  const line = min && chord(viCurve(index, min.value), from, to);
  return {
    from: index.toIndex(from),
    to: index.toIndex(to),
    ...(line ? { above: [line] } : {}),
    ...(max ? { below: tangent(viCurve(index, max.value), inside({ from, to }, centre)) } : {}),
  };
}
