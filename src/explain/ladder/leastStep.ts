import type { Finding } from './enquiry';

/** The least of some steps at which an order is possible. */
export interface LeastStep {
  step: number;
  /** The step before it is proven impossible (or there is none). */
  proven: boolean;
}

/**
 * Bisects between `below`, where the order is known to be impossible (or which is no step at all), and `possible`,
 * where a recipe is known. What a solve leaves unknown counts as impossible without proof.
 */
export async function leastStep(
  below: number,
  possible: number,
  isPossible: (step: number) => Promise<Finding>,
): Promise<LeastStep> {
  let [low, high, proven] = [below, possible, true];
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    const { state } = await isPossible(middle);
    if (state === 'possible') high = middle;
    else {
      low = middle;
      proven = state === 'impossible';
    }
  }
  return { step: high, proven };
}
