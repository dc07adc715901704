import {
  type FocusEvent,
  type KeyboardEvent,
  type RefObject,
  useCallback,
  useEffect,
  useMemo,
  useRef,
  useState,
} from 'react';
import type { Product } from '../../src';
import { endEdit, useWorkbook } from '../state/workbookStore';
import type { Column } from './column';
import { clampPlace, type GridSize, gridAction, type Place } from './gridKeys';
import { writeCell } from './stockEdits';
import { isTyped, nextTyped, notTypedInWords } from './typedCells';

/** The cell being typed in; `text` in place of what it held. */
export interface Editing {
  text?: string;
}

/** What cells tell the table. Never changes, so that rows need not be drawn again. */
export interface GridActions {
  /** A click: the cell is chosen and, where it can be, typed in. */
  choose(place: Place, product: Product, column: Column): void;
  /** Takes the text of the cell being typed in; `move` says where to go then. */
  commit(product: Product, column: Column, text: string | undefined, move: 'down' | 'up' | 'right' | 'left'): void;
  /** The focus has left the cell being typed in. */
  leave(product: Product, column: Column, text: string | undefined): void;
  revert(): void;
  /** A choice is taken at once, and stays open. */
  pick(product: Product, column: Column, text: string): void;
  /** Shows a word under the table until the focus goes on. */
  say(words: string): void;
}

const AT_END = 'There is no further cell to type in. Escape, then Tab leaves the table.';
const LEAVING = 'Tab now leaves the table.';
const NOT_CLEARED = 'A family is chosen, not cleared.';

/** Which cell is chosen, which is being typed in, and where the focus goes. */
export function useGrid(
  table: RefObject<HTMLTableElement | null>,
  products: readonly Product[],
  columns: readonly Column[],
  toggle: (product: Product) => void,
) {
  const [place, setPlace] = useState<Place>();
  const [editing, setEditing] = useState<Editing>();
  const [focusWanted, setFocusWanted] = useState(0);
  const [said, setSaid] = useState<string>();
  /** Escape was pressed: the Tab key is the page's again. */
  const leaving = useRef(false);
  const size = useRef<GridSize>({ rows: 0, columns: 0 });
  size.current = { rows: products.length, columns: columns.length };
  const now = useRef({ place, columns });
  now.current = { place, columns };

  const goTo = useCallback((to: Place, edit?: Editing) => {
    // A row just added is not on the page yet, so the place is held to the table's size only when it is shown.
    setPlace(to);
    setEditing(edit);
    setSaid(undefined);
    setFocusWanted((count) => count + 1);
  }, []);

  /** To the next cell that can be typed in; at the end it stays, so that what is typed next goes nowhere else. */
  const goOn = useCallback(
    (step: 1 | -1) => {
      const { place: from, columns: across } = now.current;
      if (!from) return;
      // As the workbook is now: what was just written may let a calculated cell be typed in, or not any more.
      const next = nextTyped(from, step, useWorkbook.getState().workbook.products, across);
      goTo(next ?? from);
      if (!next) setSaid(AT_END);
    },
    [goTo],
  );

  useEffect(() => {
    if (focusWanted === 0) return;
    const cell = table.current?.querySelector<HTMLElement>('[data-chosen]');
    // The field of a cell being typed in takes the focus by itself.
    if (cell && !cell.contains(document.activeElement)) (cell.querySelector('input') ?? cell).focus();
  }, [focusWanted, table]);

  const actions = useMemo<GridActions>(() => {
    const write = (product: Product, column: Column, text: string | undefined) => {
      if (text !== undefined) writeCell(product, column, text);
    };
    return {
      choose(to, product, column) {
        goTo(to, isTyped(product, column) ? {} : undefined);
      },
      commit(product, column, text, move) {
        write(product, column, text);
        endEdit();
        const { place: from } = now.current;
        if (move === 'right' || move === 'left') goOn(move === 'right' ? 1 : -1);
        else if (from) goTo(clampPlace({ ...from, row: from.row + (move === 'down' ? 1 : -1) }, size.current));
      },
      leave(product, column, text) {
        write(product, column, text);
        endEdit();
        setEditing(undefined);
      },
      revert() {
        setEditing(undefined);
        setFocusWanted((count) => count + 1);
      },
      pick(product, column, text) {
        writeCell(product, column, text, `${product.id} ${column.id}`);
      },
      say: setSaid,
    };
  }, [goTo, goOn]);

  /** Escape gives the Tab key to the page; else it goes from cell to cell. True where the key was one of these. */
  function onLeavingKey(event: KeyboardEvent): boolean {
    if (event.key === 'Shift') return true;
    const wasLeaving = leaving.current;
    leaving.current = event.key === 'Escape';
    if (leaving.current) setSaid(LEAVING);
    if (event.key === 'Tab' && !wasLeaving) {
      event.preventDefault();
      goOn(event.shiftKey ? -1 : 1);
    }
    return event.key === 'Escape' || event.key === 'Tab';
  }

  function onKeyDown(event: KeyboardEvent) {
    const chosen = place && clampPlace(place, size.current);
    const product = chosen && products[chosen.row];
    const column = chosen && columns[chosen.column];
    if (editing || !product || !column || event.defaultPrevented || onLeavingKey(event)) return;
    const action = gridAction(event, chosen, size.current);
    if (!action) return;
    const onBox = column.kind === 'use';
    // The box answers the space bar by itself.
    if (action.kind === 'toggle' && event.target instanceof HTMLInputElement) return;
    if (onBox && (action.kind === 'toggle' || (action.kind === 'edit' && action.text === undefined))) {
      event.preventDefault();
      toggle(product);
    } else if (action.kind === 'move') {
      event.preventDefault();
      goTo(action.to);
    } else if (isTyped(product, column)) {
      event.preventDefault();
      if (action.kind === 'clear' && column.choices) setSaid(NOT_CLEARED);
      else if (action.kind === 'clear') writeCell(product, column, '');
      else if (action.kind === 'edit') goTo(chosen, action.text === undefined ? {} : { text: action.text });
    } else {
      event.preventDefault();
      setSaid(notTypedInWords(product, column));
    }
  }

  /** The chosen cell is where the focus is, however it came there. */
  function onFocus({ target }: FocusEvent<HTMLElement>) {
    const cell = target.closest('td, th');
    const line = cell?.parentElement;
    if (!(cell instanceof HTMLTableCellElement) || !(line instanceof HTMLTableRowElement)) return;
    const at = { row: line.rowIndex - 1, column: cell.cellIndex };
    leaving.current = false;
    if (at.row < 0 || (at.row === place?.row && at.column === place.column)) return;
    setPlace(at);
    setSaid(undefined);
  }

  return { place: place && clampPlace(place, size.current), editing, said, actions, goTo, onKeyDown, onFocus };
}
