import type { Product } from '../../src';
import { environment } from '../state/environment';
import { announce } from '../state/viewStore';
import { editWorkbook, useWorkbook } from '../state/workbookStore';
import type { Column } from './column';

const products = () => useWorkbook.getState().workbook.products;

function freeName(wanted: string): string {
  const taken = new Set(products().map(({ name }) => name));
  let name = wanted;
  for (let count = 2; taken.has(name); count += 1) name = `${wanted} ${count}`;
  return name;
}

export function emptyProduct(name: string): Product {
  return { id: environment().newId(), name, family: 'other', figures: [], lots: [] };
}

/** Puts a new stock after the others; returns its place. */
export function addStock(): number {
  const place = products().length;
  const product = emptyProduct(freeName('New stock'));
  editWorkbook('new stock', (draft) => {
    draft.products.push(product);
  });
  return place;
}

/** A copy right after the stock, without its lots: the same tonnes are not there twice. Returns its place. */
export function duplicateStock(id: string): number | undefined {
  const place = products().findIndex((product) => product.id === id);
  const original = products()[place];
  if (!original) return undefined;
  const name = freeName(`${original.name}, copy`);
  const copy: Product = { ...structuredClone(original), id: environment().newId(), name, lots: [] };
  editWorkbook(`copy of ${original.name}`, (draft) => {
    draft.products.splice(place + 1, 0, copy);
  });
  announce(`${name} added, without the quantity on hand.`);
  return place + 1;
}

export function editProduct(id: string, label: string, change: (product: Product) => void, join?: string): void {
  editWorkbook(
    label,
    (draft) => {
      const product = draft.products.find((candidate) => candidate.id === id);
      if (product) change(product);
    },
    join === undefined ? {} : { join },
  );
}

/** Writes a text into a cell, where the cell can be typed over. */
export function writeCell(product: Product, column: Column, text: string, join?: string): void {
  const { write } = column;
  if (!write || column.locked?.(product)) return;
  editProduct(product.id, `${column.label} of ${product.name || 'a stock'}`, (draft) => write(draft, text), join);
}

/** Lets the order use a stock, or keeps it out. */
export function setUse(orderId: string, product: Product, use: boolean): void {
  editWorkbook(`${use ? 'use' : 'keep out'} ${product.name}`, (draft) => {
    const order = draft.orders.find(({ id }) => id === orderId);
    if (!order) return;
    order.excludedProductIds = order.excludedProductIds.filter((id) => id !== product.id);
    if (!use) order.excludedProductIds.push(product.id);
  });
}
