import type { PropertyDefinition } from '../../property/propertyDefinition';
import { propertyDefinition } from '../../property/propertyTable';
import type { Limit, Order } from '../order';

/** The ends a limit has for the search, in the property's unit: strictness and margin applied. */
export interface LimitEnds {
  min?: number;
  max?: number;
}

/** The ends of a limit: "below" stays one reporting unit inside, "inside by" moves every stated end inward. */
export function limitEnds(limit: Limit, definition: PropertyDefinition): LimitEnds {
  const margin = limit.insideBy ?? 0;
  const uppers: number[] = [];
  if (limit.max !== undefined) uppers.push(limit.below === true ? limit.max - definition.reportingUnit : limit.max);
  if (typeof limit.below === 'number') uppers.push(limit.below - definition.reportingUnit);
  const ends: LimitEnds = {};
  if (limit.min !== undefined) ends.min = limit.min + margin;
  if (uppers.length > 0) ends.max = Math.min(...uppers) - margin;
  return ends;
}

/** The table entry of a limit's property; undefined for an unknown property. */
export function limitDefinition(limit: Limit, order: Order): PropertyDefinition | undefined {
  return propertyDefinition(limit.property, order.ownProperties);
}

/** The temperature a limit is read at [°C], where its property has one. */
export function limitCelsius(limit: Limit, definition: PropertyDefinition): number | undefined {
  return definition.temperatures ? (limit.celsius ?? definition.temperatures[0]) : undefined;
}
