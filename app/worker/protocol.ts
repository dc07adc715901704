import type { BlendOutcome, Order, SolveProgress } from '../../src';
import type { Question, Told } from './questions';

/** What the page tells a solver worker. An AbortSignal cannot be cloned to a worker, so messages carry ids. */
export type ToWorker =
  | { kind: 'solve'; id: number; order: Order; timeLimitMs: number }
  /** A question about an order that was answered; a newer message takes its place at once. */
  | { kind: 'ask'; id: number; question: Question; timeLimitMs: number }
  | { kind: 'cancel'; id: number };

/** What a solver worker tells the page. */
export type FromWorker =
  /** The linear engine is loaded. */
  | { kind: 'ready' }
  /** The linear engine cannot be loaded here; nothing will be answered. */
  | { kind: 'no engine'; message: string }
  | { kind: 'progress'; id: number; progress: SolveProgress }
  | { kind: 'outcome'; id: number; outcome: BlendOutcome }
  | { kind: 'told'; id: number; told: Told }
  /** The solve, or the question, broke off with an error. */
  | { kind: 'error'; id: number; message: string };

/** As much of a Worker as the page uses. */
export interface WorkerLike {
  postMessage(message: ToWorker): void;
  terminate(): void;
  onmessage: ((event: MessageEvent<FromWorker>) => void) | null;
  onerror: ((event: ErrorEvent) => void) | null;
  onmessageerror: ((event: MessageEvent) => void) | null;
}
