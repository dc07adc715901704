import type { Alternatives, BlendOutcome, Explanation, Ladder, Order, RecipeInSteps } from '../../src';

/** What is told in answer to each kind of question about an answered order. */
export interface Answers {
  /** What limits and stocks cost. */
  recipe: Explanation;
  /** Why it cannot be had, and what can. */
  impossible: Ladder;
  alternatives: Alternatives;
  /** Undefined: no recipe in these steps was found. */
  rounded: RecipeInSteps | undefined;
}

export type QuestionKind = keyof Answers;

/** A question about an order that was answered. */
export type Question =
  | { kind: 'recipe' | 'alternatives'; order: Order; outcome: BlendOutcome }
  | { kind: 'impossible'; order: Order }
  /** `step`: of the shares [mass fraction]. */
  | { kind: 'rounded'; order: Order; outcome: BlendOutcome; step: number };

export type Told = { [Kind in QuestionKind]: { kind: Kind; value: Answers[Kind] } }[QuestionKind];
