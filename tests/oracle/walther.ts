/**
 * ASTM D341 (Walther/MacCoull), written for the checks from the published formula:
 * Z = ν + 0.7 + exp(-1.47 - 1.84 ν - 0.51 ν²), W = log10 log10 Z, W linear in log10 T [K].
 */
export function waltherOf(kv: number): number {
  const z = kv + 0.7 + Math.exp(-1.47 - 1.84 * kv - 0.51 * kv * kv);
  return Math.log10(Math.log10(z));
}

/** Viscosity [mm²/s] at a Walther index, by plain bisection: slow and hard to get wrong. */
export function kvOfWalther(w: number): number {
  return invert(waltherOf, w);
}

/** log10 of the absolute temperature. */
export function tau(celsius: number): number {
  return Math.log10(celsius + 273.15);
}

/** The viscosity [mm²/s] at which a rising index function takes a value. */
export function invert(index: (kv: number) => number, value: number): number {
  let low = 0.2;
  let high = 1e7;
  for (let step = 0; step < 120 && high - low > 1e-16 * high; step++) {
    const middle = Math.sqrt(low * high);
    if (middle <= low || middle >= high) break;
    if (index(middle) < value) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
