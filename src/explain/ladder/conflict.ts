import type { Order } from '../../optimise/order';
import type { BlendOutcome } from '../../optimise/outcome';
import { doseInWords, ruleInWords } from '../../optimise/ruleInWords';
import type { Demand } from '../explanation';
import { demandsOf, onlyDemands } from './demands';
import type { Enquiry } from './enquiry';

/** Whether the proof of impossibility seems to lean on a demand: a hint only, since the proof speaks in sentences. */
function seemsInvolved(demand: Demand, order: Order, { conflict = [], conflictRules = [] }: BlendOutcome): boolean {
  switch (demand.kind) {
    case 'limit':
      return conflict.includes(demand.limit);
    case 'dose':
    case 'share': {
      const dose = demand.kind === 'dose' ? order.doses?.[demand.dose] : undefined;
      const rule = demand.kind === 'share' ? order.shares?.[demand.share] : undefined;
      const words = dose ? doseInWords(dose, order.stocks) : rule ? ruleInWords(rule, order.stocks) : '';
      const name = order.stocks.find(({ id }) => id === dose?.stockId)?.name;
      return conflictRules.some((told) => told === words || (name !== undefined && told.startsWith(name)));
    }
    case 'most stocks':
      return conflictRules.some((told) => told.startsWith('at most '));
    default: {
      const name = order.stocks.find(({ id }) => id === demand.stockId)?.name;
      return name !== undefined && conflictRules.some((told) => told.startsWith(name));
    }
  }
}

/**
 * A smallest subset of `suspects` that is impossible together with `fixed`, by halves (the QuickXplain scheme of
 * Junker 2004). `fixed` and `suspects` together are impossible. Earlier suspects are kept in preference to later ones.
 * Whatever a solve leaves unknown only makes the subset larger: the subset is always impossible.
 */
async function smallest(
  enquiry: Enquiry,
  order: Order,
  fixed: readonly Demand[],
  isFixedNew: boolean,
  suspects: readonly Demand[],
): Promise<Demand[]> {
  if (isFixedNew && (await enquiry.isPossible(onlyDemands(order, fixed))).state === 'impossible') return [];
  if (suspects.length <= 1) return [...suspects];
  const half = Math.ceil(suspects.length / 2);
  const [first, second] = [suspects.slice(0, half), suspects.slice(half)];
  const fromSecond = await smallest(enquiry, order, [...fixed, ...first], true, second);
  const fromFirst = await smallest(enquiry, order, [...fixed, ...fromSecond], fromSecond.length > 0, first);
  return [...fromFirst, ...fromSecond];
}

/** Whether a recipe was found for every set that lacks one of the demands. */
async function isIrreducible(enquiry: Enquiry, order: Order, conflict: readonly Demand[]): Promise<boolean> {
  for (const demand of conflict) {
    const rest = conflict.filter((other) => other !== demand);
    if ((await enquiry.isPossible(onlyDemands(order, rest))).state !== 'possible') return false;
  }
  return true;
}

async function smallestOf(enquiry: Enquiry, order: Order, outcome: BlendOutcome): Promise<Demand[]> {
  const all = demandsOf(order);
  const involved = all.filter((demand) => seemsInvolved(demand, order, outcome));
  const isEnough =
    involved.length < all.length && (await enquiry.isPossible(onlyDemands(order, involved))).state === 'impossible';
  return smallest(enquiry, order, [], true, isEnough ? involved : all);
}

/**
 * A smallest set of demands of an impossible order that cannot hold together. The set itself is always proven
 * impossible; `isProven` adds that a recipe was found without each single one of them. Empty where the order is
 * impossible even if it asks for nothing.
 */
export async function smallestConflict(
  enquiry: Enquiry,
  order: Order,
  outcome: BlendOutcome,
): Promise<{ conflict: Demand[]; isProven: boolean }> {
  const conflict = await smallestOf(enquiry, order, outcome);
  return { conflict, isProven: await isIrreducible(enquiry, order, conflict) };
}

/** Some demands of an order that cannot hold together; none where the order is not proven impossible. */
export async function oneConflict(enquiry: Enquiry, order: Order): Promise<Demand[]> {
  const { state, outcome } = await enquiry.isPossible(order);
  return state === 'impossible' && outcome ? smallestOf(enquiry, order, outcome) : [];
}
