import type { WorkerLike } from './protocol';

export type EngineKind = 'highs' | 'javascript';

/** A worker of its own for each engine. */
export function createWorker(kind: EngineKind): WorkerLike {
  return kind === 'highs'
    ? new Worker(new URL('./solver.worker.ts', import.meta.url), { type: 'module', name: 'solver' })
    : new Worker(new URL('./secondEngine.worker.ts', import.meta.url), { type: 'module', name: 'second engine' });
}
