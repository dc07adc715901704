import type { Draw } from './mulberry32';
import { breakpoints, kv40OfVi } from './viscosityIndex';

interface Line {
  slope: number;
  offset: number;
}

interface Plane {
  vi: number;
  side: 'min' | 'max';
  index: (kv: number) => number;
}

/** Points of the curve G over a window, 16 a piece of D2270, both values at 70. */
function curve({ vi, index }: Plane, low: number, high: number): { u: number; g: number }[] {
  const cuts = breakpoints(low, high);
  const points: { u: number; g: number }[] = [];
  for (let k = 1; k < cuts.length; k++) {
    for (let i = 0; i <= 16; i++) {
      const y = i === 16 ? cuts[k] : cuts[k - 1] + ((cuts[k] - cuts[k - 1]) * i) / 16;
      points.push({ u: index(y), g: index(kv40OfVi(vi, y, cuts[k - 1] >= 70)) });
    }
  }
  return points;
}

/** Line through the curve at y that bounds it over the window, or undefined where there is none. */
export function boundingLine(plane: Plane, y: number, low: number, high: number, draw: Draw): Line | undefined {
  const { vi, index, side } = plane;
  const u0 = index(y);
  const g0 = index(kv40OfVi(vi, y));
  const points = curve(plane, low, high);
  const sign = side === 'min' ? 1 : -1;
  let slope: number;
  if (y === low || y === high) {
    const far = points.filter(({ u }) => Math.abs(u - u0) > 1e-9).map(({ u, g }) => (g - g0) / (u - u0));
    const steep = (y === low) === (side === 'min');
    slope = (steep ? Math.max(...far) : Math.min(...far)) + (steep ? 1 : -1) * draw.between(0.002, 0.05);
  } else {
    const h = 1e-5 * y;
    const rise = index(kv40OfVi(vi, y + h)) - index(kv40OfVi(vi, y - h));
    slope = rise / (index(y + h) - index(y - h));
  }
  const offset = g0 - slope * u0;
  // A millionth of a millionth of W is far below what a cost of 5e-6 can feel.
  const out = Math.max(...points.map(({ u, g }) => sign * (g - offset - slope * u)));
  return out <= 1e-11 ? { slope, offset } : undefined;
}
