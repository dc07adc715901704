import type { Order } from '../../optimise/order';
import type { Relaxation } from '../explanation';
import { type LimitEnd, withoutEnd } from '../limitEnd';
import { oneConflict } from './conflict';
import type { Movable } from './effort';
import type { Enquiry } from './enquiry';
import { jointRelaxations } from './jointRelaxation';
import { leastEffort } from './leastEffort';
import { moved, relaxationOf } from './moves';

function isSameEnd(a: LimitEnd, b: LimitEnd): boolean {
  return a.limit === b.limit && a.end === b.end;
}

/** Of relaxations that move the same ends, the one of least effort; least first. */
function leastOfEachSet(relaxations: readonly Relaxation[]): Relaxation[] {
  const bySet = new Map<string, Relaxation>();
  for (const relaxation of relaxations) {
    const set = JSON.stringify(relaxation.changes.map(({ limit, end }) => [limit, end]).sort());
    const known = bySet.get(set);
    if (!known || relaxation.effort < known.effort) bySet.set(set, relaxation);
  }
  return [...bySet.values()].sort((a, b) => a.effort - b.effort);
}

/**
 * Ways to make an impossible order possible by moving limits, and a proven bound of their effort. Starts from the ends
 * of one conflict, `first`; where undoing it runs into another conflict, the ends of that one join in, until the best
 * relaxation found comes near the bound. `singles` are those that move one end alone, `all` every stated end.
 */
export async function findRelaxations(
  enquiry: Enquiry,
  order: Order,
  first: readonly Movable[],
  all: readonly Movable[],
  singles: readonly Relaxation[],
): Promise<{ relaxations: Relaxation[]; leastEffort: number }> {
  let ends = [...first];
  let relaxations = leastOfEachSet(singles);
  let bound = 0;
  while (ends.length > 0) {
    const others = all.filter(({ steps }) => !ends.some((own) => isSameEnd(own.steps, steps)));
    const least = relaxations[0]?.effort ?? Infinity;
    if (ends.length > 1) {
      relaxations = leastOfEachSet([...relaxations, ...(await jointRelaxations(enquiry, order, ends, least))]);
    }
    let inTheWay = ends.reduce((changed, { steps }) => withoutEnd(changed, steps), order);
    if (relaxations.length > 0) {
      const otherEnds = others.map(({ steps }) => steps);
      const found = await leastEffort(enquiry, order, ends, otherEnds, relaxations[0].effort);
      const better = found.better && (await relaxationOf(enquiry, order, ends, found.better));
      if (better) relaxations = leastOfEachSet([...relaxations, better]);
      bound = Math.max(bound, found.atLeast);
      if (!found.blockedAt) break;
      inTheWay = moved(order, ends, found.blockedAt);
    }
    const conflict = await oneConflict(enquiry, inTheWay);
    const joining = others.filter(({ steps }) =>
      conflict.some((demand) => demand.kind === 'limit' && isSameEnd(demand, steps)),
    );
    if (joining.length === 0) break;
    ends = [...ends, ...joining];
  }
  const best = Math.min(...relaxations.map(({ effort }) => effort));
  return { relaxations, leastEffort: Math.min(bound, best) };
}
