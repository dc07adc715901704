import { createCompactEngine } from './linear/compact/compactEngine';
import { createHighsEngine, type HighsLoading } from './linear/highsEngine';
import type { LinearEngine } from './linear/linearEngine';

/** The engine of the product: our compact simplex, with HiGHS for what is too large or too awkward for it. */
export async function createEngine(loading?: HighsLoading): Promise<LinearEngine> {
  return createCompactEngine(await createHighsEngine(loading));
}

let loading: Promise<LinearEngine> | undefined;

/** The engine, loaded once; a failed load is tried again the next time. */
export function defaultEngine(): Promise<LinearEngine> {
  loading ??= createEngine().catch((error: unknown) => {
    loading = undefined;
    throw error;
  });
  return loading;
}
