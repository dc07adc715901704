import type { Family } from './family';
import type { Figure } from './figure';

/** A price that holds from a quantity on. */
export interface PriceStep {
  fromTonnes: number;
  pricePerTonne: number;
}

/** A stock as the engine sees it: one product or one lot. Plain JSON data. */
export interface Stock {
  id: string;
  name: string;
  family: Family;
  /** Price per tonne, in the workbook's currency. May be zero or (disposal) negative. */
  pricePerTonne: number;
  figures: Figure[];
  /** Weight of the stock in viscosity blending, fitted to trial blends [-]. Default 1. */
  blendWeight?: number;
  /** Smallest mass fraction the plant can meter: absent, or at least this much [0..1]. */
  leastDoseIfUsed?: number;
  /** Greatest mass fraction in a mix [0..1]. */
  greatestDose?: number;
  /** Quantity on hand [t]. Absent: not limited. */
  availableTonnes?: number;
  /** Size of one whole drum or tote [t]: with a fixed batch the stock is charged in whole ones. */
  lotTonnes?: number;
  /** Prices that hold from so many tonnes in one batch on, beside `pricePerTonne` below them. Need a fixed batch. */
  priceSteps?: PriceStep[];
  /** Whether a step's price holds for all tonnes, or for those beyond the step. Default 'all tonnes'. */
  priceStepsFor?: 'all tonnes' | 'the excess';
  /** What using the stock costs a batch whatever its share: flushing a line, opening a tank [currency]. Needs a fixed batch. */
  flushCost?: number;
  /** Flags such as "food contact" or "no zinc" that an order may ask every stock to carry. */
  flags?: string[];
}

/** A recipe line. */
export interface RecipeLine {
  stockId: string;
  /** Share of the mix by mass [0..1]. */
  massFraction: number;
}

export type Recipe = RecipeLine[];
