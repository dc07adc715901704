import type { Order } from '../order';
import type { OrderProblem } from '../outcome';
import type { SearchModel } from './searchModel';

/** Quantities are counted in whole grams. */
const GRAMS = 1e6;
/** Sums of drums are looked for up to so many steps of their common measure. */
const MOST_STEPS = 200_000;

function commonMeasure(values: readonly number[]): number {
  return values.reduce((a, b) => {
    let [x, y] = [a, b];
    while (y > 0) [x, y] = [y, x % y];
    return x;
  }, 0);
}

/** Sums of whole drums nearest to a quantity from below and above, in grams; none where they are too many to look at. */
function nearestSums(drums: readonly number[], wanted: number): number[] {
  const measure = commonMeasure(drums);
  const steps = Math.ceil(wanted / measure) + Math.max(...drums) / measure;
  if (!(steps <= MOST_STEPS)) return [];
  const reached = new Uint8Array(steps + 1);
  reached[0] = 1;
  for (let step = 1; step <= steps; step++) {
    for (const drum of drums) if (drum / measure <= step && reached[step - drum / measure]) reached[step] = 1;
  }
  const at = wanted / measure;
  const below = reached.lastIndexOf(1, Math.floor(at + 1e-9));
  const above = reached.indexOf(1, Math.ceil(at - 1e-9));
  return [...new Set([below, above])].filter((step) => step > 0).map((step) => step * measure);
}

/**
 * A batch that no whole drums add up to, where everything in it comes in drums or at an exact dose: which sizes would
 * do. Nothing where some stock can make up the difference.
 */
export function drumsThatDoNotAddUp(
  order: Order,
  { stocks, lower, upper, presences, wholeLots }: SearchModel,
): OrderProblem[] {
  const { batchTonnes } = order;
  if (typeof batchTonnes !== 'number' || wholeLots.length === 0) return [];
  const inDrums = new Set(wholeLots.map(({ stock }) => stock));
  const leastIfUsed = new Map(presences.map(({ stock, least }) => [stock, least]));
  const isUsable = (place: number) => upper[place] > 0 && (leastIfUsed.get(place) ?? 0) <= upper[place];
  const others = stocks.flatMap((_, place) => (inDrums.has(place) || !isUsable(place) ? [] : [place]));
  if (others.some((place) => lower[place] < upper[place])) return [];
  const rest = 1 - others.reduce((sum, place) => sum + lower[place], 0);
  const drums = wholeLots.map(({ share }) => Math.round(share * batchTonnes * GRAMS));
  const wanted = Math.round(rest * batchTonnes * GRAMS);
  if (!(rest > 0) || drums.some((drum) => drum <= 0)) return [];
  const sums = nearestSums(drums, wanted);
  // Each drum was rounded to a gram: so many roundings may lie between the sum and the batch.
  const rounding = 1 + wanted / Math.min(...drums) / 2;
  if (sums.length === 0 || sums.some((sum) => Math.abs(sum - wanted) <= rounding)) return [];
  const sizes = sums.map((sum) => `${Number((sum / GRAMS / rest).toPrecision(7))} t`).join(' or ');
  const message = `A batch of ${batchTonnes} t cannot be charged in whole drums. Make it ${sizes}, or let a stock be charged by weight.`;
  return [{ path: ['batchTonnes'], message }];
}
