import { tau, waltherOf } from './walther';

/**
 * Blending indices as published, written for the checks. `basis`: what the index is averaged by.
 * Sources: Hu and Burns (1970), Wickey and Chittenden (1963) and the aniline index as given by Riazi, ASTM MNL50
 * (2005); Refutas' VBN; linear and logarithmic rules are common practice, no source.
 */
export interface IndexRule {
  basis: 'mass' | 'volume';
  toIndex(value: number): number;
  fromIndex(index: number): number;
  /** +1 where the index rises with the value, -1 where it falls. */
  sense: 1 | -1;
  /** One reporting unit of the property. */
  unit: number;
}

function linear(basis: 'mass' | 'volume', unit: number): IndexRule {
  return { basis, toIndex: (value) => value, fromIndex: (value) => value, sense: 1, unit };
}

function logarithmic(basis: 'mass' | 'volume', unit: number): IndexRule {
  return { basis, toIndex: Math.log, fromIndex: Math.exp, sense: 1, unit };
}

/** Hu and Burns: I = 3 262 000 (T/1000)^12.5, T in °R. */
const pourPoint: IndexRule = {
  basis: 'volume',
  toIndex: (celsius) => 3262000 * (((celsius + 273.15) * 1.8) / 1000) ** 12.5,
  fromIndex: (index) => ((index / 3262000) ** (1 / 12.5) * 1000) / 1.8 - 273.15,
  sense: 1,
  unit: 1,
};

/** Wickey and Chittenden: log10 I = -6.1188 + 2414/(T - 42.6), T in K. */
const flashPoint: IndexRule = {
  basis: 'volume',
  toIndex: (celsius) => 10 ** (-6.1188 + 2414 / (celsius + 273.15 - 42.6)),
  fromIndex: (index) => 2414 / (Math.log10(index) + 6.1188) + 42.6 - 273.15,
  sense: -1,
  unit: 1,
};

const anilinePoint: IndexRule = {
  basis: 'volume',
  toIndex: (celsius) => 1.124 * Math.exp(0.00657 * celsius),
  fromIndex: (index) => Math.log(index / 1.124) / 0.00657,
  sense: 1,
  unit: 0.1,
};

export const INDEX_RULES: Readonly<Record<string, IndexRule>> = {
  density: linear('volume', 0.1),
  noack: linear('mass', 0.1),
  sulphur: linear('mass', 1),
  saturates: linear('mass', 0.1),
  zinc: linear('mass', 1),
  sulphatedAsh: linear('mass', 0.01),
  pourPoint,
  flashPoint,
  anilinePoint,
  ccs: logarithmic('mass', 10),
  hths: logarithmic('mass', 0.01),
};

/** How one stock enters an average of viscosity indices. */
export interface ViscosityTerm {
  weight: number;
  index40: number;
  index100: number;
}

export interface ViscosityInput {
  kv40: number;
  kv100: number;
  /** kg/m³ at 15 °C. */
  density: number;
  blendWeight: number;
}

export const VISCOSITY_INDEX: Readonly<Record<string, (kv: number) => number>> = {
  wright: waltherOf,
  walther: waltherOf,
  refutas: (kv) => 14.534 * Math.log(Math.log(kv + 0.8)) + 10.975,
  logarithmic: Math.log,
  'cube root': Math.cbrt,
};

/**
 * ASTM D7152, Wright: stock i has viscosity ν at τ_i = τ100 + s_i (W(ν) - W_i100), and the mix at Σ v_i τ_i. Solved for
 * W at a fixed τ that is the average of W_i(τ) weighted by v_i |s_i|. The other rules average by volume (Walther) or
 * mass at one temperature.
 */
export function viscosityTerm(rule: string, stock: ViscosityInput): ViscosityTerm {
  const index = VISCOSITY_INDEX[rule];
  const index40 = index(stock.kv40);
  const index100 = index(stock.kv100);
  const volume = 1000 / stock.density;
  if (rule === 'wright') {
    const s = (tau(100) - tau(40)) / (index100 - index40);
    return { weight: stock.blendWeight * volume * Math.abs(s), index40, index100 };
  }
  const weight = rule === 'walther' ? stock.blendWeight * volume : stock.blendWeight;
  return { weight, index40, index100 };
}

/** Index of a stock (or mix) at another temperature, on the straight D341 line through 40 and 100 °C. */
export function indexOnLine(index40: number, index100: number, celsius: number): number {
  return index100 + ((index40 - index100) * (tau(celsius) - tau(100))) / (tau(40) - tau(100));
}
