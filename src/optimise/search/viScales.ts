import { viscosityIndex } from '../../property/viscosityIndex';
import type { ViLimits } from '../rows/searchModel';
import { knot, pieceOf, viKv40 } from './viPieces';

/** Scales at the middle of the reachable KV100: 0.01 mm²/s for the interval rows, one VI point for the lines. */
export function viScales({ index, kv100, weights, min, max }: ViLimits): { sums: number; kv100: number; vi: number } {
  const middle = Math.sqrt(kv100.from * Math.max(kv100.from, kv100.to));
  const used = weights.filter((weight) => weight > 0);
  const meanWeight = used.reduce((sum, weight) => sum + weight, 0) / Math.max(1, used.length) || 1;
  const target = min?.value ?? max?.value ?? 100;
  const kv40 = viKv40(target, pieceOf(Math.max(knot(0), middle)), middle).value;
  const perPoint = Math.abs(viscosityIndex(kv40 * 1.001, middle) - viscosityIndex(kv40, middle)) / (0.001 * kv40);
  const kvScale = 1 / (index.slope(middle) * 0.01 * meanWeight);
  const viScale = perPoint / (index.slope(kv40) * meanWeight);
  return { sums: Math.max(kvScale, viScale), kv100: kvScale, vi: viScale };
}
