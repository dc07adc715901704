import type { IndexId } from './blendingIndex';

/**
 * How viscosities blend. `wright` and `walther` are the two methods of ASTM D7152; the others are plant habits.
 * See blendingIndex.ts for formulas and sources.
 */
export const VISCOSITY_RULES = ['wright', 'walther', 'refutas', 'logarithmic', 'cube root'] as const;

export type ViscosityRule = (typeof VISCOSITY_RULES)[number];

export interface ViscosityRuleDefinition {
  label: string;
  /** Name in a sentence. */
  short: string;
  index: IndexId;
  /** What the index is averaged by; 'wright' adds the slope of each stock's viscosity-temperature line. */
  basis: 'mass' | 'volume' | 'wright';
  help: string;
}

export const VISCOSITY_RULE_TABLE: Readonly<Record<ViscosityRule, ViscosityRuleDefinition>> = {
  wright: {
    label: 'Wright (ASTM D7152)',
    short: 'Wright',
    index: 'walther',
    basis: 'wright',
    help: 'Blends temperatures at equal viscosity, from two viscosities a stock. The method ASTM D7152 prefers.',
  },
  walther: {
    label: 'Walther, one temperature (ASTM D7152)',
    short: 'Walther',
    index: 'walther',
    basis: 'volume',
    help: 'Averages log log of viscosity by volume at one temperature: the second method of ASTM D7152.',
  },
  refutas: {
    label: 'Refutas',
    short: 'Refutas',
    index: 'refutas',
    basis: 'mass',
    help: 'Averages VBN = 14.534 ln ln(ν + 0.8) + 10.975 by mass at one temperature.',
  },
  logarithmic: {
    label: 'Logarithmic (Arrhenius)',
    short: 'logarithmic',
    index: 'logarithmic',
    basis: 'mass',
    help: 'Averages ln ν by mass at one temperature.',
  },
  'cube root': {
    label: 'Cube root',
    short: 'cube-root',
    index: 'cube root',
    basis: 'mass',
    help: 'Averages the cube root of viscosity by mass: a plant habit, far too thick for unlike stocks.',
  },
};
