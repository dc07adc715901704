import { memo } from 'react';
import type { Product } from '../../src';
import { classNames } from '../parts/classNames';
import { formatNumber } from '../parts/numberText';
import type { Column } from './column';
import type { Place } from './gridKeys';
import { StockCell } from './StockCell';
import styles from './StocksTable.module.css';
import type { Editing, GridActions } from './useGrid';

export interface StockRowProps {
  product: Product;
  columns: readonly Column[];
  row: number;
  /** Messages of the last rows go above their cells. */
  isLow: boolean;
  /** Share in the recipe on screen [0..1]. */
  share: number | undefined;
  excluded: boolean;
  /** By column: why the order on screen cannot use the stock. */
  missing: ReadonlyMap<string, string> | undefined;
  /** How many stocks bear this one's name, where it is not the only one. */
  sameName: number | undefined;
  /** The chosen cell's column, where it is in this row. */
  chosen: number | undefined;
  /** The column that the Tab key reaches, where it is in this row. */
  tabbable: number | undefined;
  editing: Editing | undefined;
  grid: GridActions;
  onUse(product: Product, use: boolean): void;
}

/** One stock. Memoised: typing in one row draws no other. */
export const StockRow = memo(function StockRow(props: StockRowProps) {
  const { product, columns, row, isLow, share, excluded, missing, chosen, tabbable, editing, grid, onUse } = props;
  return (
    <tr className={classNames(share !== undefined && styles.used, excluded && styles.excluded)} aria-rowindex={row + 2}>
      {columns.map((column, place) => {
        const at: Place = { row, column: place };
        const isChosen = chosen === place;
        if (column.kind === 'use' || column.kind === 'share') {
          return (
            // biome-ignore lint/a11y/useKeyWithClickEvents: the table hears the keys of all its cells
            <td
              key={column.id}
              // biome-ignore lint/a11y/noNoninteractiveElementToInteractiveRole: a cell of the grid
              role="gridcell"
              // The box itself takes the focus, so that it is heard whether it is ticked.
              tabIndex={column.kind === 'use' ? undefined : tabbable === place ? 0 : -1}
              data-chosen={isChosen || undefined}
              className={classNames(styles.cell, styles[column.kind])}
              onClick={() => grid.choose(at, product, column)}
            >
              {column.kind === 'share' ? (
                share !== undefined && <span className={styles.content}>{formatNumber(share * 100, 1)}</span>
              ) : (
                <input
                  type="checkbox"
                  tabIndex={tabbable === place ? 0 : -1}
                  aria-label={`Use ${product.name} in this order`}
                  checked={!excluded}
                  onChange={(event) => onUse(product, event.target.checked)}
                />
              )}
            </td>
          );
        }
        return (
          <StockCell
            key={column.id}
            product={product}
            column={column}
            place={at}
            chosen={isChosen}
            tabbable={tabbable === place}
            editing={isChosen ? editing : undefined}
            missing={missing?.get(column.id)}
            sameName={column.id === 'name' ? props.sameName : undefined}
            isLow={isLow}
            grid={grid}
          />
        );
      })}
    </tr>
  );
});
