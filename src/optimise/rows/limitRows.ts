import type { BlendQuantity } from '../../blend/blendQuantity';
import type { PropertyDefinition } from '../../property/propertyDefinition';
import type { Limit, Order } from '../order';
import type { OrderProblem } from '../outcome';
import { quantityKey } from './candidates';
import { limitCelsius, limitDefinition, limitEnds } from './limitEnds';
import type { ModelBuilder } from './modelBuilder';

type Entries = (readonly [number, number])[];

function meanWeight(quantity: BlendQuantity): number {
  let sum = 0;
  let count = 0;
  for (const term of quantity.terms) {
    if (term.state !== 'term') continue;
    sum += term.weight;
    count++;
  }
  return count > 0 ? sum / count : 1;
}

/**
 * "The mix is at the value": Σ x w (I - I*) scaled so that a residual of 1 is one reporting unit at the value; its
 * sign is positive where the mix is above the value. Scaling a row by its largest coefficient instead made pour-point
 * rows lose the answer (see DEVELOPERS.md).
 */
function deviationEntries(quantity: BlendQuantity, value: number): Entries {
  const { index, definition } = quantity;
  const target = index.toIndex(value);
  const scale = 1 / (index.slope(value) * definition.reportingUnit * meanWeight(quantity));
  return quantity.terms.map(
    (term, column) => [column, term.state === 'term' ? term.weight * (term.index - target) * scale : 0] as const,
  );
}

/** Adds an aim: two deviations in reporting units, at their price. First order in the value where an index bends. */
function addAim(builder: ModelBuilder, limit: Limit, place: number, quantity: BlendQuantity): void {
  if (limit.aim === undefined) return;
  const entries = deviationEntries(quantity, limit.aim);
  const greatest = entries.reduce((most, [, value]) => Math.max(most, Math.abs(value)), 1);
  const weight = limit.aimWeight ?? 1;
  const over = builder.addColumn(weight, 0, greatest);
  const under = builder.addColumn(weight, 0, greatest);
  builder.addRow({ kind: 'limit', limit: place, end: 'aim' }, 0, 0, [...entries, [over, -1], [under, 1]]);
}

function outOfDomain({ index }: BlendQuantity, value: number | undefined): boolean {
  return value !== undefined && !(value >= index.domain.min && value <= index.domain.max);
}

function addLimit(
  builder: ModelBuilder,
  limit: Limit,
  place: number,
  quantity: BlendQuantity,
  definition: PropertyDefinition,
): void {
  const { min, max } = limitEnds(limit, definition);
  if (min !== undefined) {
    builder.addRow({ kind: 'limit', limit: place, end: 'min' }, 0, Infinity, deviationEntries(quantity, min));
  }
  if (max !== undefined) {
    builder.addRow({ kind: 'limit', limit: place, end: 'max' }, -Infinity, 0, deviationEntries(quantity, max));
  }
  addAim(builder, limit, place, quantity);
}

/** Rows of every limit that is linear: all but the viscosity index. Returns what is wrong with an end. */
export function addLimits(
  builder: ModelBuilder,
  order: Order,
  quantities: ReadonlyMap<string, BlendQuantity>,
): OrderProblem[] {
  const problems: OrderProblem[] = [];
  order.limits.forEach((limit, place) => {
    const definition = limitDefinition(limit, order);
    if (!definition || definition.id === 'vi') return;
    const celsius = limitCelsius(limit, definition);
    const at = celsius === undefined ? { property: definition.id } : { property: definition.id, celsius };
    const quantity = quantities.get(quantityKey(at));
    if (!quantity) return;
    const ends = limitEnds(limit, definition);
    if (outOfDomain(quantity, ends.min) || outOfDomain(quantity, ends.max)) {
      const message = `${definition.label}: with the margin counted the limit is outside what can be calculated. Reduce the margin.`;
      problems.push({ path: ['limits', place, 'insideBy'], message });
    } else addLimit(builder, limit, place, quantity, definition);
  });
  return problems;
}
