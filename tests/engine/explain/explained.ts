import { expect } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import {
  type BlendOutcome,
  type Explanation,
  explainRecipe,
  type Limit,
  type Order,
  solveBlend,
  toOrder,
} from '../../../src/index';
import { type OrderShape, randomOrder } from '../../oracle/randomOrder';

/** An order with its proven recipe and what was explained of it. */
export interface Explained {
  name: string;
  order: Order;
  outcome: BlendOutcome;
  explanation: Explanation;
  /** Least cost as the search counts it. */
  cost: number;
  /** Two searches to a gap of 1e-6 each may differ by this. */
  noise: number;
}

async function explained(name: string, order: Order): Promise<Explained | undefined> {
  const outcome = await solveBlend(order);
  if (!outcome.recipe || outcome.objective === undefined) return undefined;
  const explanation = await explainRecipe(order, outcome, { timeLimitMs: 60_000 });
  const cost = outcome.objective;
  const dearest = Math.max(...order.stocks.map((stock) => Math.abs(stock.pricePerTonne)));
  return { name, order, outcome, explanation, cost, noise: 2e-6 * Math.max(Math.abs(cost), dearest / 1000) };
}

/** Every order of the demo that has a recipe. */
export async function explainedDemo(): Promise<Explained[]> {
  const workbook = demoWorkbook();
  const all = workbook.orders.map((order) => explained(order.id, toOrder(workbook, order).order));
  return (await Promise.all(all)).filter((entry) => entry !== undefined);
}

/** Random orders with a recipe. */
export async function explainedRandom(seeds: readonly number[], shape: OrderShape): Promise<Explained[]> {
  const all: Explained[] = [];
  for (const seed of seeds) {
    const entry = await explained(`seed ${seed}`, randomOrder(seed, shape));
    if (entry) all.push(entry);
  }
  return all;
}

/** The least cost of an order from a solve of its own; undefined where it is impossible. */
export async function leastCost(order: Order): Promise<number | undefined> {
  const outcome = await solveBlend(order);
  if (outcome.recipe) expect(outcome.proof.kind).toBe('least cost');
  else expect(['impossible', 'impossible with known figures']).toContain(outcome.proof.kind);
  return outcome.objective;
}

/** The outcome of an order with another price of one stock. */
export function atPrice(order: Order, stockId: string, pricePerTonne: number): Promise<BlendOutcome> {
  const stocks = order.stocks.map((stock) => (stock.id === stockId ? { ...stock, pricePerTonne } : stock));
  return solveBlend({ ...order, stocks });
}

/** The order with one limit stated anew. */
export function withLimit(order: Order, place: number, change: (limit: Limit) => Limit): Order {
  return { ...order, limits: order.limits.map((limit, at) => (at === place ? change({ ...limit }) : limit)) };
}

/** The outcome's cost with another price of a stock, were the recipe kept. For orders that count cost per tonne. */
export function keptAt({ order, outcome, cost }: Explained, stockId: string, price: number): number {
  const share = outcome.recipe?.find((line) => line.stockId === stockId)?.massFraction ?? 0;
  const present = order.stocks.find((stock) => stock.id === stockId)?.pricePerTonne ?? Number.NaN;
  return cost + share * (price - present);
}
