import type { Product } from '../../src';
import { commonSign, type DecimalSign, exactText, parseNumber } from '../parts/numberText';
import { editWorkbook } from '../state/workbookStore';
import type { Column } from './column';
import type { PastePlan, PasteTarget } from './planPaste';
import { readFamily } from './readFamily';
import { emptyProduct } from './stockEdits';
import { converted } from './units';

/** What became of a pasted block. */
export interface Pasted {
  changed: number;
  added: number;
  /** Cells whose text is no number; they stand as pasted. */
  unread: number;
  /** "Price from €/kg to EUR/t": the columns whose numbers were turned into another unit. */
  conversions: string[];
  /** Texts that are no family known here. */
  strangeFamilies: string[];
  /** Labels of columns where a cell is calculated or locked: nothing went into it. */
  locked: string[];
  /** Headings left out, for their names and for their units, and the number of columns that had no place at the right. */
  leftOut: string[];
  strangeUnits: string[];
  beyond: number;
}

/** Puts the block into the table as one step, adding stocks as needed. Text that is no number is kept as pasted. */
export function paste({ rows, targets, firstRow, leftOut, strangeUnits }: PastePlan): Pasted {
  const hasHeadingsLeft = leftOut.length + strangeUnits.length > 0;
  const result: Pasted = {
    changed: 0,
    added: 0,
    unread: 0,
    conversions: targets.flatMap((target) =>
      target?.from ? [`${target.column.label} from ${target.from.unit} to ${target.column.unit}`] : [],
    ),
    strangeFamilies: [],
    locked: [],
    leftOut,
    strangeUnits,
    beyond: hasHeadingsLeft ? 0 : targets.filter((target) => !target).length,
  };
  const isNumber = (place: number) => targets[place]?.column.kind === 'number';
  const sign = commonSign(rows.flatMap((cells) => cells.filter((_, place) => isNumber(place))));
  editWorkbook('paste', (draft) => {
    for (const [offset, cells] of rows.entries()) {
      const place = firstRow + offset;
      const there = draft.products[place];
      const product = there ?? emptyProduct(`Stock ${draft.products.length + 1}`);
      fillRow(product, cells, targets, sign, result);
      if (!there) draft.products.push(product);
      result[there ? 'changed' : 'added'] += 1;
    }
  });
  return result;
}

/** The viscosity index goes last: whether it may be typed depends on the viscosities beside it. */
function inOrderOfWriting(targets: readonly (PasteTarget | undefined)[]): [number, PasteTarget][] {
  const placed = targets.flatMap((target, place): [number, PasteTarget][] => (target ? [[place, target]] : []));
  return placed.sort(([, a], [, b]) => Number(a.column.id === 'vi') - Number(b.column.id === 'vi'));
}

function fillRow(
  product: Product,
  cells: readonly string[],
  targets: readonly (PasteTarget | undefined)[],
  sign: DecimalSign | undefined,
  result: Pasted,
): void {
  for (const [place, target] of inOrderOfWriting(targets)) {
    const { column } = target;
    const text = blankWords(cells[place] ?? '', column);
    if (cells[place] === undefined || (text === '' && (column.id === 'name' || column.id === 'family'))) continue;
    if (!column.write || column.locked?.(product)) {
      if (text !== '' && !result.locked.includes(column.label)) result.locked.push(column.label);
      continue;
    }
    column.write(product, inColumnUnit(text, target, sign), sign);
    if (product.unread?.[column.id] !== undefined) result.unread += 1;
    if (column.id === 'family' && !readFamily(text)) result.strangeFamilies.push(text);
  }
}

/** A cell's text in the unit of its column. A number that cannot be read keeps its unit beside it. */
function inColumnUnit(text: string, { from }: PasteTarget, sign: DecimalSign | undefined): string {
  if (!from) return text;
  const parsed = parseNumber(text, sign);
  if ('value' in parsed) return exactText(converted(parsed.value, from.conversion), sign);
  return /\d/.test(text) ? `${text} ${from.unit}` : text;
}

/** A dash or "n/a" in a column of numbers says unknown. */
function blankWords(text: string, { kind }: Column): string {
  return kind === 'number' && /^([-–—]|n\.? ?[/.]? ?a\.?|unknown|\?)$/i.test(text) ? '' : text;
}
