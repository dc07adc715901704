import type { IndexId } from './blendingIndex';

/** Reproducibility R of a test method (two laboratories, 95 %): of the value, or in the unit. Editable defaults. */
export type Reproducibility = { relative: number } | { absolute: number };

/** One entry of the property table. Limits, columns, charts and help derive from it. */
export interface PropertyDefinition {
  id: string;
  /** Name in the trade's words. */
  label: string;
  /** Short form for narrow columns. */
  short: string;
  unit: string;
  /** Test method. */
  method: string;
  /** Temperatures [°C] the property is usually stated at; absent: it has none. */
  temperatures?: readonly number[];
  /** True where any other temperature makes sense too. */
  anyTemperature?: boolean;
  /** Index that blends linearly, or 'viscosity': the order's viscosity rule. */
  index: IndexId | 'viscosity';
  basis: 'mass' | 'volume';
  /** Decimals shown. */
  digits: number;
  /** Smallest step a laboratory reports, in the unit. */
  reportingUnit: number;
  /** Values outside cannot be right: refused at the door. */
  sense: { min: number; max: number };
  reproducibility?: Reproducibility;
  /** Where the method's reproducibility differs at a temperature [°C]. */
  reproducibilityAt?: Readonly<Record<number, Reproducibility>>;
  /** Which way is better, for pictures and wording only. */
  direction: 'lower' | 'higher' | 'range';
  /** How it blends and where that comes from, in a sentence or two for the help. */
  blending: string;
  source: string;
}

/** R of a property's method at a value, in the property's unit; undefined where none is known. */
export function reproducibilityOf(
  { reproducibility, reproducibilityAt }: PropertyDefinition,
  value: number,
  celsius?: number,
): number | undefined {
  const stated = (celsius === undefined ? undefined : reproducibilityAt?.[celsius]) ?? reproducibility;
  if (!stated) return undefined;
  return 'absolute' in stated ? stated.absolute : stated.relative * Math.abs(value);
}
