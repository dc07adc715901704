import { expect } from 'vitest';
import type { BlendOutcome, Order, Stock } from '../../../src/index';
import { DEMO_ORDERS } from '../../oracle/demoOrders';

/** A demo order by name, to change at will. */
export function demo(name: string): Order {
  const found = DEMO_ORDERS.find((entry) => entry.name === name);
  if (!found) throw new Error(`No demo order "${name}".`);
  return structuredClone(found.order);
}

/** A stock whose figures of one property are unknown. */
export function without(stock: Stock, property: string): Stock {
  return { ...stock, figures: stock.figures.filter((figure) => figure.property !== property) };
}

/** Places whose value JSON cannot carry: numbers without end and the like. */
function notPlain(value: unknown, path = 'outcome'): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} is ${value}`];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, entry]) => notPlain(entry, `${path}.${key}`));
}

/** What no outcome may ever do, whatever it says. */
export function expectConsistent(outcome: BlendOutcome): void {
  const { recipe, costPerTonne, properties, proof, stopped, problems, checks } = outcome;
  expect(recipe === undefined).toBe(costPerTonne === undefined);
  expect(recipe === undefined).toBe(properties === undefined);
  if (!recipe) expect(checks).toEqual([]);
  expect(problems.length > 0).toBe(stopped === 'refused' || stopped === 'engine failed');
  if (proof.kind === 'least cost' || proof.kind === 'within gap') {
    expect(recipe).toBeDefined();
    expect(proof.lowerBound).toBeLessThanOrEqual(costPerTonne ?? Number.NaN);
    expect(proof.gap).toBeGreaterThanOrEqual(0);
  } else if (proof.kind !== 'none') expect(recipe).toBeUndefined();
  expect(notPlain(outcome)).toEqual([]);
}
