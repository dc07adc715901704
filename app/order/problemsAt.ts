import { type Dose, type OrderProblem, type ShareRule, toOrder, type Workbook, type WorkbookOrder } from '../../src';
import type { Answer } from '../state/answerStore';

/** Messages of the engine that speak of a place in the order, such as ['limits', 2]; none while the answer is stale. */
export function problemsAt(answer: Answer, ...place: (string | number)[]): string[] {
  if (answer.stale) return [];
  return (answer.outcome?.problems ?? [])
    .filter((problem: OrderProblem) => place.every((step, index) => problem.path[index] === step))
    .map((problem) => problem.message);
}

/**
 * Messages on a dose. The engine's list may be shorter than the order's, so the place is found by its stock. Of a
 * product that cannot be used the engine knows nothing: then the reason why it was left out stands here.
 */
export function doseProblems(answer: Answer, dose: Dose): string[] {
  if (answer.stale) return [];
  const omitted = answer.omitted.filter(({ productId }) => productId === dose.stockId);
  if (omitted.length > 0) return omitted.map(({ message }) => message);
  const place = answer.order?.doses?.findIndex(({ stockId }) => stockId === dose.stockId) ?? -1;
  return place < 0 ? [] : problemsAt(answer, 'doses', place);
}

/** Messages on a share rule. The engine's list is another than the order's, so a rule is found by what became of it. */
export function shareProblems(answer: Answer, workbook: Workbook, order: WorkbookOrder, rule: ShareRule): string[] {
  if (problemsAt(answer, 'shares').length === 0) return [];
  const sharesOf = (shares: ShareRule[]) => toOrder(workbook, { ...order, doses: [], shares }).order.shares ?? [];
  const own = sharesOf([rule]);
  const became = own.slice(0, own.length - sharesOf([]).length).map((share) => JSON.stringify(share));
  return (answer.order?.shares ?? []).flatMap((share, place) =>
    became.includes(JSON.stringify(share)) ? problemsAt(answer, 'shares', place) : [],
  );
}
