import type { Product } from '../../src';
import type { Column } from './column';
import type { Place } from './gridKeys';

/** Cells that cannot be right, top to bottom. */
export function troubledCells(products: readonly Product[], columns: readonly Column[]): Place[] {
  return products.flatMap((product, row) =>
    columns.flatMap((column, place) => (column.read(product).problem ? [{ row, column: place }] : [])),
  );
}

/** The next such cell after a place; the first after the last. */
export function nextTrouble(cells: readonly Place[], after: Place | undefined): Place | undefined {
  const next = cells.find(
    ({ row, column }) => after && (row > after.row || (row === after.row && column > after.column)),
  );
  return next ?? cells[0];
}
