import { type BlendOutcome, type SolveOptions, solveBlend } from '../../src';
import type { FromWorker, ToWorker } from './protocol';
import type { Question, Told } from './questions';

type Request = Extract<ToWorker, { kind: 'solve' | 'ask' }>;
type LinearEngine = NonNullable<SolveOptions['linearEngine']>;

/** What a worker's surroundings give it. */
export interface WorkerSurroundings {
  send(message: FromWorker): void;
  loadEngine(): Promise<LinearEngine>;
  /** Answers a question about an answered order. */
  answerQuestion(question: Question, options: SolveOptions): Promise<Told>;
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
 * The worker's side of the conversation: one solve or question at a time, a newer request supersedes the one that runs,
 * a cancel ends it with what it has. Returns the function that takes the page's messages.
 */
export function serveSolves(surroundings: WorkerSurroundings): (message: ToWorker) => void {
  const { send, loadEngine, answerQuestion, now, pause } = surroundings;
  const engine = loadEngine();
  let newest = 0;
  let cancelled = 0;
  /** KV100 of the last recipe: an order is mostly the one before, with a limit moved. */
  let near: number | undefined;
  let queue: Promise<void> = engine.then(
    () => send({ kind: 'ready' }),
    (error: unknown) => send({ kind: 'no engine', message: inWords(error) }),
  );

  async function reply(request: Request, options: SolveOptions): Promise<void> {
    const { id } = request;
    if (request.kind === 'ask') {
      send({ kind: 'told', id, told: await answerQuestion(request.question, options) });
      return;
    }
    const onProgress: SolveOptions['onProgress'] = (progress) => send({ kind: 'progress', id, progress });
    const outcome = await solveBlend(request.order, { ...options, onProgress });
    near = kv100Of(outcome) ?? near;
    send({ kind: 'outcome', id, outcome });
  }

  async function answer(request: Request): Promise<void> {
    const { id, timeLimitMs } = request;
    try {
      await reply(request, {
        timeLimitMs,
        now,
        pause,
        linearEngine: await engine,
        ...(near === undefined ? {} : { near }),
        isCancelled: () => id < newest || id <= cancelled,
      });
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
