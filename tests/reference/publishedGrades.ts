/**
 * Grade tables typed a second time, from printed copies of the standards by oil suppliers and calculators, so that a
 * slip in the engine's tables cannot stand on both sides of a comparison.
 */

/** ISO 3448: grade, least and greatest KV40 [mm²/s]. Printed copies up to 1500; 2200 and 3200 by the ±10 % rule. */
export const ISO_VG_LIMITS: readonly (readonly [number, number, number])[] = [
  [2, 1.98, 2.42],
  [3, 2.88, 3.52],
  [5, 4.14, 5.06],
  [7, 6.12, 7.48],
  [10, 9.0, 11.0],
  [15, 13.5, 16.5],
  [22, 19.8, 24.2],
  [32, 28.8, 35.2],
  [46, 41.4, 50.6],
  [68, 61.2, 74.8],
  [100, 90.0, 110],
  [150, 135, 165],
  [220, 198, 242],
  [320, 288, 352],
  [460, 414, 506],
  [680, 612, 748],
  [1000, 900, 1100],
  [1500, 1350, 1650],
  [2200, 1980, 2420],
  [3200, 2880, 3520],
];

/** SAE J300: W grade, greatest CCS [mPa·s] at [°C], least KV100 [mm²/s]. */
export const J300_W_GRADES: readonly (readonly [string, number, number, number])[] = [
  ['0W', 6200, -35, 3.8],
  ['5W', 6600, -30, 3.8],
  ['10W', 7000, -25, 4.1],
  ['15W', 7000, -20, 5.6],
  ['20W', 9500, -15, 5.6],
  ['25W', 13000, -10, 9.3],
];

/** SAE J300: grade, KV100 from and below [mm²/s], least HTHS [mPa·s]. */
export const J300_WINDOWS: readonly (readonly [string, number, number, number])[] = [
  ['8', 4.0, 6.1, 1.7],
  ['12', 5.0, 7.1, 2.0],
  ['16', 6.1, 8.2, 2.3],
  ['20', 6.9, 9.3, 2.6],
  ['30', 9.3, 12.5, 2.9],
  ['40 (0W, 5W, 10W)', 12.5, 16.3, 3.5],
  ['40', 12.5, 16.3, 3.7],
  ['50', 16.3, 21.9, 3.7],
  ['60', 21.9, 26.1, 3.7],
];

/** SAE J306, February 2019: grade, KV100 from and below [mm²/s]. */
export const J306_WINDOWS: readonly (readonly [string, number, number?])[] = [
  ['65', 3.8, 5.0],
  ['70', 5.0, 6.5],
  ['75', 6.5, 8.5],
  ['80', 8.5, 11.0],
  ['85', 11.0, 13.5],
  ['90', 13.5, 18.5],
  ['110', 18.5, 24.0],
  ['140', 24.0, 32.5],
  ['190', 32.5, 41.0],
  ['250', 41.0],
];

/** SAE J306, February 2019: W grade, temperature [°C] for 150 000 mPa·s, least KV100 [mm²/s]. */
export const J306_W_GRADES: readonly (readonly [string, number, number])[] = [
  ['70W', -55, 3.8],
  ['75W', -40, 3.8],
  ['80W', -26, 8.5],
  ['85W', -12, 11.0],
];
