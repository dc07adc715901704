import type { StockSet, Workbook, WorkbookOrder } from '../../src';
import { tell } from '../state/viewStore';
import { editWorkbook, useWorkbook } from '../state/workbookStore';

/** Drops a product from a set. Where the set is then empty, its rule is unfinished, which it says where it stands. */
function dropFromSet(set: StockSet, id: string): void {
  if (set.stockIds?.includes(id)) set.stockIds = set.stockIds.filter((other) => other !== id);
}

function dropFromOrder(order: WorkbookOrder, id: string): void {
  if (order.doses.some(({ stockId }) => stockId === id)) {
    order.doses = order.doses.filter(({ stockId }) => stockId !== id);
  }
  if (order.excludedProductIds.includes(id)) {
    order.excludedProductIds = order.excludedProductIds.filter((other) => other !== id);
  }
  for (const rule of order.shares) {
    if ('set' in rule) dropFromSet(rule.set, id);
    if (rule.kind === 'ratio') dropFromSet(rule.to, id);
    if (rule.kind === 'excludes' && rule.stockId === id) rule.stockId = '';
  }
}

const ordersInWords = (count: number) => (count === 1 ? "one order's" : `${count} orders'`);

/** "2 orders' doses and one order's rules", of those that name the product; undefined: none does. */
function usesInWords({ orders }: Workbook, id: string): string | undefined {
  const dosed = orders.filter(({ doses }) => doses.some(({ stockId }) => stockId === id)).length;
  const ruled = orders.filter(({ shares }) =>
    shares.some(
      (rule) =>
        ('set' in rule && rule.set.stockIds?.includes(id)) ||
        (rule.kind === 'ratio' && rule.to.stockIds?.includes(id)) ||
        (rule.kind === 'excludes' && rule.stockId === id),
    ),
  ).length;
  const uses = [dosed > 0 && `${ordersInWords(dosed)} doses`, ruled > 0 && `${ordersInWords(ruled)} rules`];
  return uses.filter(Boolean).join(' and ') || undefined;
}

/** Removes a stock, and what orders say of it, as one step: an order cannot ask for what is not there. */
export function removeStock(id: string): void {
  const { workbook } = useWorkbook.getState();
  const gone = workbook.products.find((product) => product.id === id);
  if (!gone) return;
  const uses = usesInWords(workbook, id);
  editWorkbook(`removal of ${gone.name}`, (draft) => {
    draft.products = draft.products.filter((product) => product.id !== id);
    for (const order of draft.orders) dropFromOrder(order, id);
  });
  tell(`${gone.name || 'A stock'} removed${uses ? `, also from ${uses}` : ''}. Undo brings it back.`);
}
