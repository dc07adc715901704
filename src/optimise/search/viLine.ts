import { type CurvePoint, lowerPoints, type ViCurve } from './viCurve';
import { knot, pieceOf } from './viPieces';

/** A line g = offset + slope·u in the plane of the blending index. */
export interface Line {
  offset: number;
  slope: number;
}

/** Absorbs rounding in the index functions; a thousand times this moves no cost anyone could see. */
const ROUNDING = 4e-15;

function allowance(offset: number): number {
  return ROUNDING * Math.max(1, Math.abs(offset));
}

/** The lowest line of a slope that lies above all points. */
function lineAbove(points: readonly CurvePoint[], slope: number): Line {
  let offset = -Infinity;
  for (const { u, g } of points) offset = Math.max(offset, g - slope * u);
  return { offset: offset + allowance(offset), slope };
}

function lineBelow(points: readonly CurvePoint[], slope: number): Line {
  let offset = Infinity;
  for (const { u, g } of points) offset = Math.min(offset, g - slope * u);
  return { offset: offset - allowance(offset), slope };
}

/** No line may be steeper or flatter than the curve is anywhere: differences of close points are mostly rounding. */
function between(least: number, greatest: number, slope: number): number {
  return Math.min(greatest, Math.max(least, slope));
}

function slopeBetween(a: CurvePoint, b: CurvePoint): number {
  return (b.g - a.g) / (b.u - a.u);
}

/**
 * Two lines above the curve over KV100 from `from` to `to` [mm²/s], one tight at each end: every mix in the interval
 * with at least the viscosity index lies under both.
 */
export function outerLines(curve: ViCurve, from: number, to: number): [Line, Line] {
  const { hull, leastSlope, greatestSlope } = curve.outline(from, to);
  const last = hull.length - 1;
  const first = last > 0 ? slopeBetween(hull[0], hull[1]) : leastSlope;
  const final = last > 0 ? slopeBetween(hull[last - 1], hull[last]) : greatestSlope;
  return [
    lineAbove(hull, between(leastSlope, greatestSlope, first)),
    lineAbove(hull, between(leastSlope, greatestSlope, final)),
  ];
}

/** Offset of the lowest line of a slope that lies above the curve over an interval. */
export function offsetAbove(curve: ViCurve, from: number, to: number, slope: number): number {
  return lineAbove(curve.outline(from, to).hull, slope).offset;
}

/** A line below the curve over an interval, its chord where the curve is concave: the outer line of "VI at most". */
export function lowerLine(curve: ViCurve, from: number, to: number): Line {
  const parts = curve.parts(from, to);
  const points = lowerPoints(parts);
  const first = points[0];
  const last = points[points.length - 1];
  const { leastSlope, greatestSlope } = curve.outline(from, to);
  const slope = last.u > first.u ? slopeBetween(first, last) : parts[0].from.slope;
  return lineBelow(points, between(leastSlope, greatestSlope, slope));
}

/** The chord of the curve inside the piece of `from`: under it a recipe surely has the index where G is concave. */
export function chord(curve: ViCurve, from: number, to: number): Line {
  const piece = pieceOf(from);
  const a = curve.at(piece, from);
  const b = curve.at(piece, Math.min(to, knot(piece + 1)));
  const slope = b.u > a.u ? (b.g - a.g) / (b.u - a.u) : a.slope;
  return { offset: a.g - slope * a.u, slope };
}

/** The tangent of the curve at a KV100 [mm²/s]: above it a recipe surely keeps "VI at most" where G is concave. */
export function tangent(curve: ViCurve, kv100: number): Line {
  const { u, g, slope } = curve.at(pieceOf(kv100), kv100);
  return { offset: g - slope * u, slope };
}
