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
import { endEdit } from '../state/workbookStore';
import type { Column } from './column';
import { clampPlace, type GridSize, gridAction, type Place } from './gridKeys';
import { writeCell } from './stockEdits';

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
}

const STEPS = { down: [1, 0], up: [-1, 0], right: [0, 1], left: [0, -1] } as const;

const isTyped = (product: Product, column: Column) => column.write !== undefined && !column.locked?.(product);

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
  const size = useRef<GridSize>({ rows: 0, columns: 0 });
  size.current = { rows: products.length, columns: columns.length };

  const goTo = useCallback((to: Place, edit?: Editing) => {
    // A row just added is not on the page yet, so the place is held to the table's size only when it is shown.
    setPlace(to);
    setEditing(edit);
    setFocusWanted((count) => count + 1);
  }, []);

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
        const [down, right] = STEPS[move];
        setEditing(undefined);
        setPlace((old) => old && clampPlace({ row: old.row + down, column: old.column + right }, size.current));
        setFocusWanted((count) => count + 1);
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
    };
  }, [goTo]);

  function onKeyDown(event: KeyboardEvent) {
    const chosen = place && clampPlace(place, size.current);
    const product = chosen && products[chosen.row];
    const column = chosen && columns[chosen.column];
    if (editing || !product || !column || event.defaultPrevented) return;
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
      if (action.kind === 'clear') writeCell(product, column, '');
      else if (action.kind === 'edit')
        goTo(chosen, action.text === undefined || column.choices ? {} : { text: action.text });
    }
  }

  /** The chosen cell is where the focus is, however it came there. */
  function onFocus({ target }: FocusEvent<HTMLElement>) {
    const cell = target.closest('td, th');
    const line = cell?.parentElement;
    if (!(cell instanceof HTMLTableCellElement) || !(line instanceof HTMLTableRowElement)) return;
    const at = { row: line.rowIndex - 1, column: cell.cellIndex };
    if (at.row >= 0 && (at.row !== place?.row || at.column !== place.column)) setPlace(at);
  }

  return { place: place && clampPlace(place, size.current), editing, actions, goTo, onKeyDown, onFocus };
}
