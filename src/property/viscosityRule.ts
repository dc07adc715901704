/**
 * How viscosities blend. `wright` and `walther` are the two methods of ASTM D7152; the others are plant habits.
 * See blendingIndex.ts for formulas and sources.
 */
export const VISCOSITY_RULES = ['wright', 'walther', 'refutas', 'logarithmic', 'cube root'] as const;

export type ViscosityRule = (typeof VISCOSITY_RULES)[number];
