import { createHighsEngine } from './linear/highsEngine';
import type { LinearEngine } from './linear/linearEngine';

let loading: Promise<LinearEngine> | undefined;

/** HiGHS, loaded once; a failed load is tried again the next time. */
export function defaultEngine(): Promise<LinearEngine> {
  loading ??= createHighsEngine().catch((error: unknown) => {
    loading = undefined;
    throw error;
  });
  return loading;
}
