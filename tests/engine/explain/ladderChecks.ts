import { expect } from 'vitest';
import {
  applyRelaxation,
  type Demand,
  explainImpossible,
  type Ladder,
  type LadderOptions,
  type Order,
  solveBlend,
  type WithinReach,
} from '../../../src/index';
import { unitOf } from '../../oracle/figures';
import type { Draw } from '../../oracle/mulberry32';
import { sliceSearch } from '../../oracle/sliceSearch';

/** A ladder with time enough on a busy machine too. */
export function ladderOf(order: Order, options: LadderOptions = {}): Promise<Ladder> {
  return explainImpossible(order, { timeLimitMs: 60_000, ...options });
}

/** Drops a demand in place, the test's own way: dropped doses and rules are marked and swept afterwards. */
function drop(order: Order, demand: Demand): void {
  if (demand.kind === 'limit') {
    const limit = order.limits[demand.limit];
    if (demand.end === 'min') delete limit.min;
    else {
      delete limit.max;
      delete limit.below;
    }
  } else if (demand.kind === 'most stocks') delete order.mostStocks;
  else if (demand.kind === 'dose') delete order.doses?.[demand.dose];
  else if (demand.kind === 'share') delete order.shares?.[demand.share];
  else {
    const stock = order.stocks.find(({ id }) => id === demand.stockId);
    if (!stock) throw new Error(`No stock "${demand.stockId}".`);
    if (demand.kind === 'amount on hand') delete stock.availableTonnes;
    if (demand.kind === 'greatest dose') delete stock.greatestDose;
    if (demand.kind === 'least dose') delete stock.leastDoseIfUsed;
    if (demand.kind === 'whole drums') delete stock.lotTonnes;
  }
}

function everyDemand(order: Order): Demand[] {
  const { limits, doses = [], shares = [], stocks } = order;
  return [
    ...limits.flatMap((_, limit) => (['min', 'max'] as const).map((end) => ({ kind: 'limit' as const, limit, end }))),
    ...doses.map((_, dose) => ({ kind: 'dose' as const, dose })),
    ...shares.map((_, share) => ({ kind: 'share' as const, share })),
    { kind: 'most stocks' },
    ...stocks.flatMap(({ id: stockId }) =>
      (['amount on hand', 'greatest dose', 'least dose', 'whole drums'] as const).map((kind) => ({ kind, stockId })),
    ),
  ];
}

/** The order that asks for these demands alone, made without the product's own functions. */
export function asksOnly(order: Order, kept: readonly Demand[]): Order {
  const copy = structuredClone(order);
  const names = new Set(kept.map((demand) => JSON.stringify(demand)));
  for (const demand of everyDemand(order)) if (!names.has(JSON.stringify(demand))) drop(copy, demand);
  return {
    ...copy,
    ...(copy.doses ? { doses: copy.doses.filter(Boolean) } : {}),
    ...(copy.shares ? { shares: copy.shares.filter(Boolean) } : {}),
  };
}

/** What a second way says (slices of KV100 with a solver of its own): 'solved', 'impossible', or it cannot tell. */
export function secondOpinion(order: Order): string {
  return sliceSearch(order).status;
}

/** An end stated anew, in place of `stated`. */
export function withEndAt(order: Order, { limit, end }: Pick<WithinReach, 'limit' | 'end'>, to: number): Order {
  const copy = structuredClone(order);
  const changed = copy.limits[limit];
  if (end === 'max' && typeof changed.below === 'number') changed.below = to;
  else changed[end] = to;
  return copy;
}

export async function possibility(order: Order): Promise<string> {
  const { recipe, proof } = await solveBlend(order);
  return recipe ? 'possible' : proof.kind === 'none' ? 'unknown' : 'impossible';
}

/** The conflict cannot hold together, and without any one of its demands it can. */
export async function expectIrreducible(order: Order, { conflict, conflictProven }: Ladder): Promise<void> {
  expect(conflictProven).toBe(true);
  expect(conflict.length).toBeGreaterThan(0);
  const whole = asksOnly(order, conflict);
  expect(await possibility(whole)).toBe('impossible');
  expect(secondOpinion(whole)).not.toBe('solved');
  for (const demand of conflict) {
    const rest = asksOnly(
      order,
      conflict.filter((other) => other !== demand),
    );
    expect(await possibility(rest)).toBe('possible');
    expect(secondOpinion(rest)).not.toBe('impossible');
  }
}

