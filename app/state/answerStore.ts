import { useEffect, useState } from 'react';
import { create } from 'zustand';
import type { BlendOutcome, OmittedProduct, Order, SolveProgress, UnreadCell } from '../../src';

/** The answer to one order, as far as it has come. */
export interface Answer {
  phase: 'idle' | 'solving' | 'answered' | 'failed';
  /** `outcome` answers an earlier state of the order or the stocks. */
  stale: boolean;
  outcome?: BlendOutcome;
  /** The engine order that `outcome` answers: its recipe, limits and checks speak of these stocks and limits. */
  order?: Order;
  /** Products that the order on screen cannot use, with the reason. */
  omitted: OmittedProduct[];
  /** Cells that could not be read; their figures count as unknown. */
  unread: UnreadCell[];
  /** How the order was turned into engine terms, where that needs a word. */
  notes: string[];
  progress?: SolveProgress;
  /** When the running solve was sent, on the page's clock (performance.now) [ms]. */
  sinceMs?: number;
  /** What went wrong, or which engine answered, where the user should know. */
  message?: string;
}

interface AnswerState {
  answers: Readonly<Record<string, Answer>>;
}

const IDLE: Answer = { phase: 'idle', stale: false, omitted: [], unread: [], notes: [] };

export const useAnswers = create<AnswerState>(() => ({ answers: {} }));

/** The answer to an order; idle for an order that was never solved. */
export function useAnswer(orderId: string | undefined): Answer {
  return useAnswers(({ answers }) => (orderId === undefined ? IDLE : (answers[orderId] ?? IDLE)));
}

export function answerOf(orderId: string): Answer {
  return useAnswers.getState().answers[orderId] ?? IDLE;
}

export function setAnswer(orderId: string, change: Partial<Answer>): void {
  useAnswers.setState(({ answers }) => ({
    answers: { ...answers, [orderId]: { ...(answers[orderId] ?? IDLE), ...change } },
  }));
}

/** Greys every answer: something that may bear on it has changed. */
export function markAllStale(): void {
  useAnswers.setState(({ answers }) => ({
    answers: Object.fromEntries(
      Object.entries(answers).map(([id, answer]) => [id, answer.stale ? answer : { ...answer, stale: true }]),
    ),
  }));
}

/** True once a solve has run for more than half a second: only then is progress worth showing. */
export function useDelay500(answer: Answer): boolean {
  const running = answer.phase === 'solving' ? answer.sinceMs : undefined;
  const [slow, setSlow] = useState<number>();
  useEffect(() => {
    if (running === undefined) return;
    const timer = setTimeout(() => setSlow(running), 500);
    return () => clearTimeout(timer);
  }, [running]);
  return running !== undefined && slow === running;
}
