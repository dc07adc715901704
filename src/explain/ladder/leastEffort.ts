import type { Order } from '../../optimise/order';
import type { LimitEnd } from '../limitEnd';
import { withoutEnd } from '../limitEnd';
import { effortOf, type Movable } from './effort';
import type { Enquiry } from './enquiry';
import { effortOfSteps, type Moves, moved, takenBack } from './moves';

/** How near to the effort of the best relaxation the bound is to come, where several ends may move [-]. */
const GAP = 0.05;
/** Solves that a bound may take: beyond three ends the full proof takes thousands. */
const MOST_SOLVES = 300;

export interface EffortBound {
  atLeast: number;
  /** Moves of less effort than the best known before. */
  better?: Moves;
  /** Moves at which only the other ends stand in the way: a closer bound needs them to be counted. */
  blockedAt?: number[];
}

/** Moves of at least `from` and at most `to` steps of each end, and the least effort of those. */
interface Box {
  from: number[];
  to: number[];
  effort: number;
}

/** Greatest number of steps of an end that takes no more than so much effort. */
function stepsWithin({ steps, weight }: Movable, effort: number): number {
  let step = Math.min(steps.last, Math.floor(effort / weight) + 1);
  while (step > 0 && effortOf([{ steps, weight }], [steps.at(step)]) > effort) step--;
  return step;
}

/** The corner of a box up to which it is to be shown impossible: what is left of the effort, shared by the ends. */
function cornerOf({ from, to, effort }: Box, ends: readonly Movable[], target: number): number[] {
  const spare = Math.max(0, target - effort) / ends.length;
  return ends.map((end, place) => {
    const own = effortOfSteps([end], [from[place]]);
    return Math.min(to[place], Math.max(from[place], stepsWithin(end, own + spare)));
  });
}

/** What is left of a box once everything up to a corner is impossible, as boxes that do not overlap. */
function beyond({ from, to }: Box, corner: readonly number[], ends: readonly Movable[]): Box[] {
  return ends.flatMap((_, place) => {
    const least = from.with(place, corner[place] + 1);
    const most = to.map((step, other) => (other < place ? corner[other] : step));
    return least[place] > most[place] ? [] : [{ from: least, to: most, effort: effortOfSteps(ends, least) }];
  });
}

/**
 * A lower bound of the effort of every relaxation, and a better one where the search for it meets one. `best` is the
 * effort of the best relaxation known, `others` all stated ends but `ends`.
 *
 * The others are taken away, which is looser than any move of them, and only `ends` are counted: the bound holds
 * whichever limits are moved, in whole reporting units. What is impossible at some moves is impossible at lesser ones,
 * so one proof clears a box of moves; boxes that are left bound the effort from below.
 */
export async function leastEffort(
  enquiry: Enquiry,
  order: Order,
  ends: readonly Movable[],
  others: readonly LimitEnd[],
  best: number,
): Promise<EffortBound> {
  const loosest = others.reduce(withoutEnd, order);
  const gap = ends.length === 1 ? 0 : GAP;
  const most = enquiry.solves + MOST_SOLVES;
  const boxes: Box[] = [{ from: ends.map(() => 0), to: ends.map(({ steps }) => steps.last), effort: 0 }];
  let effort = best;
  let better: Moves | undefined;
  const answer = (atLeast: number): EffortBound => ({
    atLeast: Math.min(atLeast, effort),
    ...(better ? { better } : {}),
  });
  for (;;) {
    boxes.sort((a, b) => b.effort - a.effort);
    const box = boxes.pop();
    if (!box || box.effort >= effort * (1 - gap)) return answer(box?.effort ?? effort);
    if (enquiry.stopped !== 'finished' || enquiry.solves > most) return answer(box.effort);
    const target = effort * (1 - gap / 2) - (gap === 0 ? 1e-9 * effort : 0);
    const corner = cornerOf(box, ends, target);
    const { state } = await enquiry.isPossible(moved(loosest, ends, corner));
    if (state === 'unknown') return answer(box.effort);
    if (state === 'impossible') boxes.push(...beyond(box, corner, ends));
    else if ((await enquiry.isPossible(moved(order, ends, corner))).state === 'possible') {
      better = await takenBack(enquiry, order, ends, corner, 0);
      effort = effortOfSteps(ends, better.steps);
      boxes.push(box);
    } else return { ...answer(box.effort), blockedAt: corner };
  }
}
