import type { BlendOutcome, Order, SolveProgress } from '../../src';
import type { EngineKind } from './createWorker';
import type { FromWorker, WorkerLike } from './protocol';
import { WORDS } from './solverWords';

/** Told how a solve goes. Exactly one of `onOutcome`, `onFailed`, `onDropped` comes last. */
export interface SolveListener {
  onProgress?(progress: SolveProgress): void;
  /** `notice`: something about the way of the answer that the user should know, e.g. the slower engine. */
  onOutcome(outcome: BlendOutcome, notice?: string): void;
  onFailed(message: string): void;
  /** A newer order took its place. */
  onDropped?(): void;
}

export interface SolverClientOptions {
  createWorker(kind: EngineKind): WorkerLike;
  /** Search time for one order [ms]. */
  timeLimitMs?: number;
  /** The second engine is slower but may hang: it gets less [ms]. */
  secondTimeLimitMs?: number;
  /** Silence beyond the time limit after which a worker counts as hung [ms]. */
  graceMs?: number;
  /** Longest wait for the engine to load [ms]. */
  loadLimitMs?: number;
  /** A solve that has run this long is cancelled as soon as a newer order waits [ms]. */
  patienceMs?: number;
}

export interface SolverClient {
  /** Solves the order; one that waits already is dropped for it, one that runs may still end first. */
  solve(order: Order, listener: SolveListener): void;
  /** Ends the running solve with what it has, and forgets the one that waits. */
  cancel(): void;
  dispose(): void;
}

interface Job {
  id: number;
  order: Order;
  listener: SolveListener;
  sent: boolean;
  /** Sent once more after a crash. */
  again: boolean;
  cancelled?: 'by the user' | 'for a newer order';
  /** What happened on the way to its answer. */
  notice?: string;
}

type Timer = ReturnType<typeof setTimeout> | undefined;

const DEFAULTS = {
  timeLimitMs: 20_000,
  secondTimeLimitMs: 8_000,
  graceMs: 5_000,
  loadLimitMs: 60_000,
  patienceMs: 400,
};
const CANCEL_GRACE_MS = 1_500;

/**
 * The page's side of the conversation with the solver workers. The latest order wins: one solve runs, the newest order
 * waits, older ones are dropped. A worker that crashes or hangs is replaced and the order sent once more; where HiGHS
 * cannot be loaded the second engine answers, and where that hangs it is killed. Each of these is told in a message.
 */
