import type { BlendOutcome, Order, SolveProgress } from '../../src';
import type { EngineKind } from './createWorker';
import type { FromWorker, WorkerLike } from './protocol';
import { createQuestionDesk, type QuestionListener } from './questionDesk';
import type { Question } from './questions';
import { askSecondEngine, type Opinion } from './secondOpinion';
import { WORDS } from './solverWords';
import { createWorkerSeat } from './workerSeat';

/** Told how a solve goes. Exactly one of `onOutcome`, `onFailed`, `onDropped` comes last. */
export interface SolveListener {
  onProgress?(progress: SolveProgress): void;
  /** `notice`: something about the way of the answer that the user should know, e.g. the slower engine. */
  onOutcome(outcome: BlendOutcome, notice?: string): void;
  onFailed(message: string): void;
  /** A newer order took its place, or the user gave it up before its turn. */
  onDropped?(why: 'for a newer order' | 'by the user'): void;
}

export interface SolverClientOptions {
  createWorker(kind: EngineKind): WorkerLike;
  /** Search time for one order [ms]. */
  timeLimitMs?: number;
  /** The second engine is slower but may hang: it gets less [ms]. */
  secondTimeLimitMs?: number;
  /** Time for one question about an answered order [ms]. */
  questionTimeLimitMs?: number;
  /** Silence beyond the time limit after which a worker counts as hung [ms]. */
  graceMs?: number;
  /** Longest wait for the engine to load [ms]. */
  loadLimitMs?: number;
  /** A solve that has run this long is cancelled once a newer order waits [ms]. */
  patienceMs?: number;
}

export interface SolverClient {
  /**
   * Solves the order; one that waits already is dropped for it, one that runs may still end first. `subject`: what it
   * is solved for, by which it can be cancelled.
   */
  solve(order: Order, listener: SolveListener, subject?: string): void;
  /** Ends the running solve with what it has, and forgets the one that waits, where they are for this subject. */
  cancel(subject?: string): void;
  /** Asks about an answered order, once nothing is to be solved. Any order takes the place of all questions. */
  ask(question: Question, listener: QuestionListener): void;
  /** Solves the order with the second engine as well. Returns the function that gives it up. */
  secondOpinion(order: Order, onOpinion: (opinion: Opinion) => void): () => void;
  dispose(): void;
}

interface Job {
  id: number;
  order: Order;
  listener: SolveListener;
  subject: string | undefined;
  cancelled?: 'by the user' | 'for a newer order';
  /** Set once it was sent again after a breakdown. */
  notice?: string;
}

const DEFAULTS = {
  timeLimitMs: 20_000,
  secondTimeLimitMs: 8_000,
  questionTimeLimitMs: 10_000,
  graceMs: 5_000,
  loadLimitMs: 60_000,
  patienceMs: 400,
};
const CANCEL_GRACE_MS = 1_500;

/**
 * The page's side of the conversation with the solver workers. The latest order wins: one solve runs, the newest order
 * waits, older ones are dropped. A worker that crashes or hangs is replaced and the order sent once more; where HiGHS
 * cannot be loaded the second engine answers, and where that hangs it is killed. Each of these is told in a message.
 * Questions about answered orders wait behind every order.
 */
