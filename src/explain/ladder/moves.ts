import type { Order } from '../../optimise/order';
import type { Relaxation } from '../explanation';
import { withEnd } from '../limitEnd';
import { effortOf, type Movable } from './effort';
import type { Enquiry } from './enquiry';
import { leastStep } from './leastStep';

/** How many steps each end is moved, and whether it is proven that none can be taken back. */
export interface Moves {
  steps: number[];
  proven: boolean;
}

export function effortOfSteps(ends: readonly Movable[], steps: readonly number[]): number {
  return effortOf(
    ends,
    ends.map(({ steps: end }, place) => end.at(steps[place])),
  );
}

/** The order with every end moved so many steps. */
export function moved(order: Order, ends: readonly Movable[], steps: readonly number[]): Order {
  return ends.reduce(
    (changed, { steps: end }, place) => (steps[place] > 0 ? withEnd(changed, end, end.at(steps[place])) : changed),
    order,
  );
}

/** Takes each move back as far as possible, one after another from `first` on. The moves given make a recipe possible. */
export async function takenBack(
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
export async function relaxationOf(
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
