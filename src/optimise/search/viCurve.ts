import type { BlendingIndex } from '../../property/blendingIndex';
import { TABLE_END_KV100 } from '../../property/viscosityIndex';
import { type Outline, outlineOf } from './viOutline';
import { knot, pieceOf, viKv40, viKv40Bounds } from './viPieces';

/** A point of a bounding polyline: index of KV100, bound of the index of KV40. */
export interface CurvePoint {
  u: number;
  g: number;
}

/** A part of the curve inside one piece: its ends with their slopes dG/du [-], and an upper bound of G''. */
export interface CurvePart {
  from: CurvePoint & { slope: number };
  to: CurvePoint & { slope: number };
  convexity: number;
}

/** Where not even the sign of a slope is known; measured brackets are below 10. */
const GREATEST_CONVEXITY = 1e3;

/**
 * The curve G of a viscosity-index limit in the plane of the blending index: u = index(KV100) against
 * g = index(KV40 at that VI). A mix has at least the VI exactly when its KV40 index is at most G at its KV100 index.
 *
 * On every piece of D2270 the curve is smooth, with G'' = (G'/φ'(y))·[κ(y) - κ(U)·U' + U''/U'], κ = -φ''/φ'. Where
 * interval evaluation shows the bracket negative the piece is concave: its tangents bound it from above and its chord
 * from below. Where it does not, the bounds are widened by max(0, G'')·h²/2 and /8.
 */
export class ViCurve {
  readonly #whole: CurvePart[] = [];
  /** Outlines of the intervals asked for last, newest first: a part of the search asks several times. */
  readonly #outlines: { from: number; to: number; outline: Outline }[] = [];

  constructor(
    readonly index: BlendingIndex,
    readonly vi: number,
  ) {}

  /** The curve at a KV100 [mm²/s] within a piece. */
  at(piece: number, kv100: number): CurvePoint & { slope: number } {
    const { index, vi } = this;
    const kv40 = viKv40(vi, piece, kv100);
    return {
      u: index.toIndex(kv100),
      g: index.toIndex(kv40.value),
      slope: (index.slope(kv40.value) * kv40.slope) / index.slope(kv100),
    };
  }

  /** An upper bound of G'' over a part of a piece; 0 where the part is shown to be concave. */
  convexity(piece: number, from: number, to: number): number {
    const { index, vi } = this;
    if (!index.curvature)
      throw new RangeError('This blending index has no curvature: a viscosity index cannot be searched.');
    const bounds = viKv40Bounds(vi, piece, from, to);
    if (!bounds) return GREATEST_CONVEXITY;
    const low = viKv40(vi, piece, from);
    const high = viKv40(vi, piece, to);
    const bracket = index.curvature(from) - index.curvature(high.value) * bounds.leastSlope + bounds.greatestCurvature;
    if (bracket <= 0) return 0;
    const slope = (index.slope(low.value) * Math.max(low.slope, high.slope)) / index.slope(to);
    return (bracket * slope) / index.slope(to);
  }

  #part(piece: number, from: number, to: number): CurvePart {
    return { from: this.at(piece, from), to: this.at(piece, to), convexity: this.convexity(piece, from, to) };
  }

  #wholePart(piece: number): CurvePart {
    this.#whole[piece] ??= this.#part(piece, knot(piece), knot(piece + 1));
    return this.#whole[piece];
  }

  /** The parts of KV100 from `from` to `to` [mm²/s], one a piece. */
  parts(from: number, to: number): CurvePart[] {
    const parts: CurvePart[] = [];
    let piece = pieceOf(from);
    // At 70 itself D2270 still reads the table, where the curve is 0.02 % higher than by the formulas above.
    if (from === TABLE_END_KV100) parts.push(this.#part(piece - 1, from, from));
    for (let start = from; ; piece++) {
      const next = knot(piece + 1);
      const end = Math.min(to, next);
      parts.push(start === knot(piece) && end === next ? this.#wholePart(piece) : this.#part(piece, start, end));
      if (end >= to) return parts;
      start = end;
    }
  }

  /** What bounds the curve from above over KV100 from `from` to `to` [mm²/s]. */
  outline(from: number, to: number): Outline {
    for (const known of this.#outlines) if (known.from === from && known.to === to) return known.outline;
    const outline = outlineOf(this.parts(from, to));
    this.#outlines.unshift({ from, to, outline });
    if (this.#outlines.length > MOST_OUTLINES) this.#outlines.pop();
    return outline;
  }
}

/** Points whose polyline lies nowhere above the parts. */
export function lowerPoints(parts: readonly CurvePart[]): CurvePoint[] {
  return parts.flatMap(({ from, to, convexity }) => {
    const width = to.u - from.u;
    const drop = (convexity * width * width) / 8;
    return [
      { u: from.u, g: from.g - drop },
      { u: to.u, g: to.g - drop },
    ];
  });
}

const MOST_OUTLINES = 12;
const MOST_CURVES = 64;
const curves = new Map<BlendingIndex, Map<number, ViCurve>>();
let latest: ViCurve | undefined;

/** The curve of a viscosity index under a blending index; the last ones used are kept. */
export function viCurve(index: BlendingIndex, vi: number): ViCurve {
  if (latest?.index === index && latest.vi === vi) return latest;
  const known = curves.get(index) ?? new Map<number, ViCurve>();
  curves.set(index, known);
  const found = known.get(vi) ?? new ViCurve(index, vi);
  known.delete(vi);
  known.set(vi, found);
  if (known.size > MOST_CURVES)
    for (const oldest of [...known.keys()].slice(0, known.size - MOST_CURVES)) known.delete(oldest);
  latest = found;
  return found;
}
