import type { Order } from '../../optimise/order';
import type { BlendOutcome } from '../../optimise/outcome';
import { isCompulsory } from '../../optimise/rows/candidates';
import type { SolveOptions } from '../../optimise/solveOptions';
import type { Alternative } from '../explanation';
import { kv100Of, LimitedSolves } from '../limitedSolves';
import { withoutStocks } from '../withoutStocks';

export interface AlternativesOptions extends SolveOptions {
  /** Greatest number of alternatives. Default 5. */
  count?: number;
  /** Greatest cost above the cheapest, as a part of it [-]. Default 0.05. */
  within?: number;
}

export interface Alternatives {
  /** The cheapest first, in the order's cost basis; the cheapest recipe of all is not among them. */
  list: Alternative[];
  /** `finished`: the list is whole. Else there may be more, and those listed are still the next in order. */
  stopped: 'finished' | 'time limit' | 'cancelled';
  solves: number;
}

/** The recipes without certain stocks, and a bound of their cost; solved once it is the cheapest part left. */
interface Part {
  excluded: readonly string[];
  bound: number;
  near?: number;
  outcome?: BlendOutcome;
}

function stocksOf({ recipe }: BlendOutcome): string[] {
  return (recipe ?? []).map((line) => line.stockId);
}

function isWithin(set: readonly string[], other: readonly string[]): boolean {
  return set.every((id) => other.includes(id));
}

/** What no recipe of the outcome's part costs less than, to the gap asked for. */
function boundOf({ proof, objective }: BlendOutcome): number {
  return (proof.kind === 'least cost' ? objective : proof.lowerBound) ?? -Infinity;
}

/** Parts of all recipes, the cheapest bound first; no set of excluded stocks comes twice. */
class PartQueue {
  readonly #parts: Part[] = [];
  readonly #seen = new Set<string>();

  push(part: Part): void {
    const place = this.#parts.findIndex((other) => other.bound > part.bound);
    this.#parts.splice(place < 0 ? this.#parts.length : place, 0, part);
  }

  /** The recipes of a part that lack at least one of certain stocks, as one part for each stock. */
  split({ excluded, bound, outcome }: Part, stockIds: readonly string[]): void {
    const near = outcome && kv100Of(outcome);
    for (const stockId of stockIds) {
      const all = [...excluded, stockId].sort();
      const key = JSON.stringify(all);
      if (this.#seen.has(key)) continue;
      this.#seen.add(key);
      this.push({ excluded: all, bound, ...(near === undefined ? {} : { near }) });
    }
  }

  pop(): Part | undefined {
    return this.#parts.shift();
  }
}

function alternativeOf(outcome: BlendOutcome, cheapest: BlendOutcome, proven: boolean): Alternative {
  const { recipe = [], costPerTonne = Number.NaN } = outcome;
  const [own, first] = [stocksOf(outcome), stocksOf(cheapest)];
  return {
    recipe,
    costPerTonne,
    dearerBy: costPerTonne - (cheapest.costPerTonne ?? Number.NaN),
    without: first.filter((id) => !own.includes(id)),
    instead: own.filter((id) => !first.includes(id)),
    proven,
  };
}

/**
 * The next cheapest recipes after that of `outcome`, each without at least one stock of every cheaper one, up to
 * `within` above it. Exact: a part of which a recipe is listed is split by leaving out each of that recipe's stocks in
 * turn, and a recipe lies in none of the new parts only if it has all those stocks, so every recipe that may still be
 * listed lies in some part of the queue. Parts are taken by the proven cost of their cheapest recipe, so the first one
 * met that has all the stocks of none listed is the cheapest such recipe there is.
 *
 * Costs are compared in the order's cost basis, deviations from aims included. A compulsory stock is never left out.
 * One time limit covers all solves: `timeLimitMs`, default 5 s.
 */
export async function alternatives(
  order: Order,
  outcome: BlendOutcome,
  options: AlternativesOptions = {},
): Promise<Alternatives> {
  const { count = 5, within = 0.05, ...solveOptions } = options;
  const solves = new LimitedSolves(solveOptions, 5000);
  const list: Alternative[] = [];
  const { objective } = outcome;
  if (objective === undefined || !outcome.recipe) return { list, stopped: 'finished', solves: 0 };
  const ceiling = objective + within * Math.abs(objective);
  const listed: string[][] = [stocksOf(outcome)];
  const queue = new PartQueue();
  const optional = (stockIds: readonly string[]) => stockIds.filter((id) => !isCompulsory(order, id));
  queue.split({ excluded: [], bound: boundOf(outcome), outcome }, optional(listed[0]));
  let settled = true;

  while (list.length < count) {
    const part = queue.pop();
    if (!part || part.bound > ceiling) break;
    if (!part.outcome) {
      const found = solves.stopped ? undefined : await solves.solve(withoutStocks(order, part.excluded), part.near);
      const stopped = found ? found.stopped : solves.stopped;
      if (stopped === 'time limit' || stopped === 'cancelled') return { list, stopped, solves: solves.count };
      if (found?.recipe) queue.push({ ...part, bound: Math.max(part.bound, boundOf(found)), outcome: found });
      else if (!found?.proof.kind.startsWith('impossible')) settled = false;
      continue;
    }
    const own = stocksOf(part.outcome);
    const known = listed.find((set) => isWithin(set, own));
    if (!known && (part.outcome.objective ?? Infinity) <= ceiling) {
      list.push(alternativeOf(part.outcome, outcome, settled && part.outcome.proof.kind === 'least cost'));
      listed.push(own);
    }
    queue.split(part, optional(known ?? own));
  }
  return { list, stopped: 'finished', solves: solves.count };
}
