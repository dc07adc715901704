import type { Grade } from './grade';

/**
 * ISO 3448:1992, viscosity classification of industrial liquid lubricants: number of the grade, midpoint, least and
 * greatest KV40, all three in mm²/s; the limits are the midpoint ±10 %. Check the current edition.
 * Source: ISO 3448, table 1; read against printed copies, which agree up to 1500; 2200 and 3200 follow from ±10 %.
 */
export const ISO_3448_TABLE: readonly (readonly [number: number, midpoint: number, min: number, max: number])[] = [
  [2, 2.2, 1.98, 2.42],
  [3, 3.2, 2.88, 3.52],
  [5, 4.6, 4.14, 5.06],
  [7, 6.8, 6.12, 7.48],
  [10, 10, 9, 11],
  [15, 15, 13.5, 16.5],
  [22, 22, 19.8, 24.2],
  [32, 32, 28.8, 35.2],
  [46, 46, 41.4, 50.6],
  [68, 68, 61.2, 74.8],
  [100, 100, 90, 110],
  [150, 150, 135, 165],
  [220, 220, 198, 242],
  [320, 320, 288, 352],
  [460, 460, 414, 506],
  [680, 680, 612, 748],
  [1000, 1000, 900, 1100],
  [1500, 1500, 1350, 1650],
  [2200, 2200, 1980, 2420],
  [3200, 3200, 2880, 3520],
];

/** The viscosity grades of ISO 3448, KV40 [mm²/s] both ends included. */
export const ISO_3448_GRADES: readonly Grade[] = ISO_3448_TABLE.map(([number, , min, max]) => ({
  id: `ISO VG ${number}`,
  system: 'ISO 3448',
  name: `VG ${number}`,
  limits: [{ property: 'kv', celsius: 40, min, max }],
  laboratoryOnly: [],
  note: 'ISO 3448:1992; check the current edition.',
}));
