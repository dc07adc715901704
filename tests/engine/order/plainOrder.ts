import { expect } from 'vitest';
import {
  type BlendOutcome,
  type Figure,
  type FigureOrigin,
  type Order,
  type Stock,
  solveBlend,
} from '../../../src/index';
import { BASE_OILS, DEMO_STOCKS } from '../../oracle/demoStocks';

/** The base oils of the demo with one limit that many mixes meet. */
export function plainOrder(): Order {
  return { stocks: structuredClone(BASE_OILS), limits: [{ property: 'kv', celsius: 100, min: 5.8, max: 6.2 }] };
}

/** A stock of the demo by its id, to change at will. */
export function demoStock(id: string): Stock {
  const found = DEMO_STOCKS.find((stock) => stock.id === id);
  if (!found) throw new Error(`No demo stock "${id}".`);
  return structuredClone(found);
}

/** A figure without a value. */
export function asTheRest(property: string, celsius?: number): Figure {
  const origin: FigureOrigin = 'as the rest';
  return celsius === undefined ? { property, origin } : { property, celsius, origin };
}

export function shareOf({ recipe }: BlendOutcome, stockId: string): number {
  return recipe?.find((line) => line.stockId === stockId)?.massFraction ?? 0;
}

/** Solves an order that must be solved, to the proven least cost. */
export async function solved(order: Order): Promise<BlendOutcome> {
  const outcome = await solveBlend(order);
  expect(outcome.problems).toEqual([]);
  expect(outcome).toMatchObject({ stopped: 'finished', proof: { kind: 'least cost' } });
  return outcome;
}
