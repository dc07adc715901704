import type { BlendingIndex } from '../../property/blendingIndex';
import type { Stock } from '../../stock/stock';
import type { LinearRow } from '../linear/linearEngine';

/** Where a row comes from, so that an answer can be told in the user's terms. */
export type RowSource =
  | { kind: 'sum' }
  | { kind: 'limit'; limit: number; end: 'min' | 'max' | 'aim' }
  | { kind: 'dose'; dose: number }
  | { kind: 'share'; share: number }
  | { kind: 'most stocks' }
  /** A stock's share is the sum over the stretches of its price, of which one at most is used. */
  | { kind: 'price step' }
  /** share ≤ greatest · presence; share ≥ least · presence. */
  | { kind: 'presence'; stock: number; end: 'least' | 'most' };

/** A linear row over the structural columns. */
export interface ModelRow extends LinearRow {
  source: RowSource;
}

/** A share (of a stock, or of a stretch of its price) that is absent or at least `least`: the column of the share, and that
 * of the binary, which may cost something. */
export interface Presence {
  stock: number;
  column: number;
  least: number;
}

/** A stock charged in whole drums: share of one drum in the batch. */
export interface WholeLots {
  stock: number;
  share: number;
}

/** Limits on the viscosity index, and what the mix's viscosities are made of (see search/viCurve.ts). */
export interface ViLimits {
  index: BlendingIndex;
  /** Weight of each stock; zero where it takes the value of the rest. */
  weights: Float64Array;
  index40: Float64Array;
  index100: Float64Array;
  /** Greatest "VI at least" and least "VI at most", with the limits they come from. */
  min?: { value: number; limit: number };
  max?: { value: number; limit: number };
  /** KV100 the mix can have [mm²/s]: from its stocks, its limits and D2270's lower end. */
  kv100: { from: number; to: number };
}

/**
 * An order as columns and rows. Columns: the shares of the stocks (mass fractions), then presences (0/1) and the
 * stretches of stepped prices (mass fractions), then deviations from aims (reporting units). Everything is linear but the presences, whole drums and the viscosity index.
 */
export interface SearchModel {
  stocks: Stock[];
  cost: Float64Array;
  /** Prices of the stocks, steps included: what a gap near a cost of nothing is counted on. */
  prices: readonly number[];
  lower: Float64Array;
  upper: Float64Array;
  rows: ModelRow[];
  presences: Presence[];
  wholeLots: WholeLots[];
  /** What the relative gap is counted on, where the cost itself is a difference around zero (cost per m³). */
  gapReference?: number;
  vi?: ViLimits;
}
