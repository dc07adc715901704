import { hasViscosityIndex, LEAST_KV100_FOR_VI, viscosityIndex } from '../../property/viscosityIndex';
import type { ViLimits } from '../rows/searchModel';

/** Viscosities of a mix, and by how many points it misses the limits on the viscosity index (0: it keeps them). */
export interface MixViscosity {
  kv40: number;
  kv100: number;
  missed: number;
}

/** The exact check of the nonlinear limit, for shares in the first columns of `values`. */
export function mixViscosity(vi: ViLimits, values: ArrayLike<number>): MixViscosity {
  let weight = 0;
  let sum40 = 0;
  let sum100 = 0;
  for (let i = 0; i < vi.weights.length; i++) {
    const w = vi.weights[i] * values[i];
    weight += w;
    sum40 += w * vi.index40[i];
    sum100 += w * vi.index100[i];
  }
  const kv40 = vi.index.fromIndex(sum40 / weight);
  const kv100 = vi.index.fromIndex(sum100 / weight);
  // A mix held at the lower end of the standard may lie a rounding below it.
  const defined = Math.max(kv100, kv100 > LEAST_KV100_FOR_VI * (1 - 1e-12) ? LEAST_KV100_FOR_VI : 0);
  if (!hasViscosityIndex(kv40, defined)) return { kv40, kv100, missed: Infinity };
  const found = viscosityIndex(kv40, defined);
  const missed = Math.max(0, (vi.min?.value ?? -Infinity) - found, found - (vi.max?.value ?? Infinity));
  return { kv40, kv100, missed };
}
