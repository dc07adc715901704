import { type ChangeEvent, type KeyboardEvent, useId, useLayoutEffect, useRef, useState } from 'react';
import type { Product } from '../../src';
import { CELL_MOVES } from './cellMoves';
import type { Column } from './column';
import styles from './StocksTable.module.css';
import type { Editing, GridActions } from './useGrid';

/** The field of a cell with a choice: a list, or what is typed, which only Enter and Tab complete to a choice. */
export function ChoiceEditor({
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
  const id = useId();
  const [typed, setTyped] = useState(editing.text);
  const [refused, setRefused] = useState(false);
  const field = useRef<HTMLInputElement & HTMLSelectElement>(null);
  const done = useRef(false);
  const isList = typed === undefined;
  const label = `${column.title}, ${product.name}`;
  const found = isList || typed.trim() === '' ? undefined : column.choose?.(typed);

  // The list and the field for typing take each other's place, and the focus with it.
  // biome-ignore lint/correctness/useExhaustiveDependencies: the field is another one then
  useLayoutEffect(() => field.current?.focus(), [isList]);

  function onKeyDown(event: KeyboardEvent) {
    const move = CELL_MOVES[event.key];
    if (move) {
      event.preventDefault();
      if (found && 'problem' in found) {
        setRefused(true);
        return;
      }
      done.current = true;
      grid.commit(product, column, found?.choice, event.shiftKey ? move.shift : move.plain);
    } else if (event.key === 'Escape') {
      done.current = true;
      grid.revert();
    } else if (isList && isLetter(event)) {
      event.preventDefault();
      setTyped(event.key);
    }
  }

  function onBlur({ target }: { target: Element }) {
    // The list gives way to the field for typing; and what Escape refused must not be taken after all.
    if (done.current || target !== field.current) return;
    const whole = found && 'choice' in found && found.whole ? found.choice : undefined;
    if (found && whole === undefined) grid.say(`${column.label} of ${product.name}: “${typed}” was not taken.`);
    grid.leave(product, column, whole);
  }

  if (isList) {
    return (
      <select
        ref={field}
        className={styles.field}
        aria-label={label}
        value={column.read(product).edit}
        onKeyDown={onKeyDown}
        onBlur={onBlur}
        onChange={(event) => grid.pick(product, column, event.target.value)}
      >
        {column.choices?.map((choice) => (
          <option key={choice}>{choice}</option>
        ))}
      </select>
    );
  }
  const words = found && ('problem' in found ? found.problem : `${found.choice}: Enter takes it`);
  return (
    <>
      <input
        ref={field}
        className={styles.field}
        aria-label={label}
        aria-describedby={words ? `${id}-words` : undefined}
        aria-invalid={refused && found && 'problem' in found ? true : undefined}
        type="text"
        autoComplete="off"
        spellCheck={false}
        data-dirty
        value={typed}
        onChange={(event: ChangeEvent<HTMLInputElement>) => {
          setRefused(false);
          setTyped(event.target.value);
        }}
        onKeyDown={onKeyDown}
        onBlur={onBlur}
      />
      <span id={`${id}-words`} role="status" className={styles.taken} data-refused={refused || undefined}>
        {words}
      </span>
    </>
  );
}

const isLetter = ({ key, ctrlKey, metaKey, altKey }: KeyboardEvent) =>
  [...key].length === 1 && key !== ' ' && !ctrlKey && !metaKey && !altKey;
