import type { Product } from '../../src';
import { commonSign, type DecimalSign } from '../parts/numberText';
import { editWorkbook } from '../state/workbookStore';
import type { Column } from './column';
import { columnOfHeading, isHeadingRow } from './headings';
import { readFamily } from './readFamily';
import { emptyProduct } from './stockEdits';

/** A block about to be pasted: the column each of its columns goes to, and the place of the first row. */
export interface PastePlan {
  rows: readonly (readonly string[])[];
  /** Left to right; undefined: left out. */
  columns: readonly (Column | undefined)[];
  /** Row of the table that the first row goes to. */
  firstRow: number;
  /** Headings of columns that are left out: not known, or the second of their kind. */
  leftOut: string[];
}

/** Where a pasted block goes: by its headings, else into the columns from `at.column` on, as in any spreadsheet. */
export function planPaste(
  block: readonly (readonly string[])[],
  columns: readonly Column[],
  at: { row: number; column: number },
): PastePlan {
  const width = Math.max(...block.map((row) => row.length));
  const [head = [], ...body] = block;
  if (isHeadingRow(head, columns)) {
    const found = Array.from({ length: width }, (_, place) => columnOfHeading(head[place] ?? '', columns));
    const targets = found.map((target, place) => (found.indexOf(target) === place ? target : undefined));
    const leftOut = head.filter((heading, place) => heading !== '' && !targets[place]);
    return { rows: body, columns: targets, firstRow: at.row, leftOut };
  }
  const targets = columns.filter(({ kind }) => kind !== 'use' && kind !== 'share');
  const chosen = columns[at.column];
  const start = chosen ? Math.max(0, targets.indexOf(chosen)) : 0;
  return {
    rows: block,
    columns: Array.from({ length: width }, (_, place) => targets[start + place]),
    firstRow: at.row,
    leftOut: [],
  };
}

/** What became of a pasted block. */
export interface Pasted {
  changed: number;
  added: number;
  /** Cells whose text is no number; they stand as pasted. */
  unread: number;
  /** Texts that are no family known here. */
  strangeFamilies: string[];
  /** Labels of columns where a cell is calculated or locked: nothing went into it. */
  locked: string[];
  /** Headings left out, and the number of columns that had no place at the right. */
  leftOut: string[];
  beyond: number;
}

/** Puts the block into the table as one step, adding stocks as needed. Text that is no number is kept as pasted. */
export function paste({ rows, columns, firstRow, leftOut }: PastePlan): Pasted {
  const beyond = leftOut.length > 0 ? 0 : columns.filter((column) => !column).length;
  const result: Pasted = { changed: 0, added: 0, unread: 0, strangeFamilies: [], locked: [], leftOut, beyond };
  const sign = commonSign(rows.flatMap((cells) => cells.filter((_, place) => columns[place]?.kind === 'number')));
  editWorkbook('paste', (draft) => {
    for (const [offset, cells] of rows.entries()) {
      const place = firstRow + offset;
      const there = draft.products[place];
      const product = there ?? emptyProduct(`Stock ${draft.products.length + 1}`);
      fillRow(product, cells, columns, sign, result);
      if (!there) draft.products.push(product);
      result[there ? 'changed' : 'added'] += 1;
    }
  });
  return result;
}

/** The viscosity index goes last: whether it may be typed depends on the viscosities beside it. */
function inOrderOfWriting(columns: readonly (Column | undefined)[]): [number, Column][] {
  const placed = columns.flatMap((column, place): [number, Column][] => (column ? [[place, column]] : []));
  return placed.sort(([, a], [, b]) => Number(a.id === 'vi') - Number(b.id === 'vi'));
}

function fillRow(
  product: Product,
  cells: readonly string[],
  columns: readonly (Column | undefined)[],
  sign: DecimalSign | undefined,
  result: Pasted,
): void {
  for (const [place, column] of inOrderOfWriting(columns)) {
    const text = blankWords(cells[place] ?? '', column);
    if (cells[place] === undefined || (text === '' && (column.id === 'name' || column.id === 'family'))) continue;
    if (!column.write || column.locked?.(product)) {
      if (text !== '' && !result.locked.includes(column.label)) result.locked.push(column.label);
      continue;
    }
    column.write(product, text, sign);
    if (product.unread?.[column.id] !== undefined) result.unread += 1;
    if (column.id === 'family' && !readFamily(text)) result.strangeFamilies.push(text);
  }
}

/** A dash or "n/a" in a column of numbers says unknown. */
function blankWords(text: string, { kind }: Column): string {
  return kind === 'number' && /^([-–—]|n\.? ?[/.]? ?a\.?|unknown|\?)$/i.test(text) ? '' : text;
}

const count = (n: number, one: string, more = `${one}s`) => `${n} ${n === 1 ? one : more}`;
const named = (texts: readonly string[]) => [...new Set(texts)].map((text) => `“${text}”`).join(', ');

export function pastedInWords(pasted: Pasted): string {
  const { changed, added, unread, strangeFamilies, locked, leftOut, beyond } = pasted;
  const done = [added && `${count(added, 'stock')} added`, changed && `${count(changed, 'stock')} changed`];
  const sentences = [
    [...done, unread && `${count(unread, 'cell')} could not be read`].filter(Boolean).join(', '),
    leftOut.length > 0 && `Left out, not a column here or twice: ${named(leftOut)}`,
    beyond > 0 && `Left out, no column at the right: ${count(beyond, 'pasted column')}`,
    strangeFamilies.length > 0 &&
      `Taken as “other”, not a family here: ${count(strangeFamilies.length, 'stock')} with ${named(strangeFamilies)}`,
    locked.length > 0 && `Not taken where calculated here: ${locked.join(', ')}`,
  ];
  return `${sentences.filter(Boolean).join('. ')}. Undo takes it back.`;
}
