import type { PredictedProperties } from '../blend/predictedProperties';
import type { Recipe } from '../stock/stock';

/** Why the search ended. */
export type Stopped = 'finished' | 'time limit' | 'cancelled' | 'refused' | 'engine failed';

/** What is proven, apart from why the search ended and from whether there is a recipe. */
export interface Proof {
  /**
   * - `least cost`: no recipe under these figures and rules costs less, to the relative gap asked for.
   * - `within gap`: the recipe costs at most `gap` (relative) more than the cheapest.
   * - `impossible`: no mix of the stocks meets the order.
   * - `impossible with known figures`: the same, but stocks were left out for unknown figures.
   * - `none`: nothing is proven.
   */
  kind: 'least cost' | 'within gap' | 'impossible' | 'impossible with known figures' | 'none';
  /** Proven lower bound of `objective`, currency per tonne, or per m³ where the order says so. */
  lowerBound?: number;
  /** (cost - lowerBound) / |cost| [-]; near a cost of zero, on a thousandth of the greatest price. */
  gap?: number;
}

/** One limit held against the recipe, in the unit of the property table. */
export interface LimitCheck {
  /** Place of the limit in `order.limits`. */
  limit: number;
  property: string;
  celsius?: number;
  /** Ends as the search used them: strictness and margin applied. */
  min?: number;
  max?: number;
  value: number;
  /** Distance to the nearer end, positive inside, negative outside. Absent for a limit without ends. */
  room?: number;
  passes: boolean;
  /** The mix sits on the limit (within a thousandth of a reporting unit). */
  onLimit: boolean;
}

/** A stock that the search did not use, and why. */
export interface LeftOut {
  stockId: string;
  name: string;
  reason: 'unknown figure' | 'missing flag' | 'figure out of range';
  /** The figure that is missing or cannot be used. */
  property?: string;
  celsius?: number;
  /** The sentence for the user: what is wrong and what to do. */
  message: string;
}

/** Something in the order (or a required stock) that makes the question invalid. */
export interface OrderProblem {
  /** Where it stands, as a path into the order: ['limits', 2, 'min'], ['stocks', 'pao-4', 'kv@40'], ... */
  path: (string | number)[];
  /** What is wrong, and what to do about it. */
  message: string;
}

/** A warning that belongs to the recipe: pass or fail depends on the blending rule, an assumption was used, ... */
export interface Caution {
  kind: 'trial blend' | 'as the rest' | 'mixed methods' | 'model' | 'estimate';
  message: string;
}

/**
 * The answer to an order. Three separate facts: why the search stopped, whether there is a recipe (then all of
 * `recipe`, `costPerTonne`, `properties` are there, else none), and what is proven.
 */
export interface BlendOutcome {
  stopped: Stopped;
  proof: Proof;
  recipe?: Recipe;
  costPerTonne?: number;
  /** What the search made least: the cost, in the order's cost basis, and what deviations from aims count. */
  objective?: number;
  /** Cost per m³ at 15 °C of the mix, where the densities are known. */
  costPerCubicMetre?: number;
  properties?: PredictedProperties;
  checks: LimitCheck[];
  leftOut: LeftOut[];
  cautions: Caution[];
  /** Not empty exactly when `stopped` is 'refused' or 'engine failed'. */
  problems: OrderProblem[];
  /** For an impossible order: places in `order.limits` that the proofs of impossibility lean on. */
  conflict?: number[];
  /** For an impossible order: doses, rules and bounds that the proofs lean on, in words. */
  conflictRules?: string[];
  work: { nodes: number; linearPrograms: number; milliseconds: number };
}

/** Told from time to time during a long search. */
export interface SolveProgress {
  milliseconds: number;
  nodes: number;
  /** Cost per tonne of the best recipe so far, if any. Not told for a cost per m³, which takes several searches. */
  bestCost?: number;
  /** Proven lower bound so far of the cost with what deviations from aims count, per tonne. */
  lowerBound?: number;
}
