/** One predicted property of a mix. */
export interface PredictedProperty {
  /** Property id, or 'vi'. */
  property: string;
  celsius?: number;
  /** Value in the unit of the property table. Absent: unknown, and `unknownFrom` says why. */
  value?: number;
  /** Stocks in the mix without the figure. */
  unknownFrom: string[];
  /** Stocks that took the value of the rest of the mix. */
  asTheRest: string[];
  /** Stocks whose figure was estimated (e.g. KV40 from KV100 and VI). */
  estimatedFrom: string[];
}

/** What the other blending rules say of one viscosity (or of the VI that follows). */
export interface RuleSpread {
  property: 'kv' | 'vi';
  celsius?: number;
  /** Value under each rule; absent where the rule cannot be applied. */
  byRule: { rule: string; value?: number }[];
}

/** Prediction for a recipe. */
export interface PredictedProperties {
  properties: PredictedProperty[];
  /** Shares by volume at 15 °C, in the order of the recipe; absent where a density is unknown. */
  volumeFractions?: number[];
  spread: RuleSpread[];
}
