import type { Stock } from '../../stock/stock';
import type { EntryPrice } from '../explanation';
import { type BreakEven, breakEven } from './breakEven';
import { guessEntryPrices } from './entryGuess';
import { lowestPrice } from './farPrices';
import type { SolvesAgain } from './solvesAgain';

/** Below a guess by this part of it a stock is looked for in the recipe. */
const ASIDE = 0.005;

/**
 * For each stock that could be used and is not: the price below which it would be.
 *
 * Guesses are asked all together first. Where nothing is cheaper with every unused stock at its guess, none comes in at
 * its own guess (the least cost never falls with a price); the recipe cheapest just below it then shows whether the
 * stock does come in there. Elsewhere that recipe is where the search from below begins.
 */
export async function* entryPrices(again: SolvesAgain): AsyncGenerator<EntryPrice> {
  const unused = unusedStocks(again);
  const lowest = lowestPrice(again.order);
  const guesses = new Map<string, number>();
  for (const [id, guess] of guessEntryPrices(again)) guesses.set(id, Math.max(lowest, guess));
  const staysOut =
    unused.length > 0 && unused.every(({ id }) => guesses.has(id)) && (await again.staysCheapest(guesses));
  for (const { id, pricePerTonne } of unused) {
    const guess = guesses.get(id);
    const isNever = staysOut && guess === lowest;
    const found: BreakEven = isNever
      ? { proven: again.proven }
      : ((await confirmed(again, id, guess, staysOut)) ?? (await breakEven(again, id, pricePerTonne, lowest)));
    yield {
      stockId: id,
      pricePerTonne,
      ...(found.price === undefined ? {} : { entersBelow: Math.min(found.price, pricePerTonne) }),
      proven: found.proven,
    };
  }
}

/**
 * Solves just below a guess. Where the recipe's line crosses the present cost the stock comes in below, surely; where
 * nothing is cheaper at the guess and the two lie together to the noise, the least cost, being concave, leaves no more.
 */
async function confirmed(
  again: SolvesAgain,
  id: string,
  guess: number | undefined,
  staysOut: boolean,
): Promise<BreakEven | undefined> {
  const present = again.presentPrice(id);
  if (guess === undefined || guess <= lowestPrice(again.order) || guess > present) return undefined;
  const known = again.lines.length;
  const { proven } = await again.solveAtPrices(new Map([[id, guess - ASIDE * Math.abs(guess)]]));
  const line = again.lines[known];
  const weight = line?.weight(id) ?? 0;
  if (!staysOut || !proven || weight <= 0) return undefined;
  const price = present - (line.cost - again.cost) / weight;
  return weight * Math.abs(guess - price) <= again.noiseAt(again.cost) ? { price, proven: again.proven } : undefined;
}

/** By id, as the search does: answers do not depend on the order of the list. */
function unusedStocks({ order, outcome }: SolvesAgain): Stock[] {
  const leftOut = new Set(outcome.leftOut.map((entry) => entry.stockId));
  const used = new Set(outcome.recipe?.map((line) => line.stockId));
  return order.stocks
    .filter((stock) => !leftOut.has(stock.id) && !used.has(stock.id))
    .sort((a, b) => (a.id < b.id ? -1 : 1));
}
