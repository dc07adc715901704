import type { SolvesAgain } from './solvesAgain';

/** Least difference of two weights that makes two lines cross at a place worth telling. */
const LEAST_SLOPE = 1e-9;
/** Each round finds another recipe of the envelope; more than a few are never met. */
const MOST_ROUNDS = 40;

export interface BreakEven {
  /** The price per tonne; absent: the recipe stands as far as was looked. */
  price?: number;
  proven: boolean;
}

/**
 * The price of one stock, going down or up from its present one with all others unchanged, at which the explained
 * recipe ceases to be the cheapest.
 *
 * The least cost is concave in a price whatever the rules of the order, and no recipe's line lies below it. From a far
 * price the recipe cheapest there has a line that crosses the explained recipe's line no nearer than the true place;
 * the crossing is the next price to solve at, and where nothing is cheaper there, it is the place (Newton's method on
 * the envelope, exact in finitely many steps). Recipes known already give the first crossing.
 *
 * @param farthest price to look up to.
 */
export async function breakEven(
  again: SolvesAgain,
  stockId: string,
  present: number,
  farthest: number,
): Promise<BreakEven> {
  const { line: own } = again;
  const weight = own.weight(stockId);
  const direction = farthest < present ? -1 : 1;
  const nearest = () => nearestCrossing(again, stockId, direction);
  let steps = nearest();
  let proven = again.proven;
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const isFarthest = steps === undefined || steps >= Math.abs(farthest - present);
    const price = isFarthest ? farthest : present + direction * (steps ?? 0);
    if (price === present) return { price, proven };
    const near = isFarthest ? undefined : again.kv100;
    const answer = await again.solveAtPrices(new Map([[stockId, price]]), near);
    proven &&= answer.proven;
    const stands = own.cost + weight * (price - present);
    if (answer.cost >= stands - Math.max(again.noiseAt(stands), again.noiseAt(own.cost))) {
      return isFarthest ? { proven } : { price, proven };
    }
    const next = nearest();
    if (next === undefined || (steps !== undefined && next >= steps)) return { price, proven: false };
    steps = next;
  }
  return { price: present + direction * (steps ?? 0), proven: false };
}

/**
 * The least way in price at which a known recipe becomes the cheaper one; undefined where none does. A recipe that costs
 * the same to within the noise counts once it is cheaper by more than that: where the viscosity index curves, recipes
 * change little by little with the price, and each is "cheapest" over a range that only the noise makes.
 */
function nearestCrossing(again: SolvesAgain, stockId: string, direction: -1 | 1): number | undefined {
  const { line: own, lines } = again;
  const noise = again.noiseAt(own.cost);
  let least: number | undefined;
  for (const line of lines) {
    const slope = direction * (own.weight(stockId) - line.weight(stockId));
    if (slope <= LEAST_SLOPE) continue;
    const dearer = line.cost - own.cost;
    const way = (dearer > noise ? dearer : Math.max(0, dearer + noise)) / slope;
    if (least === undefined || way < least) least = way;
  }
  return least;
}
