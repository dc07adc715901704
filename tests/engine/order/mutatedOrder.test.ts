import fc from 'fast-check';
import { expect, test } from 'vitest';
import { type Order, solveBlend } from '../../../src/index';
import { DISCRETE, randomOrder } from '../../oracle/randomOrder';
import { expectConsistent } from '../optimum/consistency';

/** What a damaged file or a foreign program may put in any place. */
const JUNK: readonly unknown[] = [null, '', 'kv', 'PAO', {}, [], [null], [7], Number.NaN, -1, 0, 2, 1e6, true, false];

interface Place {
  holder: Record<string, unknown> | unknown[];
  key: string;
}

/** Every place of the data that holds something, the deep ones included. */
function places(value: unknown, found: Place[] = []): Place[] {
  if (typeof value !== 'object' || value === null) return found;
  for (const [key, entry] of Object.entries(value)) {
    found.push({ holder: value as Place['holder'], key });
    places(entry, found);
  }
  return found;
}

/** An order that uses nearly every field there is. */
function fullOrder(seed: number): Order {
  const order = randomOrder(seed, { ...DISCRETE, stocks: [3, 5] });
  const [first, second] = order.stocks;
  second.lotTonnes = 0.2;
  second.blendWeight = 1.1;
  return {
    ...order,
    limits: [...order.limits, { property: 'noack', max: 60, below: true, insideBy: 1, aim: 20, aimWeight: 0 }],
    doses: [...(order.doses ?? []), { stockId: first.id, max: 0.9, required: false, of: 'mix' }],
    shares: [
      ...(order.shares ?? []),
      { kind: 'share', set: { stockIds: [first.id] }, max: 0.9, of: 'base oil' },
      { kind: 'ratio', set: { stockIds: [first.id] }, to: { stockIds: [second.id] }, max: 9 },
      { kind: 'count', set: { families: ['ester', 'PAO'] }, max: 2 },
    ],
    batchTonnes: { min: 10, max: 20 },
    mostStocks: 4,
    depressant: true,
    viscosityRule: 'wright',
    costBasis: 'tonne',
    greatestDoseAsTheRest: 0.02,
  };
}

const change = fc.record({ place: fc.nat(), junk: fc.option(fc.constantFrom(...JUNK), { nil: undefined }) });
const mutated = fc
  .record({ seed: fc.integer({ min: 1, max: 1e6 }), changes: fc.array(change, { minLength: 1, maxLength: 2 }) })
  .map(({ seed, changes }) => {
    const order = fullOrder(seed);
    for (const { place, junk } of changes) {
      const all = places(order);
      const { holder, key } = all[place % all.length];
      if (junk === undefined && !Array.isArray(holder)) delete holder[key];
      else Object.assign(holder, { [key]: structuredClone(junk) });
    }
    return order;
  });

test('a valid order with any node replaced or missing: an answer or a refusal, never a rejection', async () => {
  const stopped = new Map<string, number>();
  await fc.assert(
    fc.asyncProperty(mutated, async (order) => {
      const outcome = await solveBlend(order, { timeLimitMs: 1000 });
      expectConsistent(outcome);
      expect(['finished', 'time limit', 'refused']).toContain(outcome.stopped);
      for (const { path, message } of outcome.problems) {
        expect(Array.isArray(path)).toBe(true);
        expect(message).toMatch(/[.!]$/);
      }
      stopped.set(outcome.stopped, (stopped.get(outcome.stopped) ?? 0) + 1);
    }),
    { seed: 41, numRuns: Math.round(400 * Number(process.env.BASEWRIGHT_SEEDS ?? 1)) },
  );
  expect(stopped.get('refused')).toBeGreaterThan(100);
  expect(stopped.get('finished')).toBeGreaterThan(20);
});
