import { type KeyboardEvent, useLayoutEffect, useRef, useState } from 'react';
import type { Product } from '../../src';
import { CELL_MOVES } from './cellMoves';
import type { Column } from './column';
import styles from './StocksTable.module.css';
import type { Editing, GridActions } from './useGrid';

/** The field in the cell being typed in. The page hears of it on Enter, Tab or leaving; Escape goes back. */
export function CellEditor({
  product,
  column,
  editing,
  grid,
}: {
  product: Product;
  column: Column;
  editing: Editing;
  grid: GridActions;
}) {
  const start = column.read(product).edit;
  // Nothing until something is typed: what another place changes meanwhile is then not written over.
  const [draft, setDraft] = useState(editing.text);
  const field = useRef<HTMLInputElement>(null);
  const done = useRef(false);
  const label = `${column.title}, ${product.name}`;
  // A text that stands unread may be meant after all: typed again as it is, it is read again.
  const changed = draft === start && product.unread?.[column.id] === undefined ? undefined : draft;

  useLayoutEffect(() => {
    field.current?.focus();
    if (editing.text === undefined) field.current?.select();
  }, [editing.text]);

  function onKeyDown(event: KeyboardEvent) {
    const move = CELL_MOVES[event.key];
    if (move) {
      event.preventDefault();
      done.current = true;
      grid.commit(product, column, changed, event.shiftKey ? move.shift : move.plain);
    } else if (event.key === 'Escape') {
      done.current = true;
      grid.revert();
    }
  }

  function onBlur() {
    // Taking the field away blurs it: what Escape refused must not be taken after all.
    if (!done.current) grid.leave(product, column, changed);
  }

  return (
    <input
      ref={field}
      className={styles.field}
      aria-label={label}
      type="text"
      inputMode={column.kind === 'number' ? 'decimal' : undefined}
      autoComplete="off"
      spellCheck={false}
      data-dirty={changed !== undefined || undefined}
      value={draft ?? start}
      onChange={(event) => setDraft(event.target.value)}
      onKeyDown={onKeyDown}
      onBlur={onBlur}
    />
  );
}
