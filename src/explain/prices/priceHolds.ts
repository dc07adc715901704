import type { LimitEnd } from '../limitEnd';
import { kv100Of } from '../limitedSolves';
import { loosened, movedOutward } from './limitStep';
import type { Answer, SolvesAgain } from './solvesAgain';

/** A price holds while the saving stays within this part of the first step's, times the steps. */
const WITHIN = 1 / 20;
/** The end of the range is found to this part of the steps up to there, or to one step. */
const RESOLUTION = 1 / 4;

/** What is known of an end before its range is sought. Lengths in the property's unit, savings in cost. */
export interface KnownSavings {
  step: number;
  /** How far the end can be loosened at all. */
  room: number;
  looserSaves: number;
  /** The order with the end one step looser. */
  looser: Answer;
  withoutSaves: number;
}

/**
 * How far an end can be loosened so that the saving stays, within a twentieth, the saving of one step times the number
 * of steps: doubling, then halving. The end returned was solved; a little further may still do.
 */
export async function holdsTo(
  again: SolvesAgain,
  end: LimitEnd,
  { step, room, looser, looserSaves, withoutSaves }: KnownSavings,
): Promise<{ to: number; proven: boolean }> {
  let proven = true;
  const keeps = async (steps: number): Promise<boolean> => {
    const answer = await again.solve(loosened(again.order, end, steps * step), kv100Along(again, looser, steps));
    proven &&= answer.proven;
    return Math.abs((again.cost - answer.cost) / (looserSaves * steps) - 1) <= WITHIN;
  };
  // Nothing saves more than taking the end away, so the price cannot hold beyond this.
  const most = Math.floor(Math.min(room / step, withoutSaves / (looserSaves * (1 - WITHIN))) * (1 + 1e-9));
  let good = 1;
  let bad: number | undefined;
  while (bad === undefined && good < most) {
    const steps = Math.min(2 * good, most);
    if (await keeps(steps)) good = steps;
    else bad = steps;
  }
  while (bad !== undefined && bad - good > Math.max(1, good * RESOLUTION)) {
    const steps = Math.floor((good + bad) / 2);
    if (await keeps(steps)) good = steps;
    else bad = steps;
  }
  return { to: movedOutward(again.order, end, good * step), proven };
}

/** KV100 [mm²/s] to expect so many steps along: the recipe moves about evenly with the end. */
export function kv100Along({ kv100 }: SolvesAgain, { outcome }: Answer, steps: number): number | undefined {
  const afterOne = kv100Of(outcome);
  if (kv100 === undefined || afterOne === undefined) return undefined;
  const expected = kv100 + steps * (afterOne - kv100);
  return expected > 0 ? expected : undefined;
}
