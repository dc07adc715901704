import type { Order } from '../../optimise/order';
import { isCompulsory } from '../../optimise/rows/candidates';
import type { RecipeLine } from '../../stock/stock';
import type { UsedStock } from '../explanation';
import { withoutStocks } from '../withoutStocks';
import { type BreakEven, breakEven } from './breakEven';
import { highestPrice, lowestPrice } from './farPrices';
import type { SolvesAgain } from './solvesAgain';

/** For each stock of the recipe: the prices at which the recipe stands, and what losing the stock would cost. */
export async function* usedStocks(again: SolvesAgain): AsyncGenerator<UsedStock> {
  for (const line of again.outcome.recipe ?? []) yield await usedStock(again, line);
}

async function usedStock(again: SolvesAgain, { stockId, massFraction }: RecipeLine): Promise<UsedStock> {
  const { order } = again;
  const present = again.presentPrice(stockId);
  const loss = await lossOf(again, stockId);
  const fixed = { least: isAtLeast(order, stockId, massFraction), most: isAtMost(order, stockId, massFraction) };
  const stands: BreakEven = { proven: again.proven };
  const from = fixed.most ? stands : await breakEven(again, stockId, present, lowestPrice(order));
  const to = fixed.least ? stands : await breakEven(again, stockId, present, highestPrice(order));
  return {
    stockId,
    pricePerTonne: present,
    massFraction,
    ...(from.price === undefined ? {} : { standsFrom: from.price }),
    ...(to.price === undefined ? {} : { standsTo: to.price }),
    ...(loss.costs === undefined ? {} : { lossCosts: loss.costs }),
    impossibleWithout: loss.impossible,
    proven: loss.proven && from.proven && to.proven,
  };
}

interface Loss {
  costs?: number;
  impossible: boolean;
  proven: boolean;
}

async function lossOf(again: SolvesAgain, stockId: string): Promise<Loss> {
  if (isCompulsory(again.order, stockId)) return { impossible: true, proven: true };
  const without = withoutStocks(again.order, [stockId]);
  if (without.stocks.length === 0) return { impossible: true, proven: true };
  const { cost, proven, outcome } = await again.solveStricter(without);
  if (outcome.recipe)
    return { costs: again.amount(cost - again.cost), impossible: false, proven: proven && again.proven };
  return { impossible: proven, proven };
}

/** Shares of the mix that the order fixes by the stock itself: there a dearer or cheaper stock changes nothing. */
const SAME_SHARE = 1e-9;

function dosesOfMix({ doses, costBasis }: Order, stockId: string) {
  // Per m³ a share weighs the more, the denser the mix: a fixed share does not fix the weight.
  if (costBasis === 'cubic metre') return [];
  return (doses ?? []).filter((dose) => dose.stockId === stockId && dose.of !== 'base oil' && dose.unit !== 'tonnes');
}

/** The stock is used at the most that its own doses allow. */
function isAtMost(order: Order, stockId: string, share: number): boolean {
  return dosesOfMix(order, stockId).some((dose) => (dose.exactly ?? dose.max ?? 1) <= share + SAME_SHARE);
}

/** The stock is used at the least that the order makes compulsory. */
function isAtLeast(order: Order, stockId: string, share: number): boolean {
  return dosesOfMix(order, stockId).some(
    (dose) => dose.required !== false && (dose.exactly ?? dose.min ?? 0) >= share - SAME_SHARE,
  );
}
