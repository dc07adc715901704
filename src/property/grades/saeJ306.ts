import type { Grade } from './grade';

/**
 * SAE J306 (2019), automotive gear lubricant viscosity classification. Later editions add grades that are not in this
 * table: check the current edition.
 * Source: SAE J306, table 1; read against a supplier's printed copy of the February 2019 edition.
 */

/** W grades: name, greatest temperature [°C] for 150 000 mPa·s, least KV100 [mm²/s]. */
export const J306_WINTER_TABLE: readonly (readonly [name: string, celsius: number, kv100: number])[] = [
  ['70W', -55, 3.8],
  ['75W', -40, 3.8],
  ['80W', -26, 8.5],
  ['85W', -12, 11],
];

/** Other grades: name, least KV100, and the KV100 it stays below [mm²/s] (none for 250). */
export const J306_SUMMER_TABLE: readonly (readonly [name: string, min: number, below: number | undefined])[] = [
  ['65', 3.8, 5],
  ['70', 5, 6.5],
  ['75', 6.5, 8.5],
  ['80', 8.5, 11],
  ['85', 11, 13.5],
  ['90', 13.5, 18.5],
  ['110', 18.5, 24],
  ['140', 24, 32.5],
  ['190', 32.5, 41],
  ['250', 41, undefined],
];

const NOTE = 'SAE J306 (2019); check the current edition.';
const SHEAR_TEST = 'Least KV100 met after the 20 h shear test too (CEC L-45)';

const WINTER: readonly Grade[] = J306_WINTER_TABLE.map(([name, celsius, min]) => ({
  id: `SAE J306 ${name}`,
  system: 'SAE J306',
  name,
  limits: [{ property: 'kv', celsius: 100, min }],
  laboratoryOnly: [`Brookfield viscosity at ${celsius} °C: at most 150 000 mPa·s (ASTM D2983)`, SHEAR_TEST],
  note: NOTE,
}));

const SUMMER: readonly Grade[] = J306_SUMMER_TABLE.map(([name, min, below]) => ({
  id: `SAE J306 ${name}`,
  system: 'SAE J306',
  name,
  limits: [{ property: 'kv', celsius: 100, min, ...(below === undefined ? {} : { below }) }],
  laboratoryOnly: [SHEAR_TEST],
  note: NOTE,
}));

/** The grades of SAE J306. */
export const J306_GRADES: readonly Grade[] = [...WINTER, ...SUMMER];
