import type { PropertyAt } from '../../blend/predictionOptions';
import type { Order } from '../../optimise/order';
import { type Reproducibility, reproducibilityOf } from '../../property/propertyDefinition';
import { propertyDefinition } from '../../property/propertyTable';
import { hasViscosityIndex, viscosityIndex } from '../../property/viscosityIndex';

/**
 * Precisions to use in place of the property table's, a laboratory's own R' for instance: by property id, or by id and
 * temperature ('kv@40') where they differ.
 */
export type Precisions = Readonly<Record<string, Reproducibility>>;

/** The viscosities of the mix [mm²/s]; a precision of the viscosity index needs both. */
export interface MixViscosities {
  kv40: number;
  kv100: number;
}

/** R = 2.77 σ: two results of two laboratories, 95 %, differ by less. Source: ISO 4259-2. */
export const R_PER_SIGMA = 2.77;

/** Step of the numerical derivatives of the viscosity index, relative. */
const SMALL = 1e-5;

/** Reproducibility R of a property's method at a value, in the property's unit; undefined where none is known. */
export function reproducibilityAt(
  { property, celsius }: PropertyAt,
  value: number,
  order: Pick<Order, 'ownProperties'>,
  precisions: Precisions = {},
): number | undefined {
  const definition = propertyDefinition(property, order.ownProperties);
  const own = precisions[`${property}@${celsius}`] ?? precisions[property];
  const r = own
    ? 'absolute' in own
      ? own.absolute
      : own.relative * Math.abs(value)
    : definition && reproducibilityOf(definition, value, celsius);
  return r !== undefined && r > 0 && Number.isFinite(r) ? r : undefined;
}

/** d VI by one viscosity; from the side where the index is defined at its ends. */
function slope(at: (factor: number) => number | undefined, value: number): number | undefined {
  const [below, here, above] = [at(1 - SMALL), at(1), at(1 + SMALL)];
  if (below !== undefined && above !== undefined) return (above - below) / (2 * SMALL * value);
  if (here !== undefined && above !== undefined) return (above - here) / (SMALL * value);
  return undefined;
}

/**
 * Reproducibility of the viscosity index [-] that follows from those of KV40 and KV100, their errors independent:
 * R² = (∂VI/∂KV40 · R40)² + (∂VI/∂KV100 · R100)². The index has no precision of its own (ASTM D2270). To first order.
 */
export function reproducibilityOfIndex(
  { kv40, kv100 }: MixViscosities,
  order: Pick<Order, 'ownProperties'>,
  precisions: Precisions = {},
): number | undefined {
  const indexAt = (cold: number, hot: number) => (hasViscosityIndex(cold, hot) ? viscosityIndex(cold, hot) : undefined);
  const byCold = slope((factor) => indexAt(kv40 * factor, kv100), kv40);
  const byHot = slope((factor) => indexAt(kv40, kv100 * factor), kv100);
  const cold = reproducibilityAt({ property: 'kv', celsius: 40 }, kv40, order, precisions);
  const hot = reproducibilityAt({ property: 'kv', celsius: 100 }, kv100, order, precisions);
  if (byCold === undefined || byHot === undefined || cold === undefined || hot === undefined) return undefined;
  return Math.hypot(byCold * cold, byHot * hot);
}
