import type { Order } from '../optimise/order';
import type { BlendOutcome } from '../optimise/outcome';
import { solveBlend } from '../optimise/solveBlend';
import { type ResolvedOptions, resolveOptions, type SolveOptions } from '../optimise/solveOptions';

/** Solves again and again under one time limit, and counts. */
export class LimitedSolves {
  readonly #options: ResolvedOptions;
  readonly #start: number;
  #count = 0;

  /** @param defaultLimitMs time for all solves together [ms] where the options say nothing. */
  constructor(options: SolveOptions, defaultLimitMs: number) {
    this.#options = resolveOptions({ ...options, timeLimitMs: options.timeLimitMs ?? defaultLimitMs });
    this.#start = this.#options.now();
  }

  get count(): number {
    return this.#count;
  }

  get relativeGap(): number {
    return this.#options.relativeGap;
  }

  /** Why no further solve may start; undefined where one may. */
  get stopped(): 'time limit' | 'cancelled' | undefined {
    if (this.#options.isCancelled()) return 'cancelled';
    return this.#restMs() > 0 ? undefined : 'time limit';
  }

  /**
   * @param near KV100 [mm²/s] of a similar recipe, where one is known.
   * @param part greatest part of the time left that this solve may take [-].
   */
  async solve(order: Order, near?: number, part = 1): Promise<BlendOutcome> {
    this.#count++;
    const { near: first, onProgress: _, ...options } = this.#options;
    const start = near ?? first;
    return solveBlend(order, {
      ...options,
      timeLimitMs: Math.max(0, part * this.#restMs()),
      ...(start === undefined ? {} : { near: start }),
    });
  }

  #restMs(): number {
    return this.#options.timeLimitMs - (this.#options.now() - this.#start);
  }
}

/** KV100 [mm²/s] of a recipe, where it is known: where to look first in a similar order. */
export function kv100Of({ properties }: BlendOutcome): number | undefined {
  return properties?.properties.find(({ property, celsius }) => property === 'kv' && celsius === 100)?.value;
}
