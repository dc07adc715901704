import type { FocusEvent, KeyboardEvent, RefObject } from 'react';
import type { Product } from '../../src';
import { classNames } from '../parts/classNames';
import type { Column } from './column';
import type { Place } from './gridKeys';
import { StockRow } from './StockRow';
import styles from './StocksTable.module.css';
import type { Editing, GridActions } from './useGrid';

/** Of the line that says which keys do what here, how to leave among them. */
export const KEYS_ID = 'stocks-keys';

export interface StocksGridProps {
  tableRef: RefObject<HTMLTableElement | null>;
  products: readonly Product[];
  columns: readonly Column[];
  shares: ReadonlyMap<string, number>;
  excluded: ReadonlySet<string>;
  /** By stock and column: what the answer lacks there. */
  missing: ReadonlyMap<string, ReadonlyMap<string, string>>;
  /** By stock: how many bear its name, where it is not the only one. */
  sameNames: ReadonlyMap<string, number>;
  place: Place | undefined;
  editing: Editing | undefined;
  grid: GridActions;
  onUse(product: Product, use: boolean): void;
  onKeyDown(event: KeyboardEvent): void;
  onFocus(event: FocusEvent<HTMLElement>): void;
}

/** The table itself: one row a stock, headings and names staying in sight. */
export function StocksGrid(props: StocksGridProps) {
  const { tableRef, products, columns, shares, excluded, place, editing, grid, onUse, missing } = props;
  // The Tab key reaches one cell: the chosen one, or the first.
  const reached = place ?? { row: 0, column: 0 };
  return (
    <table
      ref={tableRef}
      // biome-ignore lint/a11y/noNoninteractiveElementToInteractiveRole: the grid pattern of WAI-ARIA, on a table
      role="grid"
      aria-label="Stocks"
      aria-describedby={KEYS_ID}
      aria-rowcount={products.length + 1}
      aria-colcount={columns.length}
      className={styles.table}
      onKeyDown={props.onKeyDown}
      onFocus={props.onFocus}
    >
      <thead>
        <tr aria-rowindex={1}>
          {columns.map(({ id, label, unit, title, kind }) => (
            <th
              key={id}
              scope="col"
              title={title}
              className={classNames(styles.heading, styles[kind], id === 'name' && styles.name)}
            >
              {label}
              <span className={styles.unit}>{unit ?? '\u00a0'}</span>
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {products.map((product, row) => (
          <StockRow
            key={product.id}
            product={product}
            columns={columns}
            row={row}
            isLow={row > 2 && row >= products.length - 3}
            share={shares.get(product.id)}
            excluded={excluded.has(product.id)}
            missing={missing.get(product.id)}
            sameName={props.sameNames.get(product.id)}
            chosen={place?.row === row ? place.column : undefined}
            tabbable={reached.row === row ? reached.column : undefined}
            editing={place?.row === row ? editing : undefined}
            grid={grid}
            onUse={onUse}
          />
        ))}
      </tbody>
    </table>
  );
}
