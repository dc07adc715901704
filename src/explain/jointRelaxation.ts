import type { Order } from '../optimise/order';
import { effortOf, type Movable } from './effort';
import type { Enquiry } from './enquiry';
import type { Relaxation } from './explanation';
import { leastStep } from './leastStep';
import { withEnd, withoutEnd } from './limitEnd';
import { valueOfMix } from './withinReach';

/** How many steps each end is moved, and whether it is proven that none can be taken back. */
interface Moves {
  steps: number[];
  proven: boolean;
}

/** One end is moved so many times as far as the others, so that the start of the search leans each way once. */
const LEANING = 4;

function moved(order: Order, ends: readonly Movable[], steps: readonly number[]): Order {
  return ends.reduce(
    (changed, { steps: end }, place) => (steps[place] > 0 ? withEnd(changed, end, end.at(steps[place])) : changed),
    order,
  );
}

function effortOfSteps(ends: readonly Movable[], steps: readonly number[]): number {
  return effortOf(
    ends,
    ends.map(({ steps: end }, place) => end.at(steps[place])),
  );
}

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

/** Takes each move back as far as possible, one after another from `first` on. */
async function takenBack(
  enquiry: Enquiry,
  order: Order,
  ends: readonly Movable[],
  from: readonly number[],
  first: number,
): Promise<Moves> {
  const steps = [...from];
  let isProven = true;
  for (let turn = 0; turn < ends.length; turn++) {
    const place = (first + turn) % ends.length;
    const isPossibleAt = (step: number) => enquiry.isPossible(moved(order, ends, steps.with(place, step)));
    const least = await leastStep(-1, steps[place], isPossibleAt);
    steps[place] = least.step;
    isProven &&= least.proven;
  }
  return { steps, proven: isProven };
}

/** A relaxation with the cheapest recipe of the order it makes; nothing where no recipe was found again. */
async function relaxationOf(
  enquiry: Enquiry,
  order: Order,
  ends: readonly Movable[],
  { steps, proven }: Moves,
): Promise<Relaxation | undefined> {
  const { outcome } = await enquiry.cheapest(moved(order, ends, steps));
  if (outcome?.costPerTonne === undefined) return undefined;
  const changes = ends.flatMap(({ steps: { limit, end, stated } }, place) => {
    return steps[place] > 0 ? [{ limit, end, stated, to: ends[place].steps.at(steps[place]) }] : [];
  });
  return {
    changes,
    effort: effortOfSteps(ends, steps),
    costPerTonne: outcome.costPerTonne,
    proven: proven && outcome.proof.kind === 'least cost',
  };
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
