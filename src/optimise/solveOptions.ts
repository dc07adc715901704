import type { LinearEngine } from './linear/linearEngine';
import type { SolveProgress } from './outcome';

/** How to solve; every field has a default. */
export interface SolveOptions {
  /** Search time [ms]; then the best recipe so far is returned with an honest gap. Default 20 000. */
  timeLimitMs?: number;
  /** Relative gap at which the search counts as finished [-]. Default 1e-6. */
  relativeGap?: number;
  onProgress?: (progress: SolveProgress) => void;
  isCancelled?: () => boolean;
  /** Clock [ms]. Default: the machine's; the only mention of a clock in the engine. */
  now?: () => number;
  /** Lets the surroundings breathe (read messages) from time to time. Default: does nothing. */
  pause?: () => Promise<void>;
  /** Default: the compact engine with HiGHS in reserve, loaded once. */
  linearEngine?: LinearEngine;
  /** KV100 [mm²/s] of a recipe for a similar order: where to look first. Changes the time, not the answer. */
  near?: number;
}

type Open = 'linearEngine' | 'near';

export type ResolvedOptions = Required<Omit<SolveOptions, Open>> & Pick<SolveOptions, Open>;

/** The options with defaults filled in. Throws RangeError for a time limit or gap that is no number. */
export function resolveOptions(options: SolveOptions): ResolvedOptions {
  const timeLimitMs = options.timeLimitMs ?? 20_000;
  const relativeGap = options.relativeGap ?? 1e-6;
  if (!(timeLimitMs >= 0)) throw new RangeError(`timeLimitMs must be zero or more, not ${timeLimitMs}.`);
  if (!(relativeGap >= 0 && relativeGap < 1)) throw new RangeError(`relativeGap must be 0 to 1, not ${relativeGap}.`);
  return {
    timeLimitMs,
    relativeGap,
    onProgress: options.onProgress ?? (() => {}),
    isCancelled: options.isCancelled ?? (() => false),
    now: options.now ?? (() => Date.now()),
    pause: options.pause ?? (async () => {}),
    ...(options.linearEngine ? { linearEngine: options.linearEngine } : {}),
    ...(options.near === undefined ? {} : { near: options.near }),
  };
}
