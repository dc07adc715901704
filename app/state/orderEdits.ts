import { emptyOrder, type WorkbookOrder } from '../../src';
import { environment } from './environment';
import { nameOrder, selectOrder, tell, useView } from './viewStore';
import { editWorkbook, useWorkbook } from './workbookStore';

const orders = () => useWorkbook.getState().workbook.orders;

/** A name that no order has yet: "New order", "New order 2", ... */
function freeName(wanted: string): string {
  const taken = new Set(orders().map(({ name }) => name));
  if (!taken.has(wanted)) return wanted;
  let count = 2;
  while (taken.has(`${wanted} ${count}`)) count += 1;
  return `${wanted} ${count}`;
}

function place(order: WorkbookOrder, at: number, label: string): void {
  editWorkbook(label, (draft) => {
    draft.orders.splice(at, 0, order);
  });
  selectOrder(order.id);
  nameOrder(order.id);
}

export function newOrder(): void {
  place(emptyOrder(environment().newId(), freeName('New order')), orders().length, 'new order');
}

/** A copy of an order with a change, right after it and on screen. Returns its name. */
export function placeCopy(orderId: string, suffix: string, change: (copy: WorkbookOrder) => void): string | undefined {
  const at = orders().findIndex(({ id }) => id === orderId);
  const original = orders()[at];
  if (!original) return undefined;
  const name = freeName(`${original.name}, ${suffix}`);
  const copy = { ...structuredClone(original), id: environment().newId(), name };
  change(copy);
  editWorkbook(`copy of ${original.name}`, (draft) => {
    draft.orders.splice(at + 1, 0, copy);
  });
  selectOrder(copy.id);
  return name;
}

/** A copy of the order on screen, right after it. */
export function duplicateOrder(): void {
  const at = orders().findIndex(({ id }) => id === useView.getState().orderId);
  const original = orders()[at];
  if (!original) return;
  const copy = { ...structuredClone(original), id: environment().newId(), name: freeName(`${original.name}, copy`) };
  place(copy, at + 1, `copy of ${original.name}`);
}

/** Deletes the order on screen and shows its neighbour. */
export function deleteOrder(): void {
  const at = orders().findIndex(({ id }) => id === useView.getState().orderId);
  const gone = orders()[at];
  if (!gone) return;
  editWorkbook(`deletion of ${gone.name}`, (draft) => {
    draft.orders.splice(at, 1);
  });
  selectOrder((orders()[at] ?? orders()[at - 1])?.id);
  tell(`${gone.name} deleted. Undo brings it back.`);
}