/** Each end within reach: a recipe there, none one reporting unit nearer; an end out of reach helps nothing if dropped. */
export async function expectReach(order: Order, { reach }: Ladder): Promise<void> {
  for (const entry of reach) {
    const { limit, end, stated, reachable, step, costPerTonne } = entry;
    expect(entry.proven).toBe(true);
    expect(step).toBe(unitOf(order.limits[limit]));
    if (reachable === undefined) continue;
    const outward = end === 'max' ? 1 : -1;
    expect(outward * (reachable - stated)).toBeGreaterThan(0);
    expect(Math.abs(reachable / step - Math.round(reachable / step))).toBeLessThan(1e-6);
    const there = withEndAt(order, entry, reachable);
    expect(await possibility(there)).toBe('possible');
    const second = sliceSearch(there);
    expect(second.status).not.toBe('impossible');
    if (second.status === 'solved') expect(Math.abs(second.cost / (costPerTonne ?? 0) - 1)).toBeLessThan(1e-5);
    const nearer = withEndAt(
      order,
      entry,
      end === 'max' ? Math.max(stated, reachable - step) : Math.min(stated, reachable + step),
    );
    expect(await possibility(nearer)).toBe('impossible');
    expect(secondOpinion(nearer)).not.toBe('solved');
  }
}

/** Each relaxation makes an order with a proven recipe at the cost it says; sorted; none of its moves can be taken back. */
export async function expectRelaxations(
  order: Order,
  { relaxations }: Ladder,
  weights: Record<number, number> = {},
): Promise<void> {
  expect(relaxations.map(({ effort }) => effort)).toEqual(
    relaxations.map(({ effort }) => effort).sort((a, b) => a - b),
  );
  for (const relaxation of relaxations) {
    const before = structuredClone(order);
    const applied = applyRelaxation(order, relaxation);
    expect(order).toEqual(before);
    const outcome = await solveBlend(applied);
    expect(outcome.proof.kind).toBe('least cost');
    expect(relaxation.proven).toBe(true);
    expect(outcome.costPerTonne).toBeCloseTo(relaxation.costPerTonne, 2);
    let effort = 0;
    for (const { limit, end, stated, to } of relaxation.changes) {
      const unit = unitOf(order.limits[limit]);
      effort += ((weights[limit] ?? 1) * Math.abs(to - stated)) / unit;
      const back = end === 'max' ? Math.max(stated, to - unit) : Math.min(stated, to + unit);
      expect(await possibility(withEndAt(applied, { limit, end }, back))).toBe('impossible');
    }
    expect(relaxation.effort).toBeCloseTo(effort, 6);
  }
}

/** Ends of limits, whatever states them. */
function ends({ limits }: Order): { limit: number; end: 'min' | 'max'; stated: number }[] {
  return limits.flatMap(({ min, max }, limit) => [
    ...(min === undefined ? [] : [{ limit, end: 'min' as const, stated: min }]),
    ...(max === undefined ? [] : [{ limit, end: 'max' as const, stated: max }]),
  ]);
}

/**
 * Attacks the bound on effort: whatever moves of whole reporting units share out a little less than it, no recipe may
 * come of them. For orders without weights and "below".
 */
export async function expectBound(order: Order, { leastEffort, relaxations }: Ladder, draw: Draw): Promise<void> {
  if (relaxations.length === 0) return;
  expect(leastEffort).toBeGreaterThan(0);
  expect(leastEffort).toBeLessThanOrEqual(relaxations[0].effort);
  for (let turn = 0; turn < 8; turn++) {
    let left = (leastEffort ?? 0) * (1 - 1e-6);
    let changed = order;
    for (const { limit, end, stated } of draw.shuffled(ends(order))) {
      const unit = unitOf(order.limits[limit]);
      const own = left * draw.next();
      const outward = end === 'max' ? 1 : -1;
      const to = Math.floor(outward * (stated / unit) + own) * outward * unit;
      if (outward * (to - stated) <= 0) continue;
      left -= Math.abs(to - stated) / unit;
      changed = withEndAt(changed, { limit, end }, to);
    }
    expect(await possibility(changed)).toBe('impossible');
    if (turn === 0) expect(secondOpinion(changed)).not.toBe('solved');
  }
}
