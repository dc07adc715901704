import type { Limit, Order } from '../../optimise/order';
import type { PropertyDefinition } from '../../property/propertyDefinition';
import { type LimitEnd, statedEnd, tidy, withEnd } from '../limitEnd';

/**
 * By how much an end is moved to price it [property's unit]: the greatest of 1, 2, 5, 10, ... (times a power of ten)
 * within a hundredth of the stated end, but no less than one reporting unit. A hundredth of a viscosity of 46 mm²/s
 * says more than the hundredth of a mm²/s that a laboratory reports; of a pour point near zero a hundredth says nothing.
 */
export function limitStep(stated: number, { reportingUnit }: PropertyDefinition): number {
  const hundredth = Math.abs(stated) / 100;
  if (!(hundredth > reportingUnit)) return reportingUnit;
  const exponent = Math.floor(Math.log10(hundredth));
  const mantissa = [5, 2, 1].find((candidate) => candidate * 10 ** exponent <= hundredth) ?? 1;
  // Powers of ten below 1 are not exact: 2 / 100 is, 2 * 0.01 is not.
  const round = exponent < 0 ? mantissa / 10 ** -exponent : mantissa * 10 ** exponent;
  return Math.max(reportingUnit, round);
}

/** How far an end can be loosened before it leaves what the property can be [property's unit]. */
export function roomToLoosen(limit: Limit, end: 'min' | 'max', { sense }: PropertyDefinition): number {
  if (end === 'min') return Math.max(0, (limit.min ?? sense.min) - sense.min);
  const uppers = [limit.max, typeof limit.below === 'number' ? limit.below : undefined];
  return Math.max(0, sense.max - Math.max(...uppers.filter((upper) => upper !== undefined)));
}

/** The end moved outward by `by` (inward where it is negative), as stated [property's unit]. */
export function movedOutward(order: Order, at: LimitEnd, by: number): number {
  return tidy(statedEnd(order, at).stated + (at.end === 'max' ? by : -by));
}

/** The order with one end looser by `by`, or tighter where it is negative. */
export function loosened(order: Order, at: LimitEnd, by: number): Order {
  return withEnd(order, at, movedOutward(order, at, by));
}
