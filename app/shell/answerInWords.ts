import type { WorkbookOrder } from '../../src';
import { countedStocks, leftOutCount } from '../answer/leftOut';
import { formatMoney } from '../parts/money';
import type { Answer } from '../state/answerStore';

/** An answer in two or three words, for the list of orders and the bar at the foot of a phone. */
export interface ShortAnswer {
  text: string;
  /** What is proven, or what is amiss. Empty where there is nothing to add. */
  remark: string;
  tone: 'plain' | 'good' | 'warn' | 'bad';
  stale: boolean;
}

const PROOF = {
  'least cost': { remark: 'proven cheapest', tone: 'good' },
  'within gap': { remark: 'near the cheapest', tone: 'plain' },
  none: { remark: 'not proven cheapest', tone: 'warn' },
} as const;

export function answerInWords(answer: Answer, order: WorkbookOrder, currency: string): ShortAnswer {
  const { outcome, phase, stale } = answer;
  const left = outcome ? leftOutCount(outcome, answer) : 0;
  const but = left > 0 ? `, ${left} left out` : '';
  const say = (text: string, remark: string, tone: ShortAnswer['tone']) => ({ text, remark, tone, stale });
  if (!outcome) {
    if (phase === 'failed') return say('needs attention', 'no answer', 'bad');
    return phase === 'solving' ? say('working …', '', 'plain') : say('not worked out yet', '', 'plain');
  }
  if (!outcome.recipe && left > 0 && answer.order && countedStocks(outcome, answer.order) === 0) {
    return say('no stock counts', `all ${left} left out`, 'warn');
  }
  if (outcome.stopped === 'refused') return say('needs attention', 'cannot be worked out', 'warn');
  if (outcome.stopped === 'engine failed') return say('needs attention', 'the search failed', 'bad');
  const { kind } = outcome.proof;
  if (kind === 'impossible with known figures') return say('impossible', `with known figures${but}`, 'bad');
  if (kind === 'impossible') {
    return say('impossible', answer.omitted.length > 0 ? `with the stocks counted${but}` : 'proven', 'bad');
  }
  const cubic = order.costBasis === 'cubic metre' && outcome.costPerCubicMetre !== undefined;
  const cost = cubic ? outcome.costPerCubicMetre : outcome.costPerTonne;
  if (cost === undefined) return say('no recipe yet', 'stopped, nothing proven', 'warn');
  return say(
    `${formatMoney(cost, currency, 0)}/${cubic ? 'm³' : 't'}`,
    PROOF[kind].remark + (kind === 'none' ? '' : but),
    PROOF[kind].tone,
  );
}
