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
