import type { Order } from '../../optimise/order';
import type { Relaxation } from '../explanation';
import { withEnd } from '../limitEnd';

/**
 * A copy of the order with the ends of a relaxation stated anew: margins and strictness stay, "at most" and "below"
 * of one limit move together. Throws RangeError for an end that the order does not state.
 */
export function applyRelaxation(order: Order, relaxation: Pick<Relaxation, 'changes'>): Order {
  return relaxation.changes.reduce((changed, { to, ...at }) => withEnd(changed, at, to), order);
}
