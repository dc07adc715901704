import { create } from 'zustand';
import type { BlendOutcome, Order } from '../../src';
import type { Answers, QuestionKind } from '../worker/questions';
import type { Opinion } from '../worker/secondOpinion';
import { type Answer, useAnswers } from './answerStore';

/** One thing told about an answer. It speaks of this outcome and no other. */
export interface Part<Value> {
  outcome: BlendOutcome;
  /** The engine order that `outcome` answers. */
  order: Order;
  /** Absent where it failed. */
  told?: { value: Value };
  /** Why there is none. */
  message?: string;
}

export type Parts = { [Kind in QuestionKind]?: Part<Answers[Kind]> };

/** What was told about the answer to one order. */
export interface Explained extends Parts {
  /** Told for this rounding. */
  roundedTo?: Rounding;
  /** What the second engine says; without `told` or `message` it is still being asked. */
  opinion?: Part<Opinion>;
}

/** What can be weighed: "0.1 %", "5 kg". Empty: not asked for. */
export type Rounding = '' | `${number} %` | `${number} kg`;

export interface ExplainState {
  explained: Readonly<Record<string, Explained>>;
  rounding: Rounding;
}

export const useExplain = create<ExplainState>(() => ({ explained: {}, rounding: '' }));

const NOTHING: Explained = {};

export function explainedOf(orderId: string): Explained {
  return useExplain.getState().explained[orderId] ?? NOTHING;
}

export function setExplained(orderId: string, change: Partial<Explained>): void {
  useExplain.setState(({ explained }) => ({
    explained: { ...explained, [orderId]: { ...explained[orderId], ...change } },
  }));
}

/** One part of what was told, and how it stands to the answer on screen. */
export interface Shown<Value> {
  part: Value;
  /** It speaks of another answer. */
  stale: boolean;
  /** The answer is there, and this part of it is not told yet. */
  due: boolean;
}

const OF_ANY_ANSWER = { impossible: true, opinion: true };

function isWithoutRecipe(answer: Answer | undefined): boolean {
  return answer?.phase === 'answered' && !answer.stale && !answer.outcome?.recipe;
}

/** One part of what was told about an order's answer. Renders anew only where the part or its standing changes. */
export function useExplained<Kind extends QuestionKind | 'opinion'>(
  orderId: string,
  kind: Kind,
): Shown<Explained[Kind]> {
  const told = useExplain(({ explained }) => explained[orderId]?.[kind]);
  // An answer without a recipe leaves nothing to be told of one, and no news is on its way.
  const applies = useAnswers(({ answers }) => kind in OF_ANY_ANSWER || !isWithoutRecipe(answers[orderId]));
  const part = applies ? told : undefined;
  const isOfThis = (answer: Answer | undefined) => answer !== undefined && answer.outcome === part?.outcome;
  const stale = useAnswers(({ answers }) => {
    const answer = answers[orderId];
    return part !== undefined && (answer?.stale !== false || !isOfThis(answer));
  });
  const due = useAnswers(({ answers }) => {
    const answer = answers[orderId];
    return answer?.phase === 'answered' && !answer.stale && !isOfThis(answer);
  });
  return { part, stale, due };
}
