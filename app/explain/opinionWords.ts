import type { BlendOutcome, Order } from '../../src';
import { formatMoney } from '../parts/money';
import type { Opinion } from '../worker/secondOpinion';
import { costUnit } from './costWords';

export interface OpinionWords {
  text: string;
  tone: 'good' | 'bad' | 'plain';
}

/** Costs nearer than this are the same to both engines: each proves its own to a millionth. */
const SAME = 5e-6;

const isImpossible = ({ proof }: BlendOutcome) => proof.kind.startsWith('impossible');
const isProven = ({ proof }: BlendOutcome) => proof.kind === 'least cost';

const NOT_BEFORE = 'One of them is wrong: do not blend on this recipe before they agree.';

/** What the second engine says of an answer, and no more than it says. */
export function opinionInWords(opinion: Opinion, first: BlendOutcome, order: Order, currency: string): OpinionWords {
  if (opinion.kind === 'failed') return plain(`The second engine gave no answer (${opinion.message}).`);
  if (opinion.kind === 'silent') {
    const after = Math.round(opinion.afterMs / 1000);
    return plain(`The second engine did not answer in ${after} s and was ended. That says nothing of the recipe.`);
  }
  const second = opinion.outcome;
  if (isImpossible(second) || isImpossible(first)) return onImpossible(second, first);
  const [one, other] = [first.objective ?? first.costPerTonne, second.objective ?? second.costPerTonne];
  if (one === undefined || other === undefined) return plain('The second engine found no recipe in its time.');
  const unit = costUnit(order);
  const money = (amount: number) => `${formatMoney(amount, currency)}/${unit}`;
  const apart = Math.abs(other - one);
  const difference = apart < 0.005 ? `under ${money(0.01)}` : money(apart);
  if (apart <= SAME * Math.max(1, Math.abs(one))) {
    if (isProven(second))
      return { text: `The second engine agrees: ${money(other)} (difference ${difference}).`, tone: 'good' };
    return plain(`The second engine found the same cost, ${money(other)}, but did not prove it in its time.`);
  }
  const isDearer = other > one;
  // A dearer recipe that is not proven contradicts nothing, nor does a cheaper one where ours is not proven.
  if (isDearer ? !isProven(second) : !isProven(first)) {
    return plain(
      `The second engine found ${money(other)}, ${difference} ${isDearer ? 'dearer; it did not prove it' : 'cheaper; this answer is not proven'}.`,
    );
  }
  return {
    text: `The second engine does not agree: ${money(other)}, ${difference} ${isDearer ? 'dearer' : 'cheaper'}. ${NOT_BEFORE}`,
    tone: 'bad',
  };
}

function onImpossible(second: BlendOutcome, first: BlendOutcome): OpinionWords {
  if (isImpossible(second) && isImpossible(first)) {
    return { text: 'The second engine agrees: no mix can meet the order.', tone: 'good' };
  }
  const other = isImpossible(second) ? first : second;
  if (!other.recipe) return plain('The second engine found no recipe, and proved nothing in its time.');
  const text = isImpossible(second)
    ? `The second engine does not agree: it finds the order impossible. ${NOT_BEFORE}`
    : 'The second engine does not agree: it found a recipe. One of them is wrong.';
  return { text, tone: 'bad' };
}

function plain(text: string): OpinionWords {
  return { text, tone: 'plain' };
}