export function createSolverClient(options: SolverClientOptions): SolverClient {
  const settings = { ...DEFAULTS, ...options };
  const { graceMs, loadLimitMs } = settings;
  let kind: EngineKind = 'highs';
  let running: Job | undefined;
  let waiting: Job | undefined;
  let lastId = 0;
  let engineNotice: string | undefined;
  let patience: ReturnType<typeof setTimeout> | undefined;
  /** The question that the worker has in hand although an order took its place: it ends at once, or it hangs. */
  let ending: number | undefined;
  const desk = createQuestionDesk({ nextId: () => (lastId += 1), send: sendQuestion });
  const seat = createWorkerSeat({ createWorker: options.createWorker, hear, crashed, silent });

  const limit = () => (kind === 'highs' ? settings.timeLimitMs : settings.secondTimeLimitMs);
  const watch = () => seat.watch(seat.isReady() ? limit() + graceMs : loadLimitMs);

  function send(job: Job): void {
    running = job;
    const { id, order } = job;
    if (!seat.post({ kind: 'solve', id, order, timeLimitMs: limit() })) return;
    if (ending !== undefined && seat.isReady()) seat.watch(CANCEL_GRACE_MS);
    else watch();
  }

  function sendQuestion({ id, question }: { id: number; question: Question }): void {
    const timeLimitMs = settings.questionTimeLimitMs;
    if (seat.post({ kind: 'ask', id, question, timeLimitMs })) watchQuestion();
  }

  const watchQuestion = () => seat.watch(seat.isReady() ? settings.questionTimeLimitMs + graceMs : loadLimitMs);

  function end(tell: (listener: SolveListener) => void): void {
    const job = running;
    seat.quiet();
    clearTimeout(patience);
    running = undefined;
    if (job) tell(job.listener);
    // The listener may have sent a new order already.
    if (running) return;
    if (!waiting) {
      desk.next();
      return;
    }
    const next = waiting;
    waiting = undefined;
    send(next);
  }

  /** Ends the job in hand without an answer. */
  function endLost(message: string): void {
    const why = running?.cancelled;
    if (why === 'for a newer order') end((listener) => listener.onDropped?.(why));
    else end(({ onFailed }) => onFailed(why === 'by the user' ? WORDS.cancelled : message));
  }

  function hear(message: FromWorker): void {
    if (message.kind === 'no engine') withoutEngine(message.message);
    else if (message.kind === 'ready') {
      if (running) watch();
      else if (desk.isAsking()) watchQuestion();
    } else if (message.id === ending) {
      ending = undefined;
      if (running && !running.cancelled) watch();
    } else if (desk.hear(message)) {
      if (running || desk.isAsking()) return;
      seat.quiet();
      desk.next();
    } else if (running && message.id === running.id && message.kind !== 'told') hearOf(running, message);
  }

  function hearOf(job: Job, message: Exclude<FromWorker, { kind: 'ready' | 'no engine' | 'told' }>): void {
    if (message.kind === 'progress') {
      if (!job.cancelled) watch();
      job.listener.onProgress?.(message.progress);
    } else if (message.kind === 'error') endLost(WORDS.failed(message.message));
    else if (job.cancelled === 'for a newer order' && message.outcome.stopped === 'cancelled') endLost('');
    else end((listener) => listener.onOutcome(message.outcome, job.notice ?? engineNotice));
  }

  /** HiGHS cannot be had: the second engine takes over, and after that nobody. */
  function withoutEngine(reason: string): void {
    clearSeat('javascript');
    if (kind === 'javascript') {
      endLost(WORDS.noEngine(reason));
      return;
    }
    kind = 'javascript';
    engineNotice = WORDS.secondEngine(reason);
    if (running?.cancelled) endLost('');
    else if (running) send(running);
    else desk.again();
  }

  function clearSeat(next: EngineKind): void {
    ending = undefined;
    seat.clear(next);
  }

  /** A question is not asked twice of a worker that broke down over it: nobody waits for it. */
  function endQuestion(message: string): void {
    clearSeat(kind);
    desk.fail(message);
    if (!running) desk.next();
  }

  /** The order in hand once more, in a new worker; given up where that was done already. */
  function sendAgain(restarted: string, givenUp: string): void {
    clearSeat(kind);
    if (!running) return;
    if (running.notice !== undefined || running.cancelled) endLost(givenUp);
    else send({ ...running, notice: restarted });
  }

  function crashed(reason: string, wasReady: boolean): void {
    // A worker that never came to life will not do so the second time.
    if (wasReady && !running) endQuestion(WORDS.questionLost('broke down'));
    else if (wasReady) sendAgain(WORDS.restarted('broke down'), WORDS.crashed(reason));
    else withoutEngine(reason || WORDS.notStarted);
  }

  function silent(wasReady: boolean): void {
    if (!wasReady) withoutEngine(WORDS.notLoaded(loadLimitMs));
    else if (!running) endQuestion(WORDS.questionLost('did not answer in time'));
    else if (kind === 'highs') sendAgain(WORDS.restarted('stopped answering'), WORDS.hung);
    else {
      clearSeat(kind);
      endLost(WORDS.secondEngineHung(limit() + graceMs));
    }
  }

  function cancelRunning(why: NonNullable<Job['cancelled']>): void {
    clearTimeout(patience);
    if (!running) return;
    running.cancelled = why;
    seat.post({ kind: 'cancel', id: running.id });
    if (seat.isReady()) seat.watch(CANCEL_GRACE_MS);
  }

  return {
    solve(order, listener, subject) {
      lastId += 1;
      const job: Job = { id: lastId, order, listener, subject };
      ending = desk.drop() ?? ending;
      if (!running) {
        send(job);
        return;
      }
      const before = waiting;
      waiting = job;
      before?.listener.onDropped?.('for a newer order');
      if (!before && !running.cancelled) {
        patience = setTimeout(() => cancelRunning('for a newer order'), settings.patienceMs);
      }
    },
    cancel(subject) {
      if (waiting && waiting.subject === subject) {
        const { listener } = waiting;
        waiting = undefined;
        // Nothing newer waits any more: the one that runs may take its time.
        clearTimeout(patience);
        listener.onDropped?.('by the user');
      }
      if (running && running.subject === subject) cancelRunning('by the user');
    },
    ask(question, listener) {
      desk.add(question, listener);
      if (!running) desk.next();
    },
    secondOpinion: (order, onOpinion) =>
      askSecondEngine(
        order,
        { createWorker: options.createWorker, timeLimitMs: settings.secondTimeLimitMs, graceMs },
        onOpinion,
      ),
    dispose() {
      clearTimeout(patience);
      desk.drop();
      running = undefined;
      waiting = undefined;
      clearSeat(kind);
    },
  };
}
