import type { BlendOutcome, Order, Stopped } from '../../src';
import { formatNumber } from '../parts/numberText';

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

/** What a claim rests on: said with every claim about the cheapest. */
function leftOutInWords({ leftOut }: BlendOutcome): string {
  const missing = leftOut.filter(({ reason }) => reason !== 'missing flag').length;
  if (missing === 0) return '';
  return missing === 1
    ? ' One stock was left out because figures are missing or cannot be used.'
    : ` ${missing} stocks were left out because figures are missing or cannot be used.`;
}

/**
 * Why the search ended, whether there is a recipe and what is proven are three facts; the sentence says no more than
 * all three allow.
 */
export function proofInWords(outcome: BlendOutcome, order?: Pick<Order, 'limits' | 'costBasis'>): ProofWords {
  const { stopped, proof, recipe } = outcome;
  if (stopped === 'refused') return { text: 'The order cannot be solved as written:', tone: 'bad' };
  if (stopped === 'engine failed') return { text: 'The search failed; there is no answer.', tone: 'bad' };
  const left = leftOutInWords(outcome);
  if (proof.kind === 'impossible') return { text: 'No mix of these stocks can meet the order: proven.', tone: 'bad' };
  if (proof.kind === 'impossible with known figures') {
    return { text: `No mix of the stocks whose figures are known can meet the order: proven.${left}`, tone: 'bad' };
  }
  const why = WHY_STOPPED[stopped];
  if (!recipe) return { text: `No recipe found, and nothing proven yet (${why}).`, tone: 'warn' };
  if (proof.kind === 'none' || proof.gap === undefined || !Number.isFinite(proof.gap)) {
    return {
      text: `A recipe that meets the order. How far it is from the cheapest is not proven (${why}).`,
      tone: 'warn',
    };
  }
  const hasAim = order?.limits.some(({ aim, aimWeight }) => aim !== undefined && aimWeight !== 0) ?? false;
  const measure = order?.costBasis === 'cubic metre' ? ' per m³' : '';
  if (proof.kind === 'least cost') {
    const best = hasAim ? `Best in cost${measure} and aims together` : `Cheapest${measure}`;
    const text = `${best} under these figures and this blending rule, proven to ${percentUp(proof.gap)}.${left}`;
    return { text, tone: 'good' };
  }
  const best = hasAim ? `the best in cost${measure} and aims together` : `the cheapest${measure}`;
  return { text: `At most ${percentUp(proof.gap)} above ${best} (${why}).${left}`, tone: 'warn' };
}
