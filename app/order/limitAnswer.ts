import type { Limit, LimitCheck } from '../../src';
import { isSameProperty } from '../parts/limitEnds';
import type { Answer } from '../state/answerStore';
import { type StockMark, stockMarks } from './stockOnRail';

/** What the last answer says of one limit. While it is stale the limits may have moved places since. */
export function checkOf(answer: Answer, index: number, limit: Limit): LimitCheck | undefined {
  const same = (answer.outcome?.checks ?? []).filter((check) => isSameProperty(check, limit));
  return same.find((check) => check.limit === index) ?? same[0];
}

/** The value of the mix for a limit that no check speaks of yet. */
export function mixValue(answer: Answer, limit: Limit): number | undefined {
  return answer.outcome?.properties?.properties.find((property) => isSameProperty(property, limit))?.value;
}

export function marksOf({ order, outcome }: Answer, limit: Limit): StockMark[] {
  if (!order || !outcome?.recipe) return [];
  const used = outcome.recipe.filter(({ massFraction }) => massFraction > 0).map(({ stockId }) => stockId);
  return stockMarks(order, used, limit);
}
