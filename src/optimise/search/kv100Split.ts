import { knot, pieceOf } from './viPieces';

/** Half width of the part that is cut out around a solution [-], relative to KV100. */
const CORE = 2.5e-4;

/**
 * Where to split an interval of KV100 [mm²/s] at a solution: a narrow core around the solution, in which the outer
 * line is as good as the curve, and the rest on either side; a knot of D2270 inside the core is a split of its own,
 * for the curve bends there. A solution at an end (the lines are tight there) splits the interval in the middle.
 */
export function splitPoints(from: number, to: number, kv100: number): number[] {
  const inside = kv100 > from && kv100 < to ? kv100 : Math.sqrt(from * to);
  const half = CORE * inside;
  if (to - from <= 8 * half) return [withKnot(from, to, inside)];
  const low = inside - half;
  const high = inside + half;
  const points = [low, high].filter((point) => point > from + half && point < to - half);
  const bend = knot(pieceOf(inside) + 1);
  for (const corner of [knot(pieceOf(inside)), bend]) {
    if (corner > from && corner < to && Math.abs(corner - inside) <= half) points.push(corner);
  }
  if (points.length === 0) return [withKnot(from, to, inside)];
  return points.sort((a, b) => a - b);
}

/** A knot inside the interval if there is one near the middle of it, else the point given, kept off the ends. */
function withKnot(from: number, to: number, point: number): number {
  const corner = knot(pieceOf(from) + 1);
  if (corner > from && corner < to) return corner;
  const margin = 0.1 * (to - from);
  return Math.min(to - margin, Math.max(from + margin, point));
}
