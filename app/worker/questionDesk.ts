import type { FromWorker, ToWorker } from './protocol';
import type { Question, Told } from './questions';

/** Told how a question goes; exactly one of these comes. */
export interface QuestionListener {
  onTold(told: Told): void;
  onFailed(message: string): void;
  /** A newer order took its place. */
  onDropped?(): void;
}

interface Asked {
  id: number;
  question: Question;
  listener: QuestionListener;
}

export interface QuestionDesk {
  add(question: Question, listener: QuestionListener): void;
  /** Sends the next question, unless one is with the worker already. */
  next(): void;
  /** Sends the question in hand once more: the worker is another one. */
  again(): void;
  /** Takes what is said of the question in hand; false where it speaks of something else. */
  hear(message: FromWorker): boolean;
  /** The question in hand has no answer, for this reason. */
  fail(message: string): void;
  /** Forgets all questions. Returns the id of the one that the worker still has in hand. */
  drop(): number | undefined;
  isAsking(): boolean;
}

/** Questions about answered orders, asked one after the other. They give way to any order. */
export function createQuestionDesk({
  nextId,
  send,
}: {
  nextId(): number;
  send(message: Pick<Extract<ToWorker, { kind: 'ask' }>, 'id' | 'question'>): void;
}): QuestionDesk {
  let asked: Asked | undefined;
  let waiting: Omit<Asked, 'id'>[] = [];

  function end(tell: (listener: QuestionListener) => void): void {
    const done = asked;
    asked = undefined;
    if (done) tell(done.listener);
  }

  return {
    add: (question, listener) => void waiting.push({ question, listener }),
    next() {
      if (asked) return;
      const next = waiting.shift();
      if (!next) return;
      asked = { ...next, id: nextId() };
      send(asked);
    },
    again() {
      if (asked) send(asked);
    },
    hear(message) {
      if (!asked || !('id' in message) || message.id !== asked.id) return false;
      if (message.kind === 'told') end(({ onTold }) => onTold(message.told));
      else if (message.kind === 'error') end(({ onFailed }) => onFailed(message.message));
      return true;
    },
    fail: (message) => end(({ onFailed }) => onFailed(message)),
    drop() {
      const inHand = asked?.id;
      const dropped = [...(asked ? [asked] : []), ...waiting];
      asked = undefined;
      waiting = [];
      for (const { listener } of dropped) listener.onDropped?.();
      return inHand;
    },
    isAsking: () => asked !== undefined,
  };
}
