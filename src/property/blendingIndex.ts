import {
  GREATEST_KV,
  kvFromWalther,
  LEAST_KV,
  waltherCurvature,
  waltherIndex,
  waltherSlope,
} from './kinematicViscosity';

/**
 * A blending index: a strictly monotone function of a property that is averaged, by mass or by volume, where the
 * property itself does not average.
 */
export interface BlendingIndex {
  /** The index of a value in the property's unit [-]. */
  toIndex(value: number): number;
  /** The value of an index, in the property's unit. */
  fromIndex(index: number): number;
  /** d index / d value, one over the property's unit. Never zero inside the domain. */
  slope(value: number): number;
  /** -index''/index' in one over the property's unit; needed where a viscosity index is searched. */
  curvature?(value: number): number;
  /** True where the index rises with the value. */
  rising: boolean;
  /** Values the index is defined for, in the property's unit. */
  domain: { min: number; max: number };
}

const EVERYTHING = { min: -Infinity, max: Infinity };
const POSITIVE = { min: Number.MIN_VALUE, max: Infinity };

/** I = x. Linear averaging (common practice, no source). */
const linear: BlendingIndex = {
  toIndex: (value) => value,
  fromIndex: (index) => index,
  slope: () => 1,
  rising: true,
  domain: EVERYTHING,
};

/** I = ln x, x > 0: Arrhenius' rule for viscosities; CCS, HTHS (common practice, no source). */
const logarithmic: BlendingIndex = {
  toIndex: (value) => Math.log(value),
  fromIndex: (index) => Math.exp(index),
  slope: (value) => 1 / value,
  curvature: (value) => 1 / value,
  rising: true,
  domain: POSITIVE,
};

/** W = log10 log10 Z(ν), ν in mm²/s, 0.21 to 2·10⁷: ASTM D341, blended as in ASTM D7152. */
const walther: BlendingIndex = {
  toIndex: waltherIndex,
  fromIndex: kvFromWalther,
  slope: waltherSlope,
  curvature: waltherCurvature,
  rising: true,
  domain: { min: LEAST_KV, max: GREATEST_KV },
};

/** VBN = 14.534 ln ln(ν + 0.8) + 10.975, ν in mm²/s above 0.21, by mass. Source: Refutas. */
const refutas: BlendingIndex = {
  toIndex: (kv) => 14.534 * Math.log(Math.log(kv + 0.8)) + 10.975,
  fromIndex: (vbn) => Math.exp(Math.exp((vbn - 10.975) / 14.534)) - 0.8,
  slope: (kv) => 14.534 / ((kv + 0.8) * Math.log(kv + 0.8)),
  curvature: (kv) => (1 + 1 / Math.log(kv + 0.8)) / (kv + 0.8),
  rising: true,
  domain: { min: 0.2101, max: Infinity },
};

/** I = ν^(1/3), ν in mm²/s, by mass: a plant habit after Kendall and Monroe (1917), who used mole fractions. */
const cubeRoot: BlendingIndex = {
  toIndex: (kv) => Math.cbrt(kv),
  fromIndex: (index) => index ** 3,
  slope: (kv) => Math.cbrt(kv) / (3 * kv),
  curvature: (kv) => 2 / (3 * kv),
  rising: true,
  domain: POSITIVE,
};

const RANKINE = (celsius: number) => 1.8 * (celsius + 273.15);
const POUR = 3_262_000;

/**
 * Pour point t in °C, by volume: I = 3 262 000 (T/1000)^12.5 with T in °R. Weak, for neat stocks only.
 * Source: Hu and Burns (1970); Riazi, ASTM MNL50 (2005).
 */
const huBurns: BlendingIndex = {
  toIndex: (celsius) => POUR * (RANKINE(celsius) / 1000) ** 12.5,
  fromIndex: (index) => (1000 * (index / POUR) ** (1 / 12.5)) / 1.8 - 273.15,
  slope: (celsius) => POUR * 12.5 * (RANKINE(celsius) / 1000) ** 11.5 * 0.0018,
  rising: true,
  domain: { min: -200, max: 200 },
};

/**
 * Flash point t in °C, by volume: log10 I = -6.1188 + 2414/(T - 42.6) with T in K. Built on closed-cup
 * distillates, extrapolated to lubricants: an estimate.
 * Source: Wickey and Chittenden (1963); Riazi, ASTM MNL50 (2005).
 */
const wickeyChittenden: BlendingIndex = {
  toIndex: (celsius) => 10 ** (-6.1188 + 2414 / (celsius + 230.55)),
  fromIndex: (index) => 2414 / (Math.log10(index) + 6.1188) - 230.55,
  slope: (celsius) =>
    (-2414 * Math.LN10 * 10 ** (-6.1188 + 2414 / (celsius + 230.55))) / ((celsius + 230.55) * (celsius + 230.55)),
  rising: false,
  domain: { min: -50, max: 500 },
};

/** Aniline point t in °C, by volume: I = 1.124 exp(0.00657 t). Source: Riazi, ASTM MNL50 (2005) (from memory). */
const anilinePoint: BlendingIndex = {
  toIndex: (celsius) => 1.124 * Math.exp(0.00657 * celsius),
  fromIndex: (index) => Math.log(index / 1.124) / 0.00657,
  slope: (celsius) => 1.124 * 0.00657 * Math.exp(0.00657 * celsius),
  rising: true,
  domain: { min: -50, max: 300 },
};

/** Every blending index by name. */
export const BLENDING_INDICES = {
  linear,
  logarithmic,
  walther,
  refutas,
  'cube root': cubeRoot,
  'hu-burns pour point': huBurns,
  'wickey-chittenden flash point': wickeyChittenden,
  'riazi aniline point': anilinePoint,
} as const satisfies Record<string, BlendingIndex>;

export type IndexId = keyof typeof BLENDING_INDICES;
