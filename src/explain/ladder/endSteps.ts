import type { Order } from '../../optimise/order';
import { limitDefinition } from '../../optimise/rows/limitEnds';
import { type LimitEnd, reportingUnit, statedEnd, tidy } from '../limitEnd';

/**
 * The values an end may be moved to: step 0 is the end as stated, the others are the multiples of the reporting unit
 * beyond it, outward, so that each can be typed and reported.
 */
export class EndSteps implements LimitEnd {
  readonly limit: number;
  readonly end: 'min' | 'max';
  /** In the property's unit. */
  readonly stated: number;
  /** One reporting unit, in the property's unit. */
  readonly unit: number;
  /** Last step inside the range that makes sense for the property. */
  readonly last: number;
  readonly #inside: number;
  readonly #outward: 1 | -1;
  /** The multiple of the unit that counts as step 0. */
  readonly #start: number;

  constructor(order: Order, { limit, end }: LimitEnd) {
    const { stated, inside } = statedEnd(order, { limit, end });
    this.limit = limit;
    this.end = end;
    this.stated = stated;
    this.unit = reportingUnit(order, limit);
    this.#inside = inside;
    this.#outward = end === 'max' ? 1 : -1;
    const multiple = stated / this.unit;
    const nearest = Math.round(multiple);
    const isOnGrid = Math.abs(multiple - nearest) < 1e-6;
    this.#start = isOnGrid ? nearest : end === 'max' ? Math.floor(multiple) : Math.ceil(multiple);
    const sense = limitDefinition(order.limits[limit], order)?.sense;
    const farthest = sense ? sense[end] : this.#outward * Infinity;
    this.last = Math.max(0, Math.floor(this.#outward * (farthest / this.unit - this.#start) + 1e-6));
  }

  /** The end at a step, in the property's unit. */
  at(step: number): number {
    return step === 0 ? this.stated : tidy((this.#start + this.#outward * step) * this.unit);
  }

  /** First step whose end lets a mix of this value in, margin and strictness counted; the last one where none does. */
  stepFor(value: number | undefined): number {
    if (value === undefined || Number.isNaN(value)) return this.last;
    const needed = value + this.#outward * this.#inside;
    if (this.#outward * (needed - this.stated) <= 0) return 0;
    const step = Math.ceil(this.#outward * (needed / this.unit - this.#start) - 1e-7);
    return Math.min(this.last, Math.max(1, step));
  }
}
