import type { Limit } from '../../src/index';
import type { Draw } from './mulberry32';
import type { Width } from './randomOrder';
import { breakpoints } from './viscosityIndex';

export type Place = 'inside' | 'low end' | 'high end';

/** Also 'piece': a window within one piece of Table 1, where the curve is concave and any x* can be planted inside. */
export type PlantedWidth = Width | 'piece';

/** A window of KV100 [mm²/s], and where x* sits in it. */
export interface Window {
  low: number;
  high: number;
  place: Place;
}

/** A window with x*'s KV100 = y where it is asked for; `reach` are the thinnest and the thickest stock. */
export function windowAround(draw: Draw, y: number, width: PlantedWidth, place: Place, reach: number[]): Window {
  if (width === 'piece') {
    const cuts = breakpoints(2, 200);
    const above = cuts.findIndex((cut) => cut > y);
    const inside = (end: number) => y + (end - y) * draw.between(0.2, 0.95);
    return { low: inside(cuts[above - 1]), high: inside(cuts[above]), place: 'inside' };
  }
  const part = place === 'low end' ? 0 : place === 'high end' ? 1 : draw.between(0.2, 0.8);
  const low = width === 'none' ? reach[0] : y * (1 - 2 * width * part);
  const high = width === 'none' ? reach[1] : y * (1 + 2 * width * (1 - part));
  return { low: Math.max(2, place === 'low end' ? y : low), high: place === 'high end' ? y : high, place };
}

/** The limit on KV100 that makes the window; an end that only the stocks set is left open. */
export function windowLimit({ low, high, place }: Window, width: PlantedWidth): Limit | undefined {
  const open = width === 'none';
  if (open && place === 'inside') return undefined;
  return {
    property: 'kv',
    celsius: 100,
    ...(open && place === 'high end' ? {} : { min: low }),
    ...(open && place === 'low end' ? {} : { max: high }),
  };
}
