import type { Order } from '../../optimise/order';
import type { BlendOutcome } from '../../optimise/outcome';
import { gapReference } from '../../optimise/search/gapReference';
import { resolveOptions, type SolveOptions } from '../../optimise/solveOptions';
import type { Stock } from '../../stock/stock';
import { kv100Of, LimitedSolves } from '../limitedSolves';
import { type CostLine, costLine } from './costLine';

/** Time for all solves together [ms] where the options say nothing. */
const DEFAULT_LIMIT_MS = 5_000;
/** Two searches, each to its gap, may differ by twice the gap; a gap of nothing leaves the engine's own digits. */
const LEAST_GAP = 1e-9;

/** Thrown where no further solve may start: what is done so far stands. */
export class StoppedEarly extends Error {
  constructor(readonly reason: 'time limit' | 'cancelled' | 'engine failed') {
    super(reason);
  }
}

/** What solving a changed order said. */
export interface Answer {
  /** What the search made least; Infinity where the order is impossible. */
  cost: number;
  /** The recipe and the cost are proven to the gap, or the impossibility is. */
  proven: boolean;
  outcome: BlendOutcome;
}

/**
 * Solves an order again with one thing changed. Costs are `objective` of the outcome: per tonne, or per m³ where the
 * order says so, with what deviations from aims count.
 *
 * Recipes that meet the order as stated are kept as lines over the prices (`lines`): they bound later answers.
 */
export class SolvesAgain {
  /** What the recipe to be explained costs. */
  readonly cost: number;
  readonly proven: boolean;
  /** Recipes that meet the order as stated. */
  readonly lines: CostLine[] = [];
  /** The line of the recipe to be explained. */
  readonly line: CostLine;
  readonly #solves: LimitedSolves;
  readonly #pause: () => Promise<void>;
  /** KV100 of the recipe to be explained [mm²/s], where it is known: where to look first in an order much like it. */
  readonly kv100: number | undefined;
  readonly #prices: readonly number[];

  /** Throws RangeError for an outcome without a recipe. */
  constructor(
    readonly order: Order,
    readonly outcome: BlendOutcome,
    options: SolveOptions,
  ) {
    const { recipe, objective } = outcome;
    if (!recipe || objective === undefined) {
      throw new RangeError('Only a recipe can be explained: this outcome has none. Solve the order first.');
    }
    this.cost = objective;
    this.proven = outcome.proof.kind === 'least cost';
    this.line = costLine(order, recipe, objective);
    // A recipe named near the order as stated says nothing of a changed one.
    const { near: _, ...others } = options;
    this.#solves = new LimitedSolves(others, DEFAULT_LIMIT_MS);
    this.#pause = resolveOptions(options).pause;
    this.kv100 = kv100Of(outcome);
    this.#prices = order.stocks.map((stock) => stock.pricePerTonne);
  }

  get count(): number {
    return this.#solves.count;
  }

  /**
   * Solves a changed order. Throws StoppedEarly where time is up, before or during.
   *
   * @param near KV100 [mm²/s] where the recipe is expected; a wrong one costs more time than none.
   */
  async solve(order: Order, near?: number): Promise<Answer> {
    await this.#pause();
    const before = this.#solves.stopped;
    if (before) throw new StoppedEarly(before);
    const outcome = await this.#solves.solve(order, near);
    const { stopped, proof, objective } = outcome;
    if (stopped === 'time limit' || stopped === 'cancelled' || stopped === 'engine failed') {
      throw new StoppedEarly(stopped);
    }
    return { cost: objective ?? Infinity, proven: proof.kind !== 'none' && proof.kind !== 'within gap', outcome };
  }

  /** Solves an order whose recipes all meet the order as stated; its prices are the stated ones. */
  async solveStricter(order: Order): Promise<Answer> {
    const answer = await this.solve(order);
    const { recipe } = answer.outcome;
    if (recipe) this.lines.push(costLine(this.order, recipe, answer.cost));
    return answer;
  }

  /** Solves the order with other prices of some stocks; price steps move along, so that the cost moves with the share. */
  async solveAtPrices(prices: ReadonlyMap<string, number>, near?: number): Promise<Answer> {
    const stocks = this.order.stocks.map((stock) => {
      const price = prices.get(stock.id);
      return price === undefined ? stock : atPrice(stock, price);
    });
    const changed = { ...this.order, stocks };
    const answer = await this.solve(changed, near);
    const { recipe } = answer.outcome;
    if (recipe) {
      const line = costLine(changed, recipe, answer.cost);
      this.lines.push(line.atPrices(this.order));
    }
    return answer;
  }

  /** Whether nothing is cheaper than the explained recipe at lower prices of stocks that it does not use: proven. */
  async staysCheapest(prices: ReadonlyMap<string, number>): Promise<boolean> {
    const { cost, proven } = await this.solveAtPrices(prices);
    return proven && cost >= this.cost - this.noiseAt(this.cost);
  }

  /** Price per tonne of a stock as the order states it. */
  presentPrice(stockId: string): number {
    return this.order.stocks.find((stock) => stock.id === stockId)?.pricePerTonne ?? Number.NaN;
  }

  /** Differences between costs of this size say nothing up to here. */
  noiseAt(cost: number): number {
    return 2 * Math.max(this.#solves.relativeGap, LEAST_GAP) * gapReference(cost, this.#prices);
  }

  /** A difference of costs without its noise: zero or more. */
  amount(difference: number): number {
    return difference > this.noiseAt(this.cost) ? difference : 0;
  }
}

function atPrice(stock: Stock, pricePerTonne: number): Stock {
  const by = pricePerTonne - stock.pricePerTonne;
  const priceSteps = stock.priceSteps?.map((step) => ({ ...step, pricePerTonne: step.pricePerTonne + by }));
  return { ...stock, pricePerTonne, ...(priceSteps ? { priceSteps } : {}) };
}
