import type { Column } from './column';
import { headingsWithUnits, isHeadingRow, readHeading } from './headings';
import { type Conversion, isSame } from './units';

/** The column of the table that a pasted column goes to. */
export interface PasteTarget {
  column: Column;
  /** Where the heading names another unit. */
  from?: { unit: string; conversion: Conversion };
}

/** A block about to be pasted: where each of its columns goes, and the place of the first row. */
export interface PastePlan {
  rows: readonly (readonly string[])[];
  /** Left to right; undefined: left out. */
  targets: readonly (PasteTarget | undefined)[];
  /** Row of the table that the first row goes to. */
  firstRow: number;
  /** Headings of columns that are left out: not known, or the second of their kind. */
  leftOut: string[];
  /** Headings left out for their unit, each with the unit that is needed. */
  strangeUnits: string[];
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
    const united = headingsWithUnits(head, body[0] ?? [], columns);
    const rows = united ? body.slice(1) : body;
    return { rows, firstRow: at.row, ...targetsOf(united ?? head, width, columns) };
  }
  const places = columns.filter(({ kind }) => kind !== 'use' && kind !== 'share');
  const chosen = columns[at.column];
  const start = chosen ? Math.max(0, places.indexOf(chosen)) : 0;
  const targets = Array.from({ length: width }, (_, place) => {
    const column = places[start + place];
    return column && { column };
  });
  return { rows: block, targets, firstRow: at.row, leftOut: [], strangeUnits: [] };
}

function targetsOf(
  head: readonly string[],
  width: number,
  columns: readonly Column[],
): Pick<PastePlan, 'targets' | 'leftOut' | 'strangeUnits'> {
  const leftOut: string[] = [];
  const strangeUnits: string[] = [];
  const taken = new Set<Column>();
  const targets = Array.from({ length: width }, (_, place): PasteTarget | undefined => {
    const heading = head[place] ?? '';
    const found = readHeading(heading, columns);
    if (!found || taken.has(found.column)) {
      if (heading !== '') leftOut.push(heading);
      return undefined;
    }
    const { column, unit, conversion } = found;
    if (!conversion) {
      strangeUnits.push(`“${heading}” (needed: ${column.unit ?? 'no unit'})`);
      return undefined;
    }
    taken.add(column);
    return { column, ...(!isSame(conversion) && { from: { unit, conversion } }) };
  });
  return { targets, leftOut, strangeUnits };
}
