import type { EngineKind } from './createWorker';
import type { FromWorker, ToWorker, WorkerLike } from './protocol';

export interface WorkerSeatOptions {
  createWorker(kind: EngineKind): WorkerLike;
  hear(message: FromWorker): void;
  /** The worker broke down, or could not be made. `wasReady`: its engine had been loaded. */
  crashed(reason: string, wasReady: boolean): void;
  /** The worker was silent for as long as `watch` allowed. */
  silent(wasReady: boolean): void;
}

/** A place for one worker at a time, made when it is first needed and watched for silence. */
export interface WorkerSeat {
  /** False where no worker can be had; `crashed` was called then. */
  post(message: ToWorker): boolean;
  isReady(): boolean;
  /** From now on the worker may be silent for so long [ms]. */
  watch(ms: number): void;
  quiet(): void;
  /** Ends the worker; the next message starts a new one of this kind. */
  clear(kind: EngineKind): void;
}

export function createWorkerSeat({ createWorker, hear, crashed, silent }: WorkerSeatOptions): WorkerSeat {
  let kind: EngineKind = 'highs';
  let worker: WorkerLike | undefined;
  let ready = false;
  let watchdog: ReturnType<typeof setTimeout> | undefined;

  function start(): WorkerLike {
    const started = createWorker(kind);
    // A word from a worker that was ended meanwhile counts no more.
    const inSeat = () => worker === started;
    started.onmessage = ({ data }) => {
      if (!inSeat()) return;
      if (data.kind === 'ready') ready = true;
      hear(data);
    };
    started.onerror = (event) => {
      event.preventDefault?.();
      if (inSeat()) crashed(event.message ?? '', ready);
    };
    started.onmessageerror = () => {
      if (inSeat()) crashed('its answer could not be read', ready);
    };
    worker = started;
    return started;
  }

  return {
    post(message) {
      try {
        (worker ?? start()).postMessage(message);
        return true;
      } catch (error) {
        crashed(error instanceof Error ? error.message : String(error), ready);
        return false;
      }
    },
    isReady: () => ready,
    watch(ms) {
      clearTimeout(watchdog);
      watchdog = setTimeout(() => silent(ready), ms);
    },
    quiet: () => clearTimeout(watchdog),
    clear(nextKind) {
      clearTimeout(watchdog);
      worker?.terminate();
      worker = undefined;
      ready = false;
      kind = nextKind;
    },
  };
}
