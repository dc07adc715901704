import type { Limit, Order } from '../../optimise/order';
import { limitCelsius, limitDefinition } from '../../optimise/rows/limitEnds';
import { hasViscosityIndex, kv40ForViscosityIndex, LEAST_KV100_FOR_VI } from '../../property/viscosityIndex';
import { type Precisions, reproducibilityAt, reproducibilityOfIndex } from './methodPrecision';

/** One result, 95 %, one-sided: 1.645/2.772 of the reproducibility R, 0.59 R. Source: ISO 4259-2, ASTM D3244. */
export const MARGIN_SHARE_OF_R = 1.645 / 2.772;

export interface MarginOptions {
  /** KV100 of the mix [mm²/s]; a limit on the viscosity index needs it. */
  kv100?: number;
  /** Precisions in place of the property table's. */
  precisions?: Precisions;
}

/** R of the viscosity index of a mix whose index sits on an end of the limit; undefined where no such oil exists. */
function indexAtEnd(end: number, order: Order, { kv100, precisions }: MarginOptions): number | undefined {
  if (kv100 === undefined || !(kv100 >= LEAST_KV100_FOR_VI)) return undefined;
  try {
    const kv40 = kv40ForViscosityIndex(end, kv100);
    return hasViscosityIndex(kv40, kv100) ? reproducibilityOfIndex({ kv40, kv100 }, order, precisions) : undefined;
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}

/** The larger R of an index on the end, and of one inside it by the margin of that: for thin oils R grows with the index. */
function indexNearEnd(end: number, inwards: 1 | -1, order: Order, options: MarginOptions): number | undefined {
  const onEnd = indexAtEnd(end, order, options);
  if (onEnd === undefined) return undefined;
  return Math.max(onEnd, indexAtEnd(end + inwards * MARGIN_SHARE_OF_R * onEnd, order, options) ?? 0);
}

/**
 * The margin ("inside by") that the method's precision asks for, in the limit's unit: 0.59 R at the stated end, the
 * larger of two, rounded up to the digits shown. A mix that keeps it passes a single test 95 times in 100. For the
 * viscosity index R follows from both viscosities, at the index of the end and the KV100 of the mix.
 *
 * Undefined where the limit has no ends or no precision is known.
 */
export function marginFor(limit: Limit, order: Order, options: MarginOptions = {}): number | undefined {
  const definition = limitDefinition(limit, order);
  if (!definition) return undefined;
  const celsius = limitCelsius(limit, definition);
  const at = celsius === undefined ? { property: definition.id } : { property: definition.id, celsius };
  const ends = [limit.min, limit.max, limit.below].filter((end) => typeof end === 'number');
  const spreads = ends.map((end) =>
    definition.id === 'vi'
      ? indexNearEnd(end, end === limit.min ? 1 : -1, order, options)
      : reproducibilityAt(at, end, order, options.precisions),
  );
  const known = spreads.filter((r) => r !== undefined);
  if (known.length === 0) return undefined;
  const unit = 10 ** -definition.digits;
  const steps = Math.ceil((MARGIN_SHARE_OF_R * Math.max(...known)) / unit - 1e-9);
  return Number((steps * unit).toFixed(definition.digits));
}
