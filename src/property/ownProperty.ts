import type { PropertyDefinition } from './propertyDefinition';

/** Blending rules a user may pick for a property of their own (common practice, no source). */
export const OWN_RULES = [
  'linear by mass',
  'linear by volume',
  'logarithmic by mass',
  'logarithmic by volume',
] as const;

export type OwnRule = (typeof OWN_RULES)[number];

/** A property that the user adds, for example "biobased carbon" [% m/m], linear by mass. */
export interface OwnProperty {
  /** Unique id, not one of the built-in table. */
  id: string;
  label: string;
  unit: string;
  rule: OwnRule;
  /** Decimals shown; the reporting unit is 10^-digits. */
  digits: number;
}

/** The table entry that an own property stands for. */
export function ownPropertyDefinition(own: OwnProperty): PropertyDefinition {
  const logarithmic = own.rule.startsWith('logarithmic');
  return {
    id: own.id,
    label: own.label,
    short: own.label,
    unit: own.unit,
    method: 'own property',
    index: logarithmic ? 'logarithmic' : 'linear',
    basis: own.rule.endsWith('volume') ? 'volume' : 'mass',
    digits: own.digits,
    reportingUnit: 10 ** -own.digits,
    sense: logarithmic ? { min: 1e-9, max: 1e9 } : { min: -1e9, max: 1e9 },
    direction: 'range',
    blending: `Averages ${own.rule}, as its owner chose.`,
    source: 'The user.',
  };
}
