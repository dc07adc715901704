import type { Order } from '../../optimise/order';
import type { BlendOutcome } from '../../optimise/outcome';
import type { SolveOptions } from '../../optimise/solveOptions';
import type { Demand, Ladder, Relaxation, WithinReach } from '../explanation';
import { type LimitEnd, statedEnds } from '../limitEnd';
import { smallestConflict } from './conflict';
import { onlyDemands } from './demands';
import { effortOf, type Movable } from './effort';
import { EndSteps } from './endSteps';
import { Enquiry, type Finding } from './enquiry';
import { findRelaxations } from './relaxations';
import { withinReach } from './withinReach';

/** How to explain; every field has a default. `timeLimitMs` counts for all solves together, default 5 000. */
export interface LadderOptions extends SolveOptions {
  /** What moving a limit by one reporting unit weighs, by its place in `order.limits`: above 0. Default 1. */
  weights?: Record<number, number>;
}

function weightsOf({ weights = {} }: LadderOptions): (limit: number) => number {
  for (const [limit, weight] of Object.entries(weights)) {
    if (!(weight > 0)) throw new RangeError(`The weight of limit ${Number(limit) + 1} must be above 0, not ${weight}.`);
  }
  return (limit) => weights[limit] ?? 1;
}

/** The stated ends, those of the conflict first. */
function endsInTurn(order: Order, conflict: readonly Demand[]): { end: LimitEnd; isInConflict: boolean }[] {
  const isInConflict = ({ limit, end }: LimitEnd) =>
    conflict.some((demand) => demand.kind === 'limit' && demand.limit === limit && demand.end === end);
  const ends = statedEnds(order).map((end) => ({ end, isInConflict: isInConflict(end) }));
  return [...ends.filter((entry) => entry.isInConflict), ...ends.filter((entry) => !entry.isInConflict)];
}

/** Why an order that is impossible (or not to be solved) has no demands to show for it. */
function withoutConflict({ state, outcome }: Finding, bare?: BlendOutcome): Ladder['noConflict'] {
  if (state === 'possible') return { why: 'possible', messages: ['The order can be met as it stands.'] };
  if (outcome?.problems.length) return { why: 'refused', messages: outcome.problems.map(({ message }) => message) };
  if (state === 'unknown') {
    const message = 'It is not proven that the order is impossible: the time ran out. Allow more time.';
    return { why: 'not proven', messages: [message] };
  }
  const leftOut = (outcome?.leftOut ?? []).map(({ message }) => message);
  return { why: 'no mix at all', messages: [...(bare?.conflictRules ?? []), ...leftOut] };
}

/** Moving one limit alone, where that is enough. */
function singleRelaxations(reach: readonly WithinReach[], movable: readonly Movable[]): Relaxation[] {
  return reach.flatMap(({ limit, end, stated, reachable, costPerTonne, proven }) => {
    const own = movable.find(({ steps }) => steps.limit === limit && steps.end === end);
    if (!own || reachable === undefined || costPerTonne === undefined) return [];
    const effort = effortOf([own], [reachable]);
    return [{ changes: [{ limit, end, stated, to: reachable }], effort, costPerTonne, proven }];
  });
}

/**
 * Why an order is impossible, and the nearest that is possible, found by solving it again with demands left out or
 * ends moved. `conflict` is a smallest set of demands that cannot hold together, each of them checked to be needed.
 * `reach` tells of each limit's end how near to it one can come with everything else kept: a recipe at `reachable`,
 * none one `step` (one reporting unit) nearer. `relaxations` are sorted by effort: moving one limit alone as far as
 * `reach` says, and moving several together where no single one is enough or less effort was found.
 *
 * Proven of a relaxation: that the order it makes has a recipe, of which cost, and that no single change can be taken
 * back by one reporting unit. `leastEffort` is a proven bound for every change of limits in whole reporting units: the
 * first relaxation is the cheapest possible only where its effort is no more than that.
 *
 * Nothing but `noConflict` is told of an order that is possible, refused, or not proven impossible in time. Throws
 * RangeError for options that are no numbers.
 */
export async function explainImpossible(order: Order, options: LadderOptions = {}): Promise<Ladder> {
  const weightOf = weightsOf(options);
  const enquiry = new Enquiry(options);
  const ladder = (told: Partial<Ladder>): Ladder => ({
    conflict: [],
    conflictProven: false,
    reach: [],
    relaxations: [],
    ...told,
    stopped: enquiry.stopped,
    solves: enquiry.solves,
  });
  const asStated = await enquiry.isPossible(order);
  if (asStated.state !== 'impossible' || !asStated.outcome) return ladder({ noConflict: withoutConflict(asStated) });
  const bare = await enquiry.isPossible(onlyDemands(order, []));
  if (bare.state === 'impossible') {
    return ladder({ conflictProven: true, noConflict: withoutConflict(asStated, bare.outcome) });
  }
  const { conflict, isProven } = await smallestConflict(enquiry, order, asStated.outcome);

  const reach: WithinReach[] = [];
  const ends = endsInTurn(order, conflict).map(({ end, isInConflict }) => ({
    isInConflict,
    movable: { steps: new EndSteps(order, end), weight: weightOf(end.limit) },
  }));
  for (const { isInConflict, movable } of ends) {
    if (isInConflict) reach.push(await withinReach(enquiry, order, movable.steps));
    // The conflict holds without this end, so that moving it alone is no help.
    else {
      const { limit, end, stated, unit } = movable.steps;
      reach.push({ limit, end, stated, step: unit, proven: true });
    }
  }

  const all = ends.map(({ movable }) => movable);
  const singles = singleRelaxations(reach, all);
  const own = ends.filter(({ isInConflict }) => isInConflict).map(({ movable }) => movable);
  const found = await findRelaxations(enquiry, order, own, all, singles);
  const bound = found.relaxations.length > 0 ? { leastEffort: found.leastEffort } : {};
  return ladder({ conflict, conflictProven: isProven, reach, relaxations: found.relaxations, ...bound });
}
