import { TABLE_H, TABLE_L, TABLE_Y } from './d2270Table1';

/**
 * Viscosity index by ASTM D2270 (ISO 2909) from KV40 = U and KV100 = Y, both in mm²/s.
 *
 *   U ≥ H: VI = 100 (L - U)/(L - H)
 *   U < H: VI = (10^N - 1)/0.00715 + 100,  N = (log10 H - log10 U)/log10 Y
 *
 * L and H from Table 1 by linear interpolation for 2 ≤ Y ≤ 70, by the standard's formulas above 70. Not defined
 * below Y = 2. Source: ASTM D2270. The table and the formulas meet at 70 with a step of 0.02 % in KV40.
 */

export const LEAST_KV100_FOR_VI = 2;
export const TABLE_END_KV100 = 70;

export interface BasicValues {
  L: number;
  H: number;
}

/** L and H [mm²/s] above KV100 = 70: L = 0.8353 Y² + 14.67 Y - 216, H = 0.1684 Y² + 11.85 Y - 97 (ASTM D2270). */
export function basicValuesAboveTable(kv100: number): BasicValues {
  return {
    L: 0.8353 * kv100 * kv100 + 14.67 * kv100 - 216,
    H: 0.1684 * kv100 * kv100 + 11.85 * kv100 - 97,
  };
}

/** Row of Table 1 whose interval [Y_row, Y_row+1] holds a KV100 between 2 and 70. */
export function tableRow(kv100: number): number {
  let low = 0;
  let high = TABLE_Y.length - 2;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (TABLE_Y[middle] <= kv100) low = middle;
    else high = middle - 1;
  }
  return low;
}

/** L and H [mm²/s] for a KV100 [mm²/s]. Throws RangeError below 2 mm²/s. Source: ASTM D2270. */
export function basicValues(kv100: number): BasicValues {
  if (!(kv100 >= LEAST_KV100_FOR_VI && Number.isFinite(kv100))) {
    throw new RangeError(`The viscosity index is not defined at a KV100 of ${kv100} mm²/s: ASTM D2270 starts at 2.`);
  }
  if (kv100 > TABLE_END_KV100) return basicValuesAboveTable(kv100);
  const row = tableRow(kv100);
  const share = (kv100 - TABLE_Y[row]) / (TABLE_Y[row + 1] - TABLE_Y[row]);
  return {
    L: TABLE_L[row] + share * (TABLE_L[row + 1] - TABLE_L[row]),
    H: TABLE_H[row] + share * (TABLE_H[row + 1] - TABLE_H[row]),
  };
}

/** True where D2270 defines an index: KV100 of at least 2 mm²/s, and KV40 [mm²/s] above KV100. */
export function hasViscosityIndex(kv40: number, kv100: number): boolean {
  return kv100 >= LEAST_KV100_FOR_VI && kv40 > kv100 && Number.isFinite(kv40);
}

/**
 * Viscosity index [-], unrounded (the standard reports whole numbers).
 * Throws RangeError where KV100 is below 2 mm²/s, or KV40 is not above KV100.
 */
export function viscosityIndex(kv40: number, kv100: number): number {
  const { L, H } = basicValues(kv100);
  if (!(kv40 > kv100 && Number.isFinite(kv40))) {
    throw new RangeError(`KV40 (${kv40} mm²/s) must be above KV100 (${kv100} mm²/s).`);
  }
  if (kv40 >= H) return (100 * (L - kv40)) / (L - H);
  return (10 ** (Math.log10(H / kv40) / Math.log10(kv100)) - 1) / 0.00715 + 100;
}

/** Exponent k of KV40 = H / Y^k at a viscosity index above 100: k = log10(1 + 0.00715 (VI - 100)) [-]. */
export function highIndexExponent(vi: number): number {
  return Math.log10(1 + 0.00715 * (vi - 100));
}

/**
 * KV40 [mm²/s] of an oil of that viscosity index and KV100 [mm²/s]: the inverse of `viscosityIndex`, which falls
 * strictly as KV40 rises. Throws RangeError where no KV40 above KV100 has that index.
 */
export function kv40ForViscosityIndex(vi: number, kv100: number): number {
  const { L, H } = basicValues(kv100);
  const kv40 = vi <= 100 ? L - (vi * (L - H)) / 100 : H / kv100 ** highIndexExponent(vi);
  if (!(kv40 > kv100 && Number.isFinite(kv40))) {
    throw new RangeError(`No oil of KV100 ${kv100} mm²/s has a viscosity index of ${vi}.`);
  }
  return kv40;
}

/** A viscosity index as the standard reports it: a whole number, round half to even (ASTM D2270, E29). */
export function reportedViscosityIndex(vi: number): number {
  const floor = Math.floor(vi);
  const rest = vi - floor;
  if (rest !== 0.5) return Math.round(vi);
  return floor % 2 === 0 ? floor : floor + 1;
}
