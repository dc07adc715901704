import type { Dose, Limit, Order, ShareRule } from '../optimise/order';
import type { OwnProperty } from '../property/ownProperty';
import type { Family } from '../stock/family';
import type { Figure } from '../stock/figure';
import type { PriceStep, Stock } from '../stock/stock';

export const WORKBOOK_FORMAT = 'basewright-workbook';
export const WORKBOOK_VERSION = 1;

/** A delivery or tank of a product, with its certificate. Its figures replace the product's, one by one. */
export interface Lot {
  id: string;
  /** Lot number as the plant writes it. */
  name: string;
  /** Tank or place. */
  tank?: string;
  /** Certificate date, ISO 8601 (YYYY-MM-DD). */
  certificateDate?: string;
  availableTonnes?: number;
  /** Replaces the product's price where given. */
  pricePerTonne?: number;
  figures: Figure[];
}

/** A product the plant buys: typical figures and price, and its lots. */
export interface Product {
  id: string;
  name: string;
  supplier?: string;
  family: Family;
  /** Absent: not known yet; the product is then left out of every order, and the app says so. */
  pricePerTonne?: number;
  figures: Figure[];
  blendWeight?: number;
  leastDoseIfUsed?: number;
  greatestDose?: number;
  lotTonnes?: number;
  /** Prices that hold from so many tonnes in one batch on. */
  priceSteps?: PriceStep[];
  priceStepsFor?: Stock['priceStepsFor'];
  /** What using it costs a batch, whatever its share: flushing a line, opening a tank. */
  flushCost?: number;
  flags?: string[];
  lots: Lot[];
  note?: string;
  /**
   * Cells whose text could not be read as a number, kept as typed: key is the column ("pricePerTonne", "kv@40"),
   * value the text. The figure itself is unknown as long as the text stands.
   */
  unread?: Record<string, string>;
}

/** An order as the user keeps it. */
export interface WorkbookOrder {
  id: string;
  name: string;
  note?: string;
  /** Solve on typical figures of products, or on the lots on hand. */
  solveOn: 'products' | 'lots';
  /** Products not to be used here (the others are). */
  excludedProductIds: string[];
  limits: Limit[];
  /** `stockId` in doses and shares is a product id. */
  doses: Dose[];
  shares: ShareRule[];
  batchTonnes?: Order['batchTonnes'];
  mostStocks?: number;
  depressant: boolean;
  viscosityRule: NonNullable<Order['viscosityRule']>;
  costBasis: NonNullable<Order['costBasis']>;
  greatestDoseAsTheRest?: number;
  /** Tests that are not predicted; they stand in the acceptance table. */
  laboratoryOnly: string[];
}

export interface WorkbookSettings {
  /** ISO 4217 code of the workbook's prices. */
  currency: string;
}

/** Everything a user keeps, as one versioned JSON document. */
export interface Workbook {
  format: typeof WORKBOOK_FORMAT;
  version: typeof WORKBOOK_VERSION;
  id: string;
  name: string;
  /** True: the figures are invented (demo); shown wherever they are. */
  invented: boolean;
  products: Product[];
  orders: WorkbookOrder[];
  ownProperties: OwnProperty[];
  settings: WorkbookSettings;
}
