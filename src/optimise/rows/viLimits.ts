import type { BlendQuantity } from '../../blend/blendQuantity';
import { VI_DEFINITION } from '../../property/propertyTable';
import { LEAST_KV100_FOR_VI } from '../../property/viscosityIndex';
import type { Order } from '../order';
import type { OrderProblem } from '../outcome';
import { limitEnds } from './limitEnds';
import type { ViLimits } from './searchModel';

/** Room for rounding around the KV100 that stocks and limits allow [-], relative. */
const SLACK = 1e-9;

function column(quantity: BlendQuantity, part: 'weight' | 'index'): Float64Array {
  return Float64Array.from(quantity.terms, (term) => (term.state === 'term' ? term[part] : 0));
}

function tightestEnds(order: Order): Pick<ViLimits, 'min' | 'max'> {
  const found: Pick<ViLimits, 'min' | 'max'> = {};
  order.limits.forEach((limit, place) => {
    if (limit.property !== 'vi') return;
    const { min, max } = limitEnds(limit, VI_DEFINITION);
    if (min !== undefined && (!found.min || min > found.min.value)) found.min = { value: min, limit: place };
    if (max !== undefined && (!found.max || max < found.max.value)) found.max = { value: max, limit: place };
  });
  return found;
}

/** KV100 a mix can have: between its thinnest and thickest stock, inside the KV100 limits, 2 or more. */
function reachableKv100(order: Order, kv100: BlendQuantity): { from: number; to: number } {
  let from = Infinity;
  let to = 0;
  for (const term of kv100.terms) {
    if (term.state !== 'term') continue;
    from = Math.min(from, term.value);
    to = Math.max(to, term.value);
  }
  for (const limit of order.limits) {
    if (limit.property !== 'kv' || (limit.celsius ?? kv100.definition.temperatures?.[0]) !== 100) continue;
    const ends = limitEnds(limit, kv100.definition);
    if (ends.min !== undefined) from = Math.max(from, ends.min);
    if (ends.max !== undefined) to = Math.min(to, ends.max);
  }
  return { from: Math.max(LEAST_KV100_FOR_VI, from * (1 - SLACK)), to: to * (1 + SLACK) };
}

/**
 * The limits on the viscosity index in the terms the search needs, or what is wrong. Nothing where there are none.
 * The stocks' KV40 and KV100 carry the same weights under every rule, so that both indices of the mix are weighted
 * means over one denominator.
 */
export function viLimits(
  order: Order,
  quantities: ReadonlyMap<string, BlendQuantity>,
): { vi?: ViLimits; problems: OrderProblem[] } {
  const ends = tightestEnds(order);
  const kv40 = quantities.get('kv@40');
  const kv100 = quantities.get('kv@100');
  if ((!ends.min && !ends.max) || !kv40 || !kv100) return { problems: [] };
  const range = reachableKv100(order, kv100);
  if (range.to < LEAST_KV100_FOR_VI) {
    const place = ends.min?.limit ?? ends.max?.limit ?? 0;
    const message =
      'A viscosity index needs a KV100 of at least 2 mm²/s (ASTM D2270), which these stocks and limits do not reach. ' +
      'Remove the limit on the viscosity index, or allow a thicker mix.';
    return { problems: [{ path: ['limits', place], message }] };
  }
  const vi: ViLimits = {
    ...ends,
    index: kv100.index,
    weights: column(kv100, 'weight'),
    index40: column(kv40, 'index'),
    index100: column(kv100, 'index'),
    kv100: range,
  };
  return { vi, problems: [] };
}
