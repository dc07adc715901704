import { parseNumber } from '../parts/numberText';
import { ON_HAND_COLUMN } from './amountColumns';
import type { Column } from './column';
import { HEADING_NAMES } from './headingNames';
import { type Conversion, conversionOf, SAME } from './units';

/** The column that a heading means, and how to turn its unit into the column's; without one, it cannot be done. */
export interface Heading {
  column: Column;
  /** As it stands in the heading; empty: the column's own. */
  unit: string;
  conversion: Conversion | undefined;
}

/** Words in brackets that are no unit: how a figure was found, or which. */
const REMARK =
  /^((astm|iso|din|en|ip|d)\b.*\d.*|d ?\d+|coc|open cup|cleveland.*|neat|typical|typ\.?|measured|average)$/;

/** Words between a name and its unit that say nothing: "Sulphur content in %". */
const BETWEEN: ReadonlySet<string> = new Set(['content', 'in']);

/** "KV @ 40 °C [mm²/s]" → "kv 40" and, in brackets, "mm²/s". A temperature belongs to the name, wherever it stands. */
function takeApart(heading: string): { text: string; bracketed: string } {
  const units: string[] = [];
  const text = heading
    // "FlashPoint" is two words; "Price€/t" and "Flash°F" end in a unit.
    .replace(/(\p{Ll}\p{Ll})(?=\p{Lu}\p{Ll})/gu, '$1 ')
    .replace(/(\p{L})(?=[\p{Sc}°º˚])/gu, '$1 ')
    .toLowerCase()
    .replace(/[º˚]/g, '°')
    .replace(/(\d)\s*°?\s*c\b/g, '$1')
    .replace(/(@|\bat\b)\s*(?=\d)/g, ' ')
    .replace(/\[([^\]]*)\]|\(([^)]*)\)|\{([^}]*)\}/g, (_, ...inside: (string | undefined)[]) => {
      const [, unit = '', celsius = ''] = /^(.*?)(?:(?:^|\s+)(\d+))?$/.exec(inside.slice(0, 3).join('').trim()) ?? [];
      const whole = `${unit} ${celsius}`.trim();
      if (REMARK.test(whole)) return ' ';
      if (unit !== '') units.push(unit);
      return ` ${celsius} `;
    })
    .replace(/%/g, ' %')
    .replace(/\bper\b(?!\s*cent)/g, ' / ')
    .replace(/^(price|cost)\s*\//, '$1 / ');
  return { text, bracketed: units.join(' ') };
}

const plain = (text: string) =>
  text
    .replace(/[.,:;_/-]/g, ' ')
    .replace(/\s+/g, ' ')
    .trim();

function columnOfName(name: string, columns: readonly Column[]): Column | undefined {
  const known = HEADING_NAMES.find(([, names]) => names.includes(name))?.[0];
  return columns.find(
    ({ id, label, kind }) =>
      kind !== 'use' && kind !== 'share' && (id === known || plain(takeApart(label).text) === name),
  );
}

/** The column a heading means, or undefined. Its unit may stand in brackets or after the name. */
export function readHeading(heading: string, columns: readonly Column[]): Heading | undefined {
  const { text, bracketed } = takeApart(heading);
  const words = text.split(/[\s,;:_]+/).filter(Boolean);
  for (let named = words.length; named > 0; named -= 1) {
    const column = columnOfName(plain(words.slice(0, named).join(' ')), columns);
    const after = words
      .slice(named)
      .filter((word) => !BETWEEN.has(word))
      .join(' ');
    const found = column && !/^\d/.test(after) ? withUnit(column, after, bracketed, columns) : undefined;
    if (column) return found && { ...found, unit: asTyped(found.unit, heading) };
  }
  return undefined;
}

/** "°f" of "Flash (°F)" → "°F". */
function asTyped(unit: string, heading: string): string {
  const at = heading.toLowerCase().indexOf(unit);
  return at < 0 ? unit : heading.slice(at, at + unit.length);
}

function withUnit(column: Column, after: string, bracketed: string, columns: readonly Column[]): Heading | undefined {
  const unit = `${after} ${bracketed}`.trim();
  if (column.kind === 'number') {
    const conversion = conversionOf(unit, column.unit) ?? conversionOf(`${bracketed} ${after}`, column.unit);
    return { column, unit, conversion };
  }
  const inStock = unit === '' || column.id !== 'name' ? undefined : conversionOf(unit, ON_HAND_COLUMN.unit);
  const onHand = inStock && columns.find(({ id }) => id === ON_HAND_COLUMN.id);
  if (onHand) return { column: onHand, unit, conversion: inStock };
  return after === '' ? { column, unit: '', conversion: SAME } : undefined;
}

/** A first row that reads like headings: no numbers in it, and at least two (or all) of its cells are known columns. */
export function isHeadingRow(row: readonly string[], columns: readonly Column[]): boolean {
  const cells = row.filter((cell) => cell !== '');
  if (cells.length === 0 || cells.some((cell) => 'value' in parseNumber(cell))) return false;
  const known = cells.filter((cell) => readHeading(cell, columns)).length;
  return known >= 2 || known === cells.length;
}

/**
 * Headings with the units of a second row, where that row holds units; undefined: it does not. Such a row has no
 * number, no name of a stock, and at least one unit that its column can take.
 */
export function headingsWithUnits(
  head: readonly string[],
  row: readonly string[],
  columns: readonly Column[],
): string[] | undefined {
  let known = 0;
  for (const [place, text] of row.entries()) {
    if (text === '' || /^(-|units?)$/i.test(text)) continue;
    const column = readHeading(head[place] ?? '', columns)?.column;
    if ('value' in parseNumber(text) || (column && column.kind !== 'number')) return undefined;
    if (column && conversionOf(text.replace(/[[\]{}]/g, ''), column.unit)) known += 1;
  }
  if (known === 0) return undefined;
  return head.map((heading, place) => {
    const unit = row[place] ?? '';
    return unit === '' || readHeading(heading, columns)?.unit ? heading : `${heading} [${unit.replace(/[[\]]/g, '')}]`;
  });
}
