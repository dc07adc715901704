import type { BlendOutcome, Order, SolveOptions } from '../../../src/index';
import type { OracleAnswer } from '../../oracle/sliceSearch';
import { worstViolation } from '../../oracle/violation';

export type Solve = (order: Order, options?: SolveOptions) => Promise<BlendOutcome>;

/** An order with what an independent second way says of it. */
export interface Case {
  name: string;
  order: Order;
  expected: { status: 'solved'; cost: number } | { status: 'impossible' };
}

/** Costs must agree to this part of themselves. */
export const COST_TOLERANCE = 5e-6;
/** A recipe may miss a stated limit by this part of a reporting unit. */
const UNIT_TOLERANCE = 1.01e-6;

export function caseOf(name: string, order: Order, answer: Pick<OracleAnswer, 'status' | 'cost'>): Case | undefined {
  if (answer.status === 'solved') return { name, order, expected: { status: 'solved', cost: answer.cost } };
  return answer.status === 'impossible' ? { name, order, expected: { status: 'impossible' } } : undefined;
}

function relative(value: number, expected: number): string {
  return `${value} against ${expected} (${((value - expected) / Math.abs(expected)).toExponential(2)} relative)`;
}

/** Everything in which an outcome differs from the second way's answer, in words; empty where they agree. */
export function differences({ order, expected }: Case, outcome: BlendOutcome): string[] {
  const { proof, recipe, costPerTonne } = outcome;
  if (expected.status === 'impossible') {
    const leftOut = outcome.leftOut.some((entry) => entry.reason === 'unknown figure');
    // A stock held to a small dose "as the rest" may or may not be what the proof leans on.
    const mayLean = order.stocks.some((stock) => stock.figures.some((figure) => figure.origin === 'as the rest'));
    const says = [...(leftOut ? [] : ['impossible']), ...(leftOut || mayLean ? ['impossible with known figures'] : [])];
    return says.includes(proof.kind) && !recipe
      ? []
      : [`expected ${says.join(' or ')}, got ${proof.kind} (${outcome.stopped}), cost ${costPerTonne}`];
  }
  const found: string[] = [];
  if (!recipe || costPerTonne === undefined)
    return [`no recipe: ${outcome.stopped}, ${proof.kind}; expected cost ${expected.cost}`];
  // A cost near zero is a small difference of large prices: no second way can know it to a part of itself.
  const dearest = Math.max(...order.stocks.map((stock) => Math.abs(stock.pricePerTonne)));
  const scale = Math.max(Math.abs(expected.cost), 0.01 * dearest);
  const tolerance = COST_TOLERANCE * scale;
  if (outcome.stopped !== 'finished' || proof.kind !== 'least cost')
    found.push(`not proven: ${outcome.stopped}, ${proof.kind}`);
  if (!(Math.abs(costPerTonne - expected.cost) <= tolerance))
    found.push(`cost ${relative(costPerTonne, expected.cost)}`);
  const bound = proof.lowerBound ?? Number.NaN;
  if (!(bound <= costPerTonne + 1e-9 * scale)) found.push(`bound above cost: ${relative(bound, costPerTonne)}`);
  if (!(bound <= expected.cost + 1e-6 * scale)) found.push(`bound too high: ${relative(bound, expected.cost)}`);
  const miss = worstViolation(order, recipe);
  if (!(miss.units <= UNIT_TOLERANCE)) {
    found.push(`misses ${JSON.stringify(miss.limit)} by ${miss.units.toExponential(2)} reporting units: ${miss.value}`);
  }
  return found;
}

/** Runs a solver over cases and says where it disagrees with the second ways; a throw is a disagreement. */
export async function disagreements(solve: Solve, cases: readonly Case[]): Promise<string[]> {
  const found: string[] = [];
  for (const entry of cases) {
    try {
      const outcome = await solve(entry.order);
      found.push(...differences(entry, outcome).map((difference) => `${entry.name}: ${difference}`));
    } catch (error) {
      found.push(`${entry.name}: threw ${error instanceof Error ? error.message : String(error)}`);
    }
  }
  return found;
}

/** Seeds of a test: `BASEWRIGHT_SEEDS` multiplies how many (a nightly run), same code. */
export function seeds(count: number, from = 1): number[] {
  const factor = Number(process.env.BASEWRIGHT_SEEDS ?? 1);
  return Array.from({ length: Math.max(1, Math.round(count * factor)) }, (_, place) => from + place);
}
