import type { Product, WorkbookOrder } from '../../src';
import { editWorkbook, useWorkbook } from '../state/workbookStore';

export function useOrder(orderId: string): WorkbookOrder | undefined {
  return useWorkbook(({ workbook }) => workbook.orders.find((order) => order.id === orderId));
}

export function useProducts(): readonly Product[] {
  return useWorkbook(({ workbook }) => workbook.products);
}

/** Changes one order of the workbook; see `editWorkbook` for labels and joined edits. */
export function editOrder(
  orderId: string,
  label: string,
  change: (order: WorkbookOrder) => void,
  options?: { join?: string },
): void {
  editWorkbook(
    label,
    (workbook) => {
      const order = workbook.orders.find(({ id }) => id === orderId);
      if (order) change(order);
    },
    options,
  );
}
