import type { CurvePart, CurvePoint } from './viCurve';

/**
 * Points whose polyline lies nowhere below the parts: a line above all of them is above the curve. A part gives its
 * ends and the crossing of its end tangents.
 */
function upperPoints(parts: readonly CurvePart[]): CurvePoint[] {
  const points: CurvePoint[] = [];
  for (const { from: a, to: b, convexity } of parts) {
    const width = b.u - a.u;
    const lift = (convexity * width * width) / 2;
    points.push({ u: a.u, g: a.g + lift });
    const turn = a.slope - b.slope;
    if (turn > 0 && width > 0) {
      const u = Math.min(b.u, Math.max(a.u, a.u + (b.g - a.g - b.slope * width) / turn));
      points.push({ u, g: Math.max(a.g + a.slope * (u - a.u), b.g + b.slope * (u - b.u)) + lift });
    } else if (width > 0) {
      points.push({ u: b.u, g: a.g + a.slope * width + lift });
    }
    points.push({ u: b.u, g: b.g + lift });
  }
  return points;
}

/** The upper hull of points that lie in order of u: a line above it is above all of them. */
function upperHull(points: readonly CurvePoint[]): CurvePoint[] {
  const hull: CurvePoint[] = [];
  for (const point of points) {
    while (hull.length > 0 && hull[hull.length - 1].u === point.u && hull[hull.length - 1].g <= point.g) hull.pop();
    while (hull.length > 1) {
      const a = hull[hull.length - 2];
      const b = hull[hull.length - 1];
      if ((b.g - a.g) * (point.u - a.u) > (point.g - a.g) * (b.u - a.u)) break;
      hull.pop();
    }
    const last = hull[hull.length - 1];
    if (!last || last.u < point.u) hull.push(point);
  }
  return hull;
}

/** The upper hull of a stretch of the curve, and the least and greatest slope the curve has there. */
export interface Outline {
  hull: readonly CurvePoint[];
  leastSlope: number;
  greatestSlope: number;
}

export function outlineOf(parts: readonly CurvePart[]): Outline {
  let leastSlope = Infinity;
  let greatestSlope = -Infinity;
  for (const { from, to } of parts) {
    leastSlope = Math.min(leastSlope, from.slope, to.slope);
    greatestSlope = Math.max(greatestSlope, from.slope, to.slope);
  }
  return { hull: upperHull(upperPoints(parts)), leastSlope, greatestSlope };
}
