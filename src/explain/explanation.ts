/**
 * What an answer means. Everything here is found by solving the order again with one thing changed, so that it holds
 * whatever rules the order has; `proven` says that every solve it rests on was proven.
 */

/**
 * What one end of a limit costs, and over what range that price holds. Costs are those of `objective` of the outcome:
 * per tonne, or per m³ where the order counts cost so. Margin and strictness of the limit stay as they are.
 */
export interface LimitPrice {
  /** Place in `order.limits`, and the end. */
  limit: number;
  end: 'min' | 'max';
  /** The end as stated, in the property's unit. */
  stated: number;
  /** By how much it was moved for the figures below [property's unit]; positive. */
  step: number;
  /** Cost per tonne saved by loosening the end by `step`: zero or more. */
  looserSaves: number;
  /** Cost per tonne added by tightening it by `step`; absent where that is impossible. */
  tighterCosts?: number;
  /** Loosest end, a whole number of steps away, up to which the saving is this price times the steps, within a twentieth. */
  holdsTo?: number;
  /** What the order costs less with the end taken away altogether, per tonne. */
  withoutSaves: number;
  proven: boolean;
}

/** A stock that is not used: the price at which it would come in. Its price steps, if any, move along with the price. */
export interface EntryPrice {
  stockId: string;
  pricePerTonne: number;
  /**
   * At or above this price per tonne it stays out; below, it is used. Absent: not even at a price of zero (where prices
   * are zero or negative: not even as far below the lowest as the greatest is from zero).
   */
  entersBelow?: number;
  proven: boolean;
}

/**
 * A stock that is used: the prices at which the recipe stands, and what its loss would cost. Its price steps, if any,
 * move along with the price.
 */
export interface UsedStock {
  stockId: string;
  pricePerTonne: number;
  massFraction: number;
  /**
   * Between these prices per tonne, others unchanged, the recipe stays the cheapest. Absent: it stays so as far as was
   * looked, down to a price of zero (see `EntryPrice.entersBelow`) and up to ten times the greatest price of a stock.
   */
  standsFrom?: number;
  standsTo?: number;
  /** Cost per tonne without the stock, less the cost with it. Absent: impossible without it, or not proven. */
  lossCosts?: number;
  impossibleWithout: boolean;
  proven: boolean;
}

export interface Explanation {
  limits: LimitPrice[];
  entries: EntryPrice[];
  used: UsedStock[];
  /** Why it ended: all done, or before some of it was. What is listed is done. */
  stopped: 'finished' | 'time limit' | 'cancelled' | 'engine failed';
  solves: number;
}

/** A thing that an order asks for: one end of a limit, or a rule. */
export type Demand =
  | { kind: 'limit'; limit: number; end: 'min' | 'max' }
  | { kind: 'dose'; dose: number }
  | { kind: 'share'; share: number }
  | { kind: 'most stocks' }
  | { kind: 'amount on hand'; stockId: string }
  | { kind: 'greatest dose'; stockId: string }
  | { kind: 'least dose'; stockId: string }
  | { kind: 'whole drums'; stockId: string };

/** What can be reached in one limit with everything else kept. */
export interface WithinReach {
  limit: number;
  end: 'min' | 'max';
  stated: number;
  /**
   * The nearest multiple of the reporting unit that can be met, in the property's unit: a recipe meets it, and one step
   * nearer none does. Absent: moving this end alone does not help (or, where not proven, that is not known).
   */
  reachable?: number;
  /** How close that is certified: one reporting unit [property's unit]. */
  step: number;
  /** Cost per tonne of the cheapest recipe at `reachable`. */
  costPerTonne?: number;
  proven: boolean;
}

/** Why an order is impossible, and the nearest that is possible. */
export interface Ladder {
  /** A smallest set of demands that cannot hold together: without any one of them the rest of the set can. */
  conflict: Demand[];
  /** False where time ran out: the set cannot hold together, but may not be smallest. */
  conflictProven: boolean;
  /** Where `conflict` is empty: why, in sentences. `no mix at all`: impossible even without any demand. */
  noConflict?: { why: 'possible' | 'refused' | 'not proven' | 'no mix at all'; messages: string[] };
  /** Every stated end, those of the conflict first: how far moving it alone must go to make the order possible. */
  reach: WithinReach[];
  /** Ways to change limits so that the order becomes possible, the cheapest in weighted reporting units first. */
  relaxations: Relaxation[];
  /**
   * No change of limits, by whole reporting units, takes less effort than this: proven. Where several limits may move
   * it comes within a twentieth of the first relaxation's effort if that is the cheapest and solves and time suffice.
   */
  leastEffort?: number;
  stopped: 'finished' | 'time limit' | 'cancelled';
  solves: number;
}

/** New ends for some limits that make the order possible. */
export interface Relaxation {
  changes: { limit: number; end: 'min' | 'max'; stated: number; to: number }[];
  /** Sum of changes in reporting units, each by its weight. */
  effort: number;
  costPerTonne: number;
  proven: boolean;
}

/** Another recipe that lacks at least one stock of every cheaper one. */
export interface Alternative {
  recipe: { stockId: string; massFraction: number }[];
  costPerTonne: number;
  /** Cost above the cheapest, per tonne. */
  dearerBy: number;
  /** Stocks of the cheapest recipe it does without, and those it uses in their place. */
  without: string[];
  instead: string[];
  proven: boolean;
}

/** A recipe in amounts that can be weighed. */
export interface RoundedRecipe {
  recipe: { stockId: string; massFraction: number }[];
  /** Step of the shares [mass fraction]. */
  step: number;
  costPerTonne: number;
  /** Cost of rounding, per tonne. */
  roundingCosts: number;
  /** No recipe in these steps is cheaper. */
  proven: boolean;
}
