import type { Order } from '../../optimise/order';
import type { Relaxation } from '../explanation';
import { withoutEnd } from '../limitEnd';
import type { Movable } from './effort';
import type { Enquiry } from './enquiry';
import { leastStep } from './leastStep';
import { effortOfSteps, type Moves, moved, relaxationOf, takenBack } from './moves';
import { valueOfMix } from './withinReach';

/** One end is moved so many times as far as the others, so that the start of the search leans each way once. */
const LEANING = 4;

/** Steps that let a known recipe in: from the order without these ends. Nothing where even that is impossible. */
async function farEnough(enquiry: Enquiry, order: Order, ends: readonly Movable[]): Promise<number[] | undefined> {
  const open = ends.reduce((changed, { steps }) => withoutEnd(changed, steps), order);
  const { outcome, state } = await enquiry.isPossible(open);
  if (state !== 'possible') return undefined;
  const steps = ends.map(({ steps: end }) => end.stepFor(valueOfMix(outcome, end.limit)));
  return (await enquiry.isPossible(moved(order, ends, steps))).state === 'possible' ? steps : undefined;
}

/** The least common effort at which every end moves by its part of it. */
async function commonMoves(
  enquiry: Enquiry,
  order: Order,
  ends: readonly Movable[],
  far: readonly number[],
  leaningOn: number | undefined,
): Promise<number[]> {
  const perStep = ends.map(({ weight }, place) => (place === leaningOn ? weight / LEANING : weight));
  const most = Math.max(...far.map((steps, place) => Math.ceil(steps * perStep[place])));
  const stepsAt = (effort: number) =>
    ends.map(({ steps: end }, place) => Math.min(end.last, Math.floor(effort / perStep[place] + 1e-9)));
  const { step } = await leastStep(0, Math.max(1, most), (effort) =>
    enquiry.isPossible(moved(order, ends, stepsAt(effort))),
  );
  return stepsAt(step);
}

/**
 * Relaxations that move two or more of these ends, the least effort found for each set of ends, least first. Found by
 * moving all ends together in proportion to their weights (and once with each of them leaning out), and taking each
 * move back as far as possible from each end first.
 *
 * Proven of each: the order it makes has a recipe, and no single move can be taken back by one reporting unit while
 * the others stay. Not proven: that no other relaxation takes less effort.
 */
export async function jointRelaxations(
  enquiry: Enquiry,
  order: Order,
  ends: readonly Movable[],
  lessEffortThan: number,
): Promise<Relaxation[]> {
  const far = await farEnough(enquiry, order, ends);
  if (!far) return [];
  const bySet = new Map<string, Moves>();
  for (const leaningOn of [undefined, ...ends.keys()]) {
    const start = await commonMoves(enquiry, order, ends, far, leaningOn);
    for (const first of ends.keys()) {
      if (enquiry.stopped !== 'finished') break;
      const moves = await takenBack(enquiry, order, ends, start, first);
      const set = moves.steps.map((step) => (step > 0 ? 1 : 0)).join('');
      const known = bySet.get(set);
      if (!known || effortOfSteps(ends, moves.steps) < effortOfSteps(ends, known.steps)) bySet.set(set, moves);
    }
  }
  const found = [...bySet.values()].filter(
    ({ steps }) => steps.filter((step) => step > 0).length > 1 && effortOfSteps(ends, steps) < lessEffortThan,
  );
  const relaxations: Relaxation[] = [];
  for (const moves of found) {
    const relaxation = await relaxationOf(enquiry, order, ends, moves);
    if (relaxation) relaxations.push(relaxation);
  }
  return relaxations;
}
