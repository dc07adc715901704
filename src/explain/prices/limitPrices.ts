import { limitDefinition } from '../../optimise/rows/limitEnds';
import type { LimitPrice } from '../explanation';
import { type LimitEnd, statedEnd, statedEnds, withoutEnd } from '../limitEnd';
import { limitStep, loosened, roomToLoosen } from './limitStep';
import { holdsTo, kv100Along } from './priceHolds';
import type { SolvesAgain } from './solvesAgain';

/**
 * Prices of the ends of limits that the mix sits on, and of others that cost something all the same: none in a convex
 * order, but with whole drums, least doses or a viscosity index there may be.
 */
export async function* limitPrices(again: SolvesAgain): AsyncGenerator<LimitPrice> {
  const { order } = again;
  const ends = statedEnds(order);
  for (const end of ends) if (sitsOn(again, end)) yield await priceOf(again, end);
  const others = ends.filter((end) => !sitsOn(again, end));
  if (others.length === 0) return;
  const { cost } = await again.solve(others.reduce(withoutEnd, order));
  if (again.amount(again.cost - cost) === 0) return;
  for (const end of others) {
    const price = await priceOf(again, end);
    if (price.withoutSaves > 0) yield price;
  }
}

/** Whether the mix sits on this end (and not on the other one alone). */
function sitsOn({ outcome }: SolvesAgain, { limit, end }: LimitEnd): boolean {
  const check = outcome.checks.find((candidate) => candidate.limit === limit);
  if (!check?.onLimit) return false;
  const own = check[end];
  const other = check[end === 'min' ? 'max' : 'min'];
  if (own === undefined) return false;
  return other === undefined || Math.abs(check.value - own) <= Math.abs(check.value - other) || own === other;
}

async function priceOf(again: SolvesAgain, at: LimitEnd): Promise<LimitPrice> {
  const { order } = again;
  const limit = order.limits[at.limit];
  const definition = limitDefinition(limit, order);
  if (!definition) throw new RangeError(`Limit ${at.limit + 1} is on no known property.`);
  const { stated } = statedEnd(order, at);
  const room = roomToLoosen(limit, at.end, definition);
  const step = Math.min(limitStep(stated, definition), room > 0 ? room : Infinity);
  const without = await again.solve(withoutEnd(order, at));
  const tighter = await again.solveStricter(loosened(order, at, -step));
  const withoutSaves = again.amount(again.cost - without.cost);
  const price = {
    ...at,
    stated,
    step,
    ...(tighter.outcome.recipe ? { tighterCosts: again.amount(tighter.cost - again.cost) } : {}),
    withoutSaves,
  };
  // A tightened end may be refused (it crosses the other one, or leaves what the property can be): impossible, surely.
  const proven = again.proven && without.proven && (tighter.proven || tighter.outcome.stopped === 'refused');
  if (withoutSaves === 0 || room <= 0) return { ...price, looserSaves: 0, proven };
  const looser = await again.solve(loosened(order, at, step), kv100Along(again, tighter, -1));
  const looserSaves = Math.min(withoutSaves, again.amount(again.cost - looser.cost));
  const held =
    looserSaves === 0 ? undefined : await holdsTo(again, at, { step, room, looser, looserSaves, withoutSaves });
  return {
    ...price,
    looserSaves,
    ...(held ? { holdsTo: held.to } : {}),
    proven: proven && looser.proven && (held?.proven ?? true),
  };
}