export function createSolverClient(options: SolverClientOptions): SolverClient {
  const { timeLimitMs, secondTimeLimitMs, graceMs, loadLimitMs, patienceMs } = { ...DEFAULTS, ...options };
  let kind: EngineKind = 'highs';
  let worker: WorkerLike | undefined;
  let ready = false;
  let running: Job | undefined;
  let waiting: Job | undefined;
  let lastId = 0;
  let notice: string | undefined;
  let watchdog: Timer;
  let patience: Timer;

  const limit = () => (kind === 'highs' ? timeLimitMs : secondTimeLimitMs);

  function start(): WorkerLike | undefined {
    if (worker) return worker;
    try {
      const started = options.createWorker(kind);
      started.onmessage = ({ data }) => worker === started && hear(data);
      started.onerror = (event) => {
        event.preventDefault?.();
        if (worker === started) crashed(event.message);
      };
      started.onmessageerror = () => worker === started && crashed('its answer could not be read');
      ready = false;
      worker = started;
    } catch (error) {
      worker = undefined;
      crashed(error instanceof Error ? error.message : String(error));
    }
    return worker;
  }

  function stop(): void {
    clearTimeout(watchdog);
    worker?.terminate();
    worker = undefined;
    ready = false;
  }

  /** Restarted at every sign of life. */
  function watch(ms = ready ? limit() + graceMs : loadLimitMs): void {
    clearTimeout(watchdog);
    watchdog = setTimeout(hung, ms);
  }

  function send(job: Job): void {
    running = job;
    const to = start();
    if (!to || running !== job || job.sent) return;
    job.sent = true;
    watch();
    to.postMessage({ kind: 'solve', id: job.id, order: job.order, timeLimitMs: limit() });
  }

  function next(): void {
    clearTimeout(watchdog);
    clearTimeout(patience);
    running = undefined;
    const job = waiting;
    waiting = undefined;
    if (job) send(job);
  }

  function end(tell: (listener: SolveListener) => void): void {
    const job = running;
    if (!job) return;
    running = undefined;
    tell(job.listener);
    // The listener may have sent a new order already.
    if (!running) next();
  }

  function hear(message: FromWorker): void {
    if (message.kind === 'ready') {
      ready = true;
      if (running) watch();
      return;
    }
    if (message.kind === 'no engine') {
      withoutHighs(message.message);
      return;
    }
    const job = running;
    if (!job || message.id !== job.id) return;
    if (message.kind === 'progress') {
      if (!job.cancelled) watch();
      job.listener.onProgress?.(message.progress);
    } else if (message.kind === 'error') end(({ onFailed }) => onFailed(WORDS.failed(message.message)));
    else if (job.cancelled === 'for a newer order' && message.outcome.stopped === 'cancelled')
      end((listener) => listener.onDropped?.());
    else end((listener) => listener.onOutcome(message.outcome, job.notice ?? notice));
  }

  /** The order in hand once more, in a new worker; false where that was done already. */
  function sendAgain(restarted: string): boolean {
    const job = running;
    if (!job) return true;
    if (job.again || job.cancelled) return false;
    send({ ...job, sent: false, again: true, notice: restarted });
    return true;
  }

  function withoutHighs(reason: string): void {
    stop();
    if (kind === 'javascript') {
      end(({ onFailed }) => onFailed(WORDS.noEngine(reason)));
      return;
    }
    kind = 'javascript';
    notice = WORDS.secondEngine(reason);
    if (running) send({ ...running, sent: false });
  }

  function crashed(reason: string): void {
    const wasReady = ready;
    stop();
    // A worker that never came to life will not do so the second time.
    if (!wasReady) withoutHighs(reason || WORDS.notStarted);
    else if (!sendAgain(WORDS.restarted('broke down'))) endLost(WORDS.crashed(reason));
  }

  /** Ends the job in hand without an answer, unless nobody waits for it any more. */
  function endLost(message: string): void {
    const why = running?.cancelled;
    if (why === 'for a newer order') end((listener) => listener.onDropped?.());
    else end(({ onFailed }) => onFailed(why === 'by the user' ? WORDS.cancelled : message));
  }

  function hung(): void {
    if (!ready) {
      withoutHighs(WORDS.notLoaded(loadLimitMs));
      return;
    }
    stop();
    if (kind === 'javascript') endLost(WORDS.secondEngineHung(secondTimeLimitMs + graceMs));
    else if (!sendAgain(WORDS.restarted('stopped answering'))) endLost(WORDS.hung);
  }

  function cancelRunning(why: NonNullable<Job['cancelled']>): void {
    clearTimeout(patience);
    if (!running || !worker) return;
    running.cancelled = why;
    worker.postMessage({ kind: 'cancel', id: running.id });
    if (ready) watch(CANCEL_GRACE_MS);
  }

  return {
    solve(order, listener) {
      lastId += 1;
      const job: Job = { id: lastId, order, listener, sent: false, again: false };
      if (!running) return send(job);
      waiting?.listener.onDropped?.();
      if (!waiting && !running.cancelled) patience = setTimeout(() => cancelRunning('for a newer order'), patienceMs);
      waiting = job;
    },
    cancel() {
      waiting?.listener.onDropped?.();
      waiting = undefined;
      cancelRunning('by the user');
    },
    dispose() {
      clearTimeout(patience);
      running = undefined;
      waiting = undefined;
      stop();
    },
  };
}
