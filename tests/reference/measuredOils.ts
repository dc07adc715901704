/**
 * Dynamic viscosities [mPa·s] of mineral oils at 30, 60 and 100 °C and atmospheric pressure.
 * Source: Stachowiak and Batchelor, Engineering Tribology, table 2.3, mineral oils. Left out: the first row of the
 * table (38, 12.1, 5.3), whose three figures lie 12 % off any line, and twice as far as the next.
 */
export const MINERAL_OILS = [
  { name: 'heavy machine oil 153', at30: 153, at60: 34, at100: 9.1 },
  { name: 'heavy machine oil 250', at30: 250, at60: 50.5, at100: 12.6 },
  { name: 'cylinder oil 810', at30: 810, at60: 135, at100: 26.8 },
  { name: 'spindle oil 18.6', at30: 18.6, at60: 6.3, at100: 2.4 },
  { name: 'light machine oil 45', at30: 45, at60: 12, at100: 3.9 },
  { name: 'white oil 107', at30: 107, at60: 23.3, at100: 6.4 },
  { name: 'heavy machine oil 122', at30: 122, at60: 26.3, at100: 7.3 },
  { name: 'heavy machine oil 171', at30: 171, at60: 31, at100: 7.5 },
  { name: 'spindle oil 30.7', at30: 30.7, at60: 8.6, at100: 3.1 },
  { name: 'heavy machine oil 165', at30: 165, at60: 30, at100: 6.8 },
  { name: 'heavy machine oil 310', at30: 310, at60: 44.2, at100: 9.4 },
  { name: 'cylinder oil 2000', at30: 2000, at60: 180, at100: 24 },
] as const;

/** Density [g/cm³] of a mineral oil: the table has none, so 0.88 at 15 °C and 0.00065 less a degree (common practice). */
function density(celsius: number): number {
  return 0.88 - 0.00065 * (celsius - 15);
}

export function dynamicToKinematic(dynamic: number, celsius: number): number {
  return dynamic / density(celsius);
}

export function kinematicToDynamic(kinematic: number, celsius: number): number {
  return kinematic * density(celsius);
}

/** Typical kinematic viscosities [mm²/s] of PAO at 40, 100 and -40 °C. Handbook figures, from memory. */
export const PAO_AT_MINUS_40 = [
  { name: 'PAO 4', kv40: 16.8, kv100: 3.9, kvAtMinus40: 2460 },
  { name: 'PAO 6', kv40: 30.9, kv100: 5.88, kvAtMinus40: 7830 },
  { name: 'PAO 8', kv40: 46.3, kv100: 7.74, kvAtMinus40: 18_160 },
] as const;
