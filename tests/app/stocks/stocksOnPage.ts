import { screen, within } from '@testing-library/react';
import { useAnswers } from '../../../app/state/answerStore';
import { selectOrder } from '../../../app/state/viewStore';
import { openWorkbook, useWorkbook } from '../../../app/state/workbookStore';
import { emptyOrder, emptyWorkbook, type Figure, type Product, type Workbook } from '../../../src';

export const ORDER_ID = 'order-1';

/** An invented stock with a name and a price; figures as given. */
export function inventedStock(id: string, change: Partial<Product> = {}): Product {
  return { id, name: `Stock ${id}`, family: 'Group I', pricePerTonne: 900, figures: [], lots: [], ...change };
}

export function kv(celsius: number, value: number, origin: Figure['origin'] = 'typical'): Figure {
  return { property: 'kv', celsius, value, origin };
}

/** Puts a workbook with these stocks and one order on the page, without solver or storage. */
export function putStocksOnPage(products: Product[], change: Partial<Workbook> = {}): void {
  openWorkbook({
    ...emptyWorkbook('workbook-1', 'Test workbook'),
    products,
    orders: [emptyOrder(ORDER_ID, 'Hydraulic oil')],
    ...change,
  });
  useAnswers.setState({ answers: {} });
  selectOrder(ORDER_ID);
}

/** The stock as it is in the workbook now. */
export function stockOnPage(id: string): Product {
  const product = useWorkbook.getState().workbook.products.find((candidate) => candidate.id === id);
  if (!product) throw new Error(`There is no stock ${id}.`);
  return product;
}

export function figureOnPage(id: string, property: string, celsius?: number): Figure | undefined {
  return stockOnPage(id).figures.find((figure) => figure.property === property && figure.celsius === celsius);
}

const grid = () => screen.getByRole('grid', { name: 'Stocks' });

function columnAt(heading: string): number {
  const headings = within(grid()).getAllByRole('columnheader');
  const place = headings.findIndex((cell) => cell.firstChild?.textContent === heading);
  if (place < 0) throw new Error(`No column ${heading}: there are ${headings.map((h) => h.textContent).join(', ')}.`);
  return place;
}

/** The cell of a stock (by its row from 0) under a heading. */
export function cellAt(row: number, heading: string): HTMLElement {
  const line = within(grid()).getAllByRole('row')[row + 1];
  const cell = line?.children[columnAt(heading)];
  if (!(cell instanceof HTMLElement)) throw new Error(`No row ${row}.`);
  return cell;
}
