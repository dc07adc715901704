import type { Product } from '../../src';
import type { Column } from './column';
import type { Place } from './gridKeys';

/** Columns of a stock that cannot be right, kept as long as the stock stays as it is: an edit changes one of many. */
const known = new WeakMap<readonly Column[], WeakMap<Product, readonly number[]>>();

function troubledColumns(product: Product, columns: readonly Column[]): readonly number[] {
  const byProduct = known.get(columns) ?? new WeakMap<Product, readonly number[]>();
  known.set(columns, byProduct);
  const before = byProduct.get(product);
  if (before) return before;
  const found = columns.flatMap((column, place) => (column.read(product).problem ? [place] : []));
  byProduct.set(product, found);
  return found;
}

/** Cells that cannot be right, top to bottom. */
export function troubledCells(products: readonly Product[], columns: readonly Column[]): Place[] {
  return products.flatMap((product, row) => troubledColumns(product, columns).map((column) => ({ row, column })));
}

/** The next such cell after a place; the first after the last. */
export function nextTrouble(cells: readonly Place[], after: Place | undefined): Place | undefined {
  const next = cells.find(
    ({ row, column }) => after && (row > after.row || (row === after.row && column > after.column)),
  );
  return next ?? cells[0];
}
