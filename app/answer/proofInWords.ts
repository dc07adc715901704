import type { BlendOutcome, Order, Stopped } from '../../src';
import { formatNumber } from '../parts/numberText';
import { countedStocks, leftOutCount, NOTHING_OMITTED, type NotCounted, unreadCount } from './leftOut';

/** What an outcome proves, in the words of a planner. */
export interface ProofWords {
  text: string;
  tone: 'good' | 'plain' | 'warn' | 'bad';
}

const WHY_STOPPED: Record<Stopped, string> = {
  finished: 'the search could get no nearer',
  'time limit': 'stopped at the time limit',
  cancelled: 'you stopped the search',
  refused: 'the order was refused',
  'engine failed': 'the search failed',
};

/** A share in per cent, never rounded down: a proof must not claim more than it shows. */
export function percentUp(fraction: number): string {
  const percent = Math.max(fraction * 100, 0.0001);
  const digits = Math.max(0, Math.min(4, 1 - Math.floor(Math.log10(percent))));
  const up = Math.ceil(percent * 10 ** digits - 1e-6) / 10 ** digits;
  // A trailing zero would claim a digit more.
  return `${formatNumber(up, String(up).split('.')[1]?.length ?? 0)} %`;
}

/** "the 6 stocks that can be counted (1 left out)": whom a claim speaks of, where it is not all of them. */
function ofStocks(outcome: BlendOutcome, order: Pick<Order, 'stocks'>, notCounted: NotCounted): string {
  const left = leftOutCount(outcome, notCounted);
  if (left === 0) return '';
  const counted = countedStocks(outcome, order);
  const whom = counted === 1 ? 'the one stock that can be counted' : `the ${counted} stocks that can be counted`;
  return `${whom} (${left} left out)`;
}

function unreadInWords(notCounted: NotCounted): string {
  const cells = unreadCount(notCounted);
  if (cells === 0) return '';
  return cells === 1 ? ' One cell of the stocks was not read.' : ` ${cells} cells of the stocks were not read.`;
}

/**
 * Why the search ended, whether there is a recipe and what is proven are three facts; the sentence says no more than
 * all three allow.
 */
export function proofInWords(
  outcome: BlendOutcome,
  order: Pick<Order, 'stocks' | 'limits' | 'costBasis'>,
  notCounted: NotCounted = NOTHING_OMITTED,
): ProofWords {
  const { stopped, proof, recipe } = outcome;
  const left = leftOutCount(outcome, notCounted);
  if (!recipe && left > 0 && countedStocks(outcome, order) === 0) return noStockCounts(left);
  if (stopped === 'refused') return { text: 'The order cannot be solved as written:', tone: 'bad' };
  if (stopped === 'engine failed') return { text: 'The search failed; there is no answer.', tone: 'bad' };
  const whom = ofStocks(outcome, order, notCounted);
  const unread = unreadInWords(notCounted);
  if (proof.kind === 'impossible' || proof.kind === 'impossible with known figures') {
    const ofAll = proof.kind === 'impossible';
    // Proven of all stocks with a price, those without the figures too: then only a missing price bears on it.
    const spoken = ofAll && notCounted.omitted.length === 0 ? '' : whom;
    // Nothing is unknown: the proof leans on a stock "as the rest" being held to its small dose.
    const isHeld = !ofAll && left === 0;
    const these = ofAll || isHeld ? 'these stocks' : 'the stocks whose figures are known';
    const held = isHeld ? ' It counts on the small dose allowed “as the rest”.' : '';
    return { text: `No mix of ${spoken || these} can meet the order: proven.${held}${unread}`, tone: 'bad' };
  }
  const why = WHY_STOPPED[stopped];
  if (!recipe) return { text: `No recipe found, and nothing proven yet (${why}).`, tone: 'warn' };
  if (proof.kind === 'none' || proof.gap === undefined || !Number.isFinite(proof.gap)) {
    return {
      text: `A recipe that meets the order. How far it is from the cheapest is not proven (${why}).`,
      tone: 'warn',
    };
  }
  const aims = hasAim(order.limits);
  const measure = order.costBasis === 'cubic metre' ? ' per m³' : '';
  const of = whom && ` of ${whom}`;
  if (proof.kind === 'least cost') {
    const best = aims ? `Best in cost${measure} and aims together` : `Cheapest${measure}`;
    const gap = percentUp(proof.gap);
    return {
      text: `${best}${of} under these figures and this blending rule, proven to ${gap}.${unread}`,
      tone: 'good',
    };
  }
  const best = aims ? `the best in cost${measure} and aims together` : `the cheapest${measure}`;
  return { text: `At most ${percentUp(proof.gap)} above ${best}${of} (${why}).${unread}`, tone: 'warn' };
}

/** True where aims count beside the cost. */
export function hasAim(limits: Order['limits']): boolean {
  return limits.some(({ aim, aimWeight }) => aim !== undefined && aimWeight !== 0);
}

/** Nothing to choose from is no proof: it is said as what is missing. */
function noStockCounts(left: number): ProofWords {
  const text =
    left === 1
      ? 'No stock can be counted: the only one is left out. Below stands what it lacks.'
      : `No stock can be counted: all ${left} are left out. Below stands what each of them lacks.`;
  return { text, tone: 'warn' };
}
