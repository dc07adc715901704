import type { Figure, Product } from '../../src';
import type { DecimalSign } from '../parts/numberText';

/** What a cell shows. */
export interface CellView {
  text: string;
  /** What typing starts from. */
  edit: string;
  /** How far the figure may be trusted, where it is more (or less) than a plain number. */
  state?: 'soft' | 'in-blend' | 'rest' | 'unknown';
  /** More about the figure, in words. */
  title?: string;
  /** Why the cell cannot be right, and what to do. */
  problem?: string;
  /** What is unusual about it. */
  caution?: string;
}

/** A column of the stocks table. Reading and writing are pure; `write` changes the draft it is given. */
export interface Column {
  id: string;
  label: string;
  unit?: string;
  /** The heading in full: name, unit, test method. */
  title: string;
  kind: 'text' | 'number' | 'choice' | 'use' | 'share';
  /** The figure the column shows, where it shows one. */
  figure?: Pick<Figure, 'property' | 'celsius'>;
  choices?: readonly string[];
  /** The choice that a typed text means, `whole` where it is named in full; or why there is none. */
  choose?(text: string): { choice: string; whole: boolean } | { problem: string };
  read(product: Product): CellView;
  /**
   * Takes a text as typed or pasted, a number by the user's own decimal sign or the one given; an empty text clears
   * the cell. Absent: the column is calculated.
   */
  write?(product: Product, text: string, sign?: DecimalSign): void;
  /** Why this product's cell cannot be typed over, or nothing. */
  locked?(product: Product): string | undefined;
}

/** A cell's text that could not be read stands in `Product.unread`, under the column's id, until it is typed again. */
export function keepUnread(product: Product, columnId: string, text: string): void {
  product.unread = { ...product.unread, [columnId]: text };
}

export function dropUnread(product: Product, columnId: string): void {
  if (product.unread?.[columnId] === undefined) return;
  const { [columnId]: _gone, ...rest } = product.unread;
  if (Object.keys(rest).length > 0) product.unread = rest;
  else delete product.unread;
}
