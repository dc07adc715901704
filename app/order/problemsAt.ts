import type { OrderProblem, ShareRule } from '../../src';
import type { Answer } from '../state/answerStore';

/** Messages of the engine that speak of a place in the order, such as ['limits', 2]; none while the answer is stale. */
export function problemsAt(answer: Answer, ...place: (string | number)[]): string[] {
  if (answer.stale) return [];
  return (answer.outcome?.problems ?? [])
    .filter((problem: OrderProblem) => place.every((step, index) => problem.path[index] === step))
    .map((problem) => problem.message);
}

/** Messages on a dose. The engine's list may be shorter than the order's, so the place is found by its stock. */
export function doseProblems(answer: Answer, stockId: string): string[] {
  const place = answer.order?.doses?.findIndex((dose) => dose.stockId === stockId) ?? -1;
  return place < 0 ? [] : problemsAt(answer, 'doses', place);
}

/** Messages on a share rule, where the engine's rule at that place is the same kind of rule. */
export function shareProblems(answer: Answer, index: number, kind: ShareRule['kind']): string[] {
  return answer.order?.shares?.[index]?.kind === kind ? problemsAt(answer, 'shares', index) : [];
}
