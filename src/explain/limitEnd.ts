import type { Limit, Order } from '../optimise/order';
import { limitDefinition } from '../optimise/rows/limitEnds';

/** One end of one limit: its place in `order.limits`, and which end. */
export interface LimitEnd {
  limit: number;
  end: 'min' | 'max';
}

type UpperField = 'max' | 'below';

/** Twelve digits: sums of decimals without the rounding of binary numbers, so that they can be shown and typed. */
export function tidy(value: number): number {
  return Number(value.toPrecision(12));
}

/** One reporting unit of a limit's property, in the property's unit. */
export function reportingUnit(order: Order, place: number): number {
  return limitDefinition(order.limits[place], order)?.reportingUnit ?? 1;
}

function upperFields(limit: Limit): UpperField[] {
  return [
    ...(limit.max === undefined ? [] : ['max' as const]),
    ...(typeof limit.below === 'number' ? ['below' as const] : []),
  ];
}

/** By how much a stated upper end is strict: "below" stays one reporting unit inside. */
function strictness(limit: Limit, field: UpperField, unit: number): number {
  return field === 'below' || limit.below === true ? unit : 0;
}

function stated(limit: Limit, field: UpperField): number {
  return Number(limit[field]);
}

/** The stated upper end that counts, where a limit has both "at most" and "below". */
function tighter(limit: Limit, unit: number): UpperField | undefined {
  const held = (field: UpperField) => stated(limit, field) - strictness(limit, field, unit);
  const fields = upperFields(limit);
  return fields.length > 1 && held('below') < held('max') ? 'below' : fields[0];
}

/** Every end that the limits state. */
export function statedEnds(order: Order): LimitEnd[] {
  return order.limits.flatMap((limit, place) => [
    ...(limit.min === undefined ? [] : [{ limit: place, end: 'min' as const }]),
    ...(upperFields(limit).length === 0 ? [] : [{ limit: place, end: 'max' as const }]),
  ]);
}

/** The end as the user stated it, and how far the mix must stay inside it (margin and "below"), property's unit. */
export function statedEnd(order: Order, { limit: place, end }: LimitEnd): { stated: number; inside: number } {
  const limit = order.limits[place];
  const margin = limit?.insideBy ?? 0;
  if (end === 'min' && limit?.min !== undefined) return { stated: limit.min, inside: margin };
  const unit = reportingUnit(order, place);
  const field = end === 'max' && limit ? tighter(limit, unit) : undefined;
  if (!field) throw new RangeError(`Limit ${place + 1} states no ${end === 'min' ? 'least' : 'greatest'} value.`);
  return { stated: stated(limit, field), inside: margin + strictness(limit, field, unit) };
}

function changed(order: Order, place: number, limit: Limit): Order {
  return { ...order, limits: order.limits.map((other, index) => (index === place ? limit : other)) };
}

/**
 * A copy of the order with one end stated anew. Margin and strictness stay; where a limit has both "at most" and
 * "below", the one that counts gets the value and the other is moved out of its way.
 */
export function withEnd(order: Order, at: LimitEnd, to: number): Order {
  const limit = order.limits[at.limit];
  statedEnd(order, at);
  if (at.end === 'min') return changed(order, at.limit, { ...limit, min: to });
  const unit = reportingUnit(order, at.limit);
  const counting = tighter(limit, unit) ?? 'max';
  const held = to - strictness(limit, counting, unit);
  const moved = { ...limit };
  for (const field of upperFields(limit)) {
    const out = Math.max(stated(limit, field), tidy(held + strictness(limit, field, unit)));
    moved[field] = field === counting ? to : out;
  }
  return changed(order, at.limit, moved);
}

/** A copy without one end. The limit itself stays, so that the same stocks stay usable and places keep their meaning. */
export function withoutEnd(order: Order, { limit: place, end }: LimitEnd): Order {
  const { min, max, below, ...rest } = order.limits[place];
  if (end === 'max') return changed(order, place, min === undefined ? rest : { ...rest, min });
  const upper = { ...(max === undefined ? {} : { max }), ...(below === undefined ? {} : { below }) };
  return changed(order, place, { ...rest, ...upper });
}
