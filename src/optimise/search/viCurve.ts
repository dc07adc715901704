import type { BlendingIndex } from '../../property/blendingIndex';
import { TABLE_END_KV100 } from '../../property/viscosityIndex';
import { knot, pieceOf, viKv40, viKv40Bounds } from './viPieces';

/**
 * The curve G of a viscosity-index limit in the plane of the blending index: u = index(KV100) against
 * g = index(KV40 at that VI). A mix has at least the VI exactly when its KV40 index is at most G at its KV100 index.
 *
 * On every piece of D2270 the curve is smooth, with G'' = (G'/φ'(y))·[κ(y) - κ(U)·U' + U''/U'], κ = -φ''/φ'. Where
 * interval evaluation shows the bracket negative the piece is concave: its tangents bound it from above and its chord
 * from below. Where it does not, the bounds are widened by max(0, G'')·h²/2 and /8.
 */
export interface ViCurve {
  index: BlendingIndex;
  vi: number;
}

/** A point of a bounding polyline: index of KV100, bound of the index of KV40. */
export interface CurvePoint {
  u: number;
  g: number;
}

/** The curve at a KV100 within a piece: point and slope dG/du [-]. */
export function curveAt(curve: ViCurve, piece: number, kv100: number): CurvePoint & { slope: number } {
  const { index, vi } = curve;
  const kv40 = viKv40(vi, piece, kv100);
  return {
    u: index.toIndex(kv100),
    g: index.toIndex(kv40.value),
    slope: (index.slope(kv40.value) * kv40.slope) / index.slope(kv100),
  };
}

/** An upper bound of G'' over a part of a piece; 0 where the part is shown to be concave. */
export function convexityBound(curve: ViCurve, piece: number, from: number, to: number): number {
  const { index, vi } = curve;
  if (!index.curvature) throw new RangeError('This blending index has no curvature: a viscosity index cannot be searched.');
  const bounds = viKv40Bounds(vi, piece, from, to);
  const low = viKv40(vi, piece, from);
  const high = viKv40(vi, piece, to);
  if (!bounds) return GREATEST_CONVEXITY;
  const bracket =
    index.curvature(from) - index.curvature(high.value) * bounds.leastSlope + bounds.greatestCurvature;
  if (bracket <= 0) return 0;
  const slope = (index.slope(low.value) * Math.max(low.slope, high.slope)) / index.slope(to);
  return (bracket * slope) / index.slope(to);
}

/** Where not even the sign of a slope is known; measured brackets are below 10. */
const GREATEST_CONVEXITY = 1e3;

/** Calls back for every part of [from, to] (KV100, mm²/s) that lies in one piece. */
function eachPart(from: number, to: number, visit: (piece: number, from: number, to: number) => void): void {
  let piece = pieceOf(from);
  let start = from;
  while (start < to || start === from) {
    const end = Math.min(to, knot(piece + 1));
    visit(piece, start, end);
    if (end >= to) break;
    start = end;
    piece++;
  }
}

/**
 * Points whose polyline lies nowhere below G over KV100 from `from` to `to` [mm²/s]: a line above all of them is above
 * the curve. A piece gives its ends and the crossing of its end tangents.
 */
export function upperPoints(curve: ViCurve, from: number, to: number): CurvePoint[] {
  const points: CurvePoint[] = [];
  // At 70 itself D2270 still reads the table, where the curve is 0.02 % higher than by the formulas above.
  if (from === TABLE_END_KV100) points.push(curveAt(curve, pieceOf(from) - 1, from));
  eachPart(from, to, (piece, start, end) => {
    const a = curveAt(curve, piece, start);
    const b = curveAt(curve, piece, end);
    const width = b.u - a.u;
    const lift = (convexityBound(curve, piece, start, end) * width * width) / 2;
    points.push({ u: a.u, g: a.g + lift });
    const turn = a.slope - b.slope;
    if (turn > 0 && width > 0) {
      const u = Math.min(b.u, Math.max(a.u, a.u + (b.g - a.g - b.slope * width) / turn));
      points.push({ u, g: Math.max(a.g + a.slope * (u - a.u), b.g + b.slope * (u - b.u)) + lift });
    } else if (width > 0) {
      points.push({ u: b.u, g: a.g + a.slope * width + lift });
    }
    points.push({ u: b.u, g: b.g + lift });
  });
  return points;
}

/** Points whose polyline lies nowhere above G over KV100 from `from` to `to` [mm²/s]. */
export function lowerPoints(curve: ViCurve, from: number, to: number): CurvePoint[] {
  const points: CurvePoint[] = [];
  eachPart(from, to, (piece, start, end) => {
    const a = curveAt(curve, piece, start);
    const b = curveAt(curve, piece, end);
    const width = b.u - a.u;
    const drop = (convexityBound(curve, piece, start, end) * width * width) / 8;
    points.push({ u: a.u, g: a.g - drop }, { u: b.u, g: b.g - drop });
  });
  return points;
}
