import type { BlendOutcome, Order } from '../../src';
import type { EngineKind } from './createWorker';
import type { WorkerLike } from './protocol';
import { createWorkerSeat } from './workerSeat';

/** What came of asking the second engine. */
export type Opinion =
  | { kind: 'answered'; outcome: BlendOutcome }
  /** It was ended after so long without an answer [ms]. */
  | { kind: 'silent'; afterMs: number }
  | { kind: 'failed'; message: string };

export interface OpinionSettings {
  createWorker(kind: EngineKind): WorkerLike;
  /** Search time [ms]. */
  timeLimitMs: number;
  /** Silence beyond it after which the worker is ended [ms]. */
  graceMs: number;
}

/**
 * Solves the order with the second engine, in a worker of its own that is ended afterwards, or when it hangs. Returns
 * the function that gives it up.
 */
export function askSecondEngine(
  order: Order,
  { createWorker, timeLimitMs, graceMs }: OpinionSettings,
  onOpinion: (opinion: Opinion) => void,
): () => void {
  const afterMs = timeLimitMs + graceMs;
  let ended = false;
  function end(opinion?: Opinion): void {
    if (ended) return;
    ended = true;
    seat.clear('javascript');
    if (opinion) onOpinion(opinion);
  }
  const seat = createWorkerSeat({
    createWorker,
    hear(message) {
      if (message.kind === 'outcome') end({ kind: 'answered', outcome: message.outcome });
      else if (message.kind === 'error' || message.kind === 'no engine')
        end({ kind: 'failed', message: message.message });
    },
    crashed: (reason) => end({ kind: 'failed', message: reason || 'its worker broke down' }),
    silent: () => end({ kind: 'silent', afterMs }),
  });
  seat.clear('javascript');
  if (seat.post({ kind: 'solve', id: 1, order, timeLimitMs })) seat.watch(afterMs);
  return () => end();
}
