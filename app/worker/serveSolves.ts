import { type BlendOutcome, type SolveOptions, solveBlend } from '../../src';
import type { FromWorker, ToWorker } from './protocol';

type Request = Extract<ToWorker, { kind: 'solve' }>;
type LinearEngine = NonNullable<SolveOptions['linearEngine']>;

/** What a worker's surroundings give it. */
export interface WorkerSurroundings {
  send(message: FromWorker): void;
  loadEngine(): Promise<LinearEngine>;
  /** Clock [ms]. */
  now(): number;
  /** Lets messages in. */
  pause(): Promise<void>;
}

function kv100Of({ properties }: BlendOutcome): number | undefined {
  return properties?.properties.find(({ property, celsius }) => property === 'kv' && celsius === 100)?.value;
}

/** An error in a few words. What the wasm loader adds for its own developers means nothing here. */
function inWords(error: unknown): string {
  const message = error instanceof Error ? error.message : String(error);
  const own = /^Aborted\((.*)\)\. Build with .*$/.exec(message)?.[1] ?? message;
  return own.replace(/\.$/, '');
}

/**
 * The worker's side of the conversation: one solve at a time, a newer request supersedes the one that runs, a cancel
 * ends it with what it has. Returns the function that takes the page's messages.
 */
export function serveSolves({ send, loadEngine, now, pause }: WorkerSurroundings): (message: ToWorker) => void {
  const engine = loadEngine();
  let newest = 0;
  let cancelled = 0;
  /** KV100 of the last recipe: an order is mostly the one before, with a limit moved. */
  let near: number | undefined;
  let queue: Promise<void> = engine.then(
    () => send({ kind: 'ready' }),
    (error: unknown) => send({ kind: 'no engine', message: inWords(error) }),
  );

  async function answer({ id, order, timeLimitMs }: Request): Promise<void> {
    try {
      const outcome = await solveBlend(order, {
        timeLimitMs,
        now,
        pause,
        linearEngine: await engine,
        ...(near === undefined ? {} : { near }),
        isCancelled: () => id < newest || id <= cancelled,
        onProgress: (progress) => send({ kind: 'progress', id, progress }),
      });
      near = kv100Of(outcome) ?? near;
      send({ kind: 'outcome', id, outcome });
    } catch (error) {
      send({ kind: 'error', id, message: inWords(error) });
    }
  }

  return (message) => {
    if (message.kind === 'cancel') cancelled = Math.max(cancelled, message.id);
    else {
      newest = Math.max(newest, message.id);
      queue = queue.then(() => answer(message));
    }
  };
}

/** Lets messages in through a MessageChannel: about 0.01 ms, where setTimeout costs 4 ms. */
export function channelPause(): () => Promise<void> {
  const { port1, port2 } = new MessageChannel();
  const waiting: (() => void)[] = [];
  port1.onmessage = () => waiting.shift()?.();
  return () =>
    new Promise((resolve) => {
      waiting.push(resolve);
      port2.postMessage(undefined);
    });
}
