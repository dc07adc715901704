import { useId, useRef } from 'react';
import type { Product } from '../../src';
import { classNames } from '../parts/classNames';
import { CellEditor } from './CellEditor';
import { ChoiceEditor } from './ChoiceEditor';
import type { CellView, Column } from './column';
import type { Place } from './gridKeys';
import styles from './StocksTable.module.css';
import type { Editing, GridActions } from './useGrid';
import { useNoRoomAtRight } from './useNoRoomAtRight';

const MARKS: Partial<Record<NonNullable<CellView['state']>, { sign: string; words: string }>> = {
  soft: { sign: '≈', words: 'estimated or assumed' },
  'in-blend': { sign: '•', words: 'in-blend value' },
};

const sameNameMark = (count: number) => ({ sign: `${count}×`, words: `${count} stocks have this name` });

/** One cell of the table: its figure with its standing, or the field it is typed in. */
export function StockCell({
  product,
  column,
  place,
  chosen,
  tabbable,
  editing,
  missing,
  sameName,
  isLow,
  grid,
}: {
  product: Product;
  column: Column;
  place: Place;
  chosen: boolean;
  tabbable: boolean;
  editing: Editing | undefined;
  /** Why the order on screen cannot use the stock, where this cell would help. */
  missing: string | undefined;
  /** How many stocks bear this name, where it is not the only one. */
  sameName: number | undefined;
  /** Messages go above the cells of the last rows. */
  isLow: boolean;
  grid: GridActions;
}) {
  const id = useId();
  const view = column.read(product);
  const said = view.problem ?? missing ?? view.caution;
  const message = useRef<HTMLSpanElement>(null);
  const toTheLeft = useNoRoomAtRight(message, said !== undefined && chosen);
  const isHead = column.id === 'name';
  const Cell = isHead ? 'th' : 'td';
  const Editor = column.choices ? ChoiceEditor : CellEditor;
  const mark = sameName ? sameNameMark(sameName) : view.state && MARKS[view.state];
  return (
    <Cell
      scope={isHead ? 'row' : undefined}
      role={isHead ? 'rowheader' : 'gridcell'}
      tabIndex={editing ? -1 : tabbable ? 0 : -1}
      data-chosen={chosen || undefined}
      aria-readonly={!column.write || column.locked?.(product) ? true : undefined}
      aria-invalid={view.problem ? true : undefined}
      aria-describedby={said && chosen ? `${id}-said` : undefined}
      title={sentences(said, view.title, sameName === undefined ? undefined : mark?.words, column.locked?.(product))}
      className={classNames(
        styles.cell,
        styles[column.kind],
        isHead && styles.name,
        view.state && styles[view.state],
        view.problem ? styles.invalid : said && styles.cautioned,
        editing && styles.editing,
      )}
      onClick={() => !editing && grid.choose(place, product, column)}
    >
      {editing ? (
        <Editor product={product} column={column} editing={editing} grid={grid} />
      ) : (
        <span className={styles.content}>
          {mark && (
            <span className={styles.mark}>
              <span aria-hidden="true">{mark.sign}</span>
              <span className="visually-hidden">{mark.words}</span>
            </span>
          )}
          {view.text}
        </span>
      )}
      {said && chosen && (
        <span
          ref={message}
          id={`${id}-said`}
          className={classNames(
            styles.said,
            isLow && styles.up,
            toTheLeft && styles.left,
            !view.problem && styles.mild,
          )}
        >
          {said}
        </span>
      )}
    </Cell>
  );
}

function sentences(...texts: (string | undefined)[]): string | undefined {
  const given = texts.flatMap((text) => (text ? [text.replace(/\.$/, '')] : []));
  return given.length > 0 ? given.join('. ') : undefined;
}
