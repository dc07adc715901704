import { alternatives, explainImpossible, explainRecipe, roundRecipe, type SolveOptions } from '../../src';
import type { Question, Told } from './questions';

/** Answers a question about an answered order, in the worker. */
export async function answerQuestion(question: Question, options: SolveOptions): Promise<Told> {
  const { kind, order } = question;
  switch (kind) {
    case 'recipe':
      return { kind, value: await explainRecipe(order, question.outcome, options) };
    case 'alternatives':
      return { kind, value: await alternatives(order, question.outcome, options) };
    case 'impossible':
      return { kind, value: await explainImpossible(order, options) };
    case 'rounded':
      return { kind, value: await roundRecipe(order, question.outcome, question.step, options) };
  }
}
