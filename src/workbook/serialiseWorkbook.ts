import type { Workbook } from './workbook';

/** What a reader of the file wants to see first; the rest follows by the alphabet. */
const FIRST = ['format', 'version', 'id', 'name', 'property', 'celsius', 'kind', 'stockId'];

function rank(key: string): number {
  const place = FIRST.indexOf(key);
  return place < 0 ? FIRST.length : place;
}

function byRank(a: string, b: string): number {
  return rank(a) - rank(b) || (a < b ? -1 : a > b ? 1 : 0);
}

function inOrder(_key: string, value: unknown): unknown {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value;
  return Object.fromEntries(Object.entries(value).sort(([a], [b]) => byRank(a, b)));
}

/** The workbook as a document: readable, and the same workbook always gives the same text. */
export function serialiseWorkbook(workbook: Workbook): string {
  return `${JSON.stringify(workbook, inOrder, 2)}\n`;
}
