/**
 * Where a figure comes from.
 *
 * - `measured`, `typical`, `seller limit`, `assumed`, `estimated`: a value, and how far to trust it.
 * - `in-blend`: worked back from a measured trial mix; the usual way for packages and thickeners.
 * - `as the rest`: the stock takes the value of the rest of the mix (small doses only); carries no value.
 *
 * A figure that is absent is unknown. Unknown is never zero.
 */
export const FIGURE_ORIGINS = [
  'measured',
  'typical',
  'seller limit',
  'in-blend',
  'assumed',
  'estimated',
  'as the rest',
] as const;

export type FigureOrigin = (typeof FIGURE_ORIGINS)[number];

/** One laboratory figure of a stock. */
export interface Figure {
  /** Property id of the property table ('kv', 'density', 'noack', ...) or of an own property. */
  property: string;
  /** Temperature [°C] for properties that need one: viscosities, density (15). */
  celsius?: number;
  /** Value in the unit of the property table. Absent only for `as the rest`. */
  value?: number;
  origin: FigureOrigin;
  /** Standard deviation of the value, same unit. */
  standardDeviation?: number;
  /** Test method where it differs from the property's usual one, e.g. "D93". */
  method?: string;
  /** Date of the certificate or data sheet, ISO 8601 (YYYY-MM-DD). */
  date?: string;
}
