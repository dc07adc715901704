import type { Grade } from './grade';

/**
 * SAE J300 (2021), engine oil viscosity classification. A 2024 edition exists: check the current edition.
 * Source: SAE J300, table 1; read against printed copies of it by oil suppliers (2013, 2015 and later editions).
 */

/** W grades: name, greatest CCS [mPa·s] at [°C], least KV100 [mm²/s], temperature of the pumping limit [°C]. */
export const J300_WINTER_TABLE: readonly (readonly [
  name: string,
  ccs: number,
  celsius: number,
  kv100: number,
  pumping: number,
])[] = [
  ['0W', 6200, -35, 3.8, -40],
  ['5W', 6600, -30, 3.8, -35],
  ['10W', 7000, -25, 4.1, -30],
  ['15W', 7000, -20, 5.6, -25],
  ['20W', 9500, -15, 5.6, -20],
  ['25W', 13_000, -10, 9.3, -15],
];

/**
 * Other grades: name, least KV100 and the KV100 it stays below [mm²/s], least HTHS [mPa·s] at 150 °C. SAE 40 has
 * two rows: what counts is the W grade beside it.
 */
export const J300_SUMMER_TABLE: readonly (readonly [name: string, min: number, below: number, hths: number])[] = [
  ['8', 4, 6.1, 1.7],
  ['12', 5, 7.1, 2],
  ['16', 6.1, 8.2, 2.3],
  ['20', 6.9, 9.3, 2.6],
  ['30', 9.3, 12.5, 2.9],
  ['40 (0W, 5W, 10W)', 12.5, 16.3, 3.5],
  ['40', 12.5, 16.3, 3.7],
  ['50', 16.3, 21.9, 3.7],
  ['60', 21.9, 26.1, 3.7],
];

const EDITION = 'SAE J300 (2021); check the current edition.';

const WINTER: readonly Grade[] = J300_WINTER_TABLE.map(([name, ccs, celsius, kv100, pumping]) => ({
  id: `SAE ${name}`,
  system: 'SAE J300',
  name,
  limits: [
    { property: 'ccs', celsius, max: ccs },
    { property: 'kv', celsius: 100, min: kv100 },
  ],
  laboratoryOnly: [`Pumping viscosity at ${pumping} °C: at most 60 000 mPa·s with no yield stress (ASTM D4684)`],
  note: `${EDITION} Stocks without a cold-cranking figure are left out while that limit stands.`,
}));

const SUMMER: readonly Grade[] = J300_SUMMER_TABLE.map(([name, min, below, hths]) => ({
  id: `SAE ${name}`,
  system: 'SAE J300',
  name,
  limits: [
    { property: 'kv', celsius: 100, min, below },
    { property: 'hths', min: hths },
  ],
  laboratoryOnly: [],
  note: `${EDITION}${name === '40' ? ' With 0W, 5W or 10W the other row of SAE 40 asks for less.' : ''} Stocks without a high-shear figure are left out while that limit stands.`,
}));

/** The grades of SAE J300. */
export const J300_GRADES: readonly Grade[] = [...WINTER, ...SUMMER];
