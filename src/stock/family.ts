/**
 * The families a stock can belong to. Trade terms (API 1509 Annex E groups I-V and the usual names of
 * synthetics and additives); "other" is a home for anything else.
 */
export const FAMILIES = [
  'Group I',
  'Group II',
  'Group III',
  'PAO',
  'mPAO',
  'ester',
  'alkylated naphthalene',
  'naphthenic',
  'polyisobutene',
  'thickener',
  'package',
  'depressant',
  'other',
] as const;

export type Family = (typeof FAMILIES)[number];

const ADDITIVES: ReadonlySet<Family> = new Set(['thickener', 'package', 'depressant']);

/** Base oil is everything that is not a thickener, a package or a depressant (common practice, no source). */
export function isBaseOil(family: Family): boolean {
  return !ADDITIVES.has(family);
}
