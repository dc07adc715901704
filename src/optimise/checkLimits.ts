import { propertyInWords } from '../blend/stockValue';
import type { Limit, Order } from './order';
import type { LimitCheck } from './outcome';
import { limitCelsius, limitDefinition, limitEnds } from './rows/limitEnds';

/** A recipe may miss a stated limit by this much of a reporting unit, and no more. */
export const TOLERATED_MISS = 1e-6;
/** Nearer to a limit than this, in reporting units, the mix is said to sit on it. */
const ON_LIMIT = 1e-3;

/** The value of a property (at a temperature) of the mix at hand; undefined where it is unknown. */
export type ValueOf = (property: string, celsius: number | undefined) => number | undefined;

function checkLimit(order: Order, limit: Limit, place: number, valueAt: ValueOf): LimitCheck | undefined {
  const definition = limitDefinition(limit, order);
  if (!definition) return undefined;
  const celsius = limitCelsius(limit, definition);
  const value = valueAt(definition.id, celsius) ?? Number.NaN;
  const ends = limitEnds(limit, definition);
  const room = Math.min(value - (ends.min ?? -Infinity), (ends.max ?? Infinity) - value);
  return {
    limit: place,
    property: definition.id,
    ...(celsius === undefined ? {} : { celsius }),
    ...ends,
    value,
    ...(Number.isFinite(room) ? { room } : {}),
    passes: room >= -TOLERATED_MISS * definition.reportingUnit,
    onLimit: Math.abs(room) <= ON_LIMIT * definition.reportingUnit,
  };
}

/** Holds every limit of an order against a mix, in physical units. */
export function checkLimits(order: Order, valueAt: ValueOf): LimitCheck[] {
  return order.limits.flatMap((limit, place) => {
    const check = checkLimit(order, limit, place, valueAt);
    const saysNothing = check && Number.isNaN(check.value) && check.min === undefined && check.max === undefined;
    return check && !saysNothing ? check : [];
  });
}

/** A limit in words, "Noack volatility". */
export function limitInWords(limit: Limit, order: Order): string {
  const definition = limitDefinition(limit, order);
  if (!definition) return limit.property;
  const celsius = limitCelsius(limit, definition);
  return propertyInWords(celsius === undefined ? { property: definition.id } : { property: definition.id, celsius }, {
    ownProperties: order.ownProperties ?? [],
  });
}
