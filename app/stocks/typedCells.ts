import type { Product } from '../../src';
import type { Column } from './column';
import type { Place } from './gridKeys';

/** True where a text can go into the cell. */
export const isTyped = (product: Product, column: Column): boolean =>
  column.write !== undefined && !column.locked?.(product);

/** Why nothing can be typed into the cell, in words. */
export function notTypedInWords(product: Product, column: Column): string {
  if (column.kind === 'use') return 'Use: a box, which the space bar ticks and unticks. Nothing was typed.';
  return `${column.label}: calculated: cannot be typed. ${column.locked?.(product) ?? ''}`.trim();
}

/** The next (+1) or previous (-1) cell that can be typed in, over the ends of rows; undefined past the last one. */
export function nextTyped(
  { row, column }: Place,
  step: 1 | -1,
  products: readonly Product[],
  columns: readonly Column[],
): Place | undefined {
  const width = columns.length;
  for (let at = row * width + column + step; at >= 0 && at < products.length * width; at += step) {
    const place = { row: Math.floor(at / width), column: at % width };
    const product = products[place.row];
    const there = columns[place.column];
    if (product && there && isTyped(product, there)) return place;
  }
  return undefined;
}
