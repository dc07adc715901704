import type { Order } from '../../optimise/order';
import type { BlendOutcome } from '../../optimise/outcome';
import type { WithinReach } from '../explanation';
import { withEnd, withoutEnd } from '../limitEnd';
import type { EndSteps } from './endSteps';
import type { Enquiry } from './enquiry';
import { leastStep } from './leastStep';

/** The mix's value of a limit, where it is known. */
export function valueOfMix(outcome: BlendOutcome | undefined, limit: number): number | undefined {
  return outcome?.checks.find((check) => check.limit === limit)?.value;
}

/**
 * The nearest end that can be met with everything else kept: first with the end taken away (impossible still: out of
 * reach), then by bisection over multiples of the reporting unit between the stated end and what that recipe has.
 * Certified both ways: the recipe at `reachable` was found, one step nearer is proven impossible.
 */
export async function withinReach(enquiry: Enquiry, order: Order, steps: EndSteps): Promise<WithinReach> {
  const { limit, end, stated, unit } = steps;
  const base = { limit, end, stated, step: unit };
  const open = await enquiry.isPossible(withoutEnd(order, steps));
  if (open.state !== 'possible') return { ...base, proven: open.state === 'impossible' };
  const isPossibleAt = (step: number) => enquiry.isPossible(withEnd(order, steps, steps.at(step)));
  const far = steps.stepFor(valueOfMix(open.outcome, limit));
  if (far === steps.last) {
    const { state } = await isPossibleAt(far);
    if (state !== 'possible') return { ...base, proven: state === 'impossible' };
  }
  const { step, proven } = await leastStep(0, far, isPossibleAt);
  const reachable = steps.at(step);
  const { outcome } = await enquiry.cheapest(withEnd(order, steps, reachable));
  return {
    ...base,
    reachable,
    ...(outcome?.costPerTonne === undefined ? {} : { costPerTonne: outcome.costPerTonne }),
    proven: proven && outcome?.proof.kind === 'least cost',
  };
}
