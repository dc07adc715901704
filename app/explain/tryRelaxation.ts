import { applyRelaxation, type Order, type Relaxation } from '../../src';
import { placeCopy } from '../state/orderEdits';
import { tell } from '../state/viewStore';

/** A copy of the order with the ends of a relaxation, put on screen; the order itself stays as it is. */
export function tryRelaxation(orderId: string, order: Order, relaxation: Relaxation, words: string): void {
  const { limits } = applyRelaxation(order, relaxation);
  const copy = placeCopy(orderId, 'eased', (draft) => {
    draft.limits = structuredClone(limits);
  });
  if (copy) tell(`${copy}: a copy with ${words}. The order it comes from is unchanged.`);
}
