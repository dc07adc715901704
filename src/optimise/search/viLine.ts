import type { CurvePoint, ViCurve } from './viCurve';
import { curveAt, lowerPoints, upperPoints } from './viCurve';
import { knot, pieceOf } from './viPieces';

/** A line g = offset + slope·u in the plane of the blending index. */
export interface Line {
  offset: number;
  slope: number;
}

/** Absorbs rounding in the index functions; a thousandth of this moves no cost anyone could see. */
const ROUNDING = 4e-15;

/** The lowest line of a slope that lies above all points. */
function lineAbove(points: readonly CurvePoint[], slope: number): Line {
  let offset = -Infinity;
  for (const { u, g } of points) offset = Math.max(offset, g - slope * u);
  return { offset: offset + ROUNDING, slope };
}

function lineBelow(points: readonly CurvePoint[], slope: number): Line {
  let offset = Infinity;
  for (const { u, g } of points) offset = Math.min(offset, g - slope * u);
  return { offset: offset - ROUNDING, slope };
}

/** Slope of the line through the first point that has all others below it. */
function slopeFromFirst(points: readonly CurvePoint[], fallback: number): number {
  const [first] = points;
  let slope = -Infinity;
  for (const { u, g } of points) if (u > first.u) slope = Math.max(slope, (g - first.g) / (u - first.u));
  return Number.isFinite(slope) ? slope : fallback;
}

/** Slope of the line through the last point that has all others below it. */
function slopeToLast(points: readonly CurvePoint[], fallback: number): number {
  const last = points[points.length - 1];
  let slope = Infinity;
  for (const { u, g } of points) if (u < last.u) slope = Math.min(slope, (last.g - g) / (last.u - u));
  return Number.isFinite(slope) ? slope : fallback;
}

/** Slopes the curve has at the ends of an interval: no line may be steeper or flatter than the curve anywhere. */
function slopeRange(curve: ViCurve, from: number, to: number): { min: number; max: number } {
  const slopes: number[] = [];
  for (let piece = pieceOf(from); knot(piece) < to || slopes.length === 0; piece++) {
    slopes.push(curveAt(curve, piece, Math.max(from, knot(piece))).slope);
    slopes.push(curveAt(curve, piece, Math.max(from, Math.min(to, knot(piece + 1)))).slope);
  }
  return { min: Math.min(...slopes), max: Math.max(...slopes) };
}

/**
 * Two lines above the curve over KV100 from `from` to `to` [mm²/s], one tight at each end: every mix in the interval
 * with at least the viscosity index lies under both.
 */
export function outerLines(curve: ViCurve, from: number, to: number): [Line, Line] {
  const points = upperPoints(curve, from, to);
  const range = slopeRange(curve, from, to);
  const clamp = (slope: number) => Math.min(range.max, Math.max(range.min, slope));
  const middle = (range.min + range.max) / 2;
  return [
    lineAbove(points, clamp(slopeFromFirst(points, middle))),
    lineAbove(points, clamp(slopeToLast(points, middle))),
  ];
}

/** A line below the curve over an interval, its chord where the curve is concave: the outer line of "VI at most". */
export function lowerLine(curve: ViCurve, from: number, to: number): Line {
  const points = lowerPoints(curve, from, to);
  const first = points[0];
  const last = points[points.length - 1];
  const middle = curveAt(curve, pieceOf(from), from).slope;
  return lineBelow(points, last.u > first.u ? (last.g - first.g) / (last.u - first.u) : middle);
}
