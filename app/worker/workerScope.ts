import { answerQuestion } from './answerQuestion';
import type { FromWorker, ToWorker } from './protocol';
import { channelPause, serveSolves, type WorkerSurroundings } from './serveSolves';

/** As much of a dedicated worker's global scope as is used; the page's library of types does not know it. */
interface WorkerScope {
  onmessage: ((event: MessageEvent<ToWorker>) => void) | null;
  postMessage(message: FromWorker): void;
}

/** Binds the conversation to the worker it runs in. */
export function serveInWorker(loadEngine: WorkerSurroundings['loadEngine']): void {
  // In a worker the global object is a DedicatedWorkerGlobalScope, which TypeScript's DOM library types as a window.
  const scope = globalThis as unknown as WorkerScope;
  const take = serveSolves({
    send: (message) => scope.postMessage(message),
    loadEngine,
    answerQuestion,
    now: () => performance.now(),
    pause: channelPause(),
  });
  scope.onmessage = ({ data }) => take(data);
}
