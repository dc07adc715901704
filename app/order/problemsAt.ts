import type { OrderProblem } from '../../src';
import type { Answer } from '../state/answerStore';

/** Messages of the engine that speak of a place in the order, such as ['limits', 2]; none while the answer is stale. */
export function problemsAt(answer: Answer, ...place: (string | number)[]): string[] {
  if (answer.stale) return [];
  return (answer.outcome?.problems ?? [])
    .filter((problem: OrderProblem) => place.every((step, index) => problem.path[index] === step))
    .map((problem) => problem.message);
}
