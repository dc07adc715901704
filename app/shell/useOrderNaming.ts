import { type RefObject, useEffect } from 'react';
import { nameOrder, useView } from '../state/viewStore';

/** An order just made asks for its name first: the field has the focus, its text selected to be typed over. */
export function useOrderNaming(order: RefObject<HTMLElement | null>, orderId: string | undefined): void {
  const orderToName = useView((view) => view.orderToName);
  useEffect(() => {
    if (orderToName === undefined || orderToName !== orderId) return;
    // The name is the first field of an order.
    const name = order.current?.querySelector<HTMLTextAreaElement | HTMLInputElement>('textarea, input');
    name?.focus();
    name?.select();
    nameOrder(undefined);
  }, [order, orderId, orderToName]);
}
