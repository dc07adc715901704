import type { OwnProperty } from '../property/ownProperty';
import type { ViscosityRule } from '../property/viscosityRule';
import type { Family } from '../stock/family';
import type { Stock } from '../stock/stock';

/**
 * A limit on a property of the mix, in the unit of the property table.
 * With neither `min`, `max` nor `below` it only carries an aim.
 */
export interface Limit {
  /** Property id, or 'vi' for the viscosity index. */
  property: string;
  /** Temperature [°C] where the property needs one. */
  celsius?: number;
  min?: number;
  max?: number;
  /** Strict upper limit: the mix stays one reporting unit inside. `true` makes the `max` beside it strict. */
  below?: number | boolean;
  /** Margin: the mix stays inside every stated end by this much, same unit. Default 0. */
  insideBy?: number;
  /** Value to come near to, beside the range. */
  aim?: number;
  /**
   * What a deviation of one reporting unit from `aim` may cost, currency per tonne. Default 1. Deviations are counted
   * along the property's blending index, at its slope at the aim, and at the mean weight of the stocks: exact for
   * properties that average by mass, to first order elsewhere.
   */
  aimWeight?: number;
}

/** What a dose or share is counted against. Base oil is everything but thickeners, packages and depressants. */
export type ShareBasis = 'mix' | 'base oil';

/**
 * The dose of one stock as a mass fraction [0..1]: exact, or a range. A dose with a positive `exactly` or `min`
 * is compulsory unless `required` is false; then the stock is absent or within the range.
 */
export interface Dose {
  stockId: string;
  exactly?: number;
  min?: number;
  max?: number;
  required?: boolean;
  /** Default 'mix'. */
  of?: ShareBasis;
  /**
   * 'tonnes': the numbers are tonnes in the batch, as for a stock to be used up or what the kettle still holds. Needs a
   * batch size; with a free one the least counts on the smallest batch, the most on the largest. Default 'share'.
   */
  unit?: 'share' | 'tonnes';
}

/** A set of stocks: the union of the named stocks, families and carriers of a flag. */
export interface StockSet {
  stockIds?: string[];
  families?: Family[];
  flag?: string;
}

/** Rules of a mix beyond its properties. Shares are mass fractions [0..1]. */
export type ShareRule =
  /** Least and greatest share of a set. */
  | { kind: 'share'; set: StockSet; min?: number; max?: number; of?: ShareBasis }
  /** Ratio of the share of one set to that of another. */
  | { kind: 'ratio'; set: StockSet; to: StockSet; min?: number; max?: number }
  /** At least / at most so many stocks of a set. */
  | { kind: 'count'; set: StockSet; min?: number; max?: number }
  /** A place in a formula: one stock of the set and no other, at a share within the range; none where `min` is 0 or absent. */
  | { kind: 'one of'; set: StockSet; min?: number; max?: number }
  /** Where this stock is used, none of that set is. */
  | { kind: 'excludes'; stockId: string; set: StockSet }
  /** Where this stock is used, at least one other of that set is. */
  | { kind: 'needs'; stockId: string; set: StockSet }
  /** Every stock in the mix carries the flag. */
  | { kind: 'flag'; flag: string };

/** An order as the engine sees it. Plain JSON data. */
export interface Order {
  stocks: Stock[];
  limits: Limit[];
  doses?: Dose[];
  shares?: ShareRule[];
  /** Batch size [t]: fixed, or free within a range (then the smallest decides what is short). Drums need a fixed one. */
  batchTonnes?: number | { min: number; max: number };
  /** Greatest number of stocks in the mix, compulsory ones included. */
  mostStocks?: number;
  /** A pour-point depressant is in use: pour-point limits read the figures "with depressant". */
  depressant?: boolean;
  /** Default 'wright' (ASTM D7152 Wright method). */
  viscosityRule?: ViscosityRule;
  /** What "cheapest" counts. Default 'tonne'. */
  costBasis?: 'tonne' | 'cubic metre';
  /** Properties of the user's own, with their blending rule. */
  ownProperties?: OwnProperty[];
  /** A stock whose figure is 'as the rest' may be used up to this mass fraction. Default 0.02. */
  greatestDoseAsTheRest?: number;
}
