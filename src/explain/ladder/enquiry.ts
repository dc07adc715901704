import type { Order } from '../../optimise/order';
import type { BlendOutcome } from '../../optimise/outcome';
import type { SolveOptions } from '../../optimise/solveOptions';
import type { Ladder } from '../explanation';
import { LimitedSolves } from '../limitedSolves';

/** Whether an order can be met: by a recipe that was checked, by a proof that there is none, or nothing is known. */
export interface Finding {
  state: 'possible' | 'impossible' | 'unknown';
  outcome?: BlendOutcome;
}

/** Time for a whole ladder [ms] where the options say nothing. */
const DEFAULT_LIMIT_MS = 5_000;
/** A recipe is enough to know that an order is possible: the search need not find the cheapest [-]. */
const ANY_RECIPE = 0.9;

/** Asks of one order after another, within one time limit, whether it can be met; remembers why it had to stop. */
export class Enquiry {
  stopped: Ladder['stopped'] = 'finished';
  readonly #any: LimitedSolves;
  readonly #cheapest: LimitedSolves;
  readonly #pause: (() => Promise<void>) | undefined;

  /** Throws RangeError for options that are no numbers. */
  constructor(options: SolveOptions) {
    this.#cheapest = new LimitedSolves(options, DEFAULT_LIMIT_MS);
    this.#any = new LimitedSolves({ ...options, relativeGap: ANY_RECIPE }, DEFAULT_LIMIT_MS);
    this.#pause = options.pause;
  }

  get solves(): number {
    return this.#any.count + this.#cheapest.count;
  }

  /** Whether the order can be met. */
  isPossible(order: Order): Promise<Finding> {
    return this.#solve(this.#any, order);
  }

  /** The cheapest recipe of the order. */
  cheapest(order: Order): Promise<Finding> {
    return this.#solve(this.#cheapest, order);
  }

  async #solve(solves: LimitedSolves, order: Order): Promise<Finding> {
    await this.#pause?.();
    if (this.stopped === 'finished') this.stopped = solves.stopped ?? 'finished';
    if (this.stopped !== 'finished') return { state: 'unknown' };
    const outcome = await solves.solve(order);
    if (outcome.stopped === 'cancelled' || outcome.stopped === 'time limit') this.stopped = outcome.stopped;
    if (outcome.recipe) return { state: 'possible', outcome };
    return { state: outcome.proof.kind === 'none' ? 'unknown' : 'impossible', outcome };
  }
}
