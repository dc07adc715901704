import { WORKBOOK_FORMAT, WORKBOOK_VERSION, type Workbook } from './workbook';

/** A workbook with nothing in it but its settings (prices in euro until the user says otherwise). */
export function emptyWorkbook(id: string, name: string): Workbook {
  return {
    format: WORKBOOK_FORMAT,
    version: WORKBOOK_VERSION,
    id,
    name,
    invented: false,
    products: [],
    orders: [],
    ownProperties: [],
    settings: { currency: 'EUR' },
  };
}
