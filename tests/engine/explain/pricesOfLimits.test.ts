import { beforeAll, describe, expect, test } from 'vitest';
import type { Limit, LimitPrice } from '../../../src/index';
import { CONTINUOUS, DISCRETE } from '../../oracle/randomOrder';
import { seeds } from '../optimum/judge';
import { type Explained, explainedDemo, explainedRandom, leastCost, withLimit } from './explained';

// Finite differences made here from two solves: of these orders every limit states plain ends.

function movedTo(limit: Limit, { end }: LimitPrice, value: number | undefined): Limit {
  const { [end]: _, ...rest } = limit;
  return value === undefined ? rest : { ...rest, [end]: value };
}

const outward = (price: LimitPrice) => (price.end === 'max' ? 1 : -1);

function costWith({ order }: Explained, price: LimitPrice, value: number | undefined) {
  return leastCost(withLimit(order, price.limit, (limit) => movedTo(limit, price, value)));
}

async function expectFiniteDifferences(entry: Explained, price: LimitPrice): Promise<void> {
  const { cost, noise } = entry;
  const { stated, step } = price;
  const message = `${entry.name}, limit ${price.limit}, ${price.end}`;
  const near = (found: number, expected: number) =>
    expect(Math.abs(found - expected), `${message}: ${found} against ${expected}`).toBeLessThanOrEqual(3 * noise);
  expect(price.proven, message).toBe(true);
  expect(stated, message).toBe(entry.order.limits[price.limit][price.end]);
  near(price.looserSaves, cost - ((await costWith(entry, price, stated + outward(price) * step)) ?? Infinity));
  near(price.withoutSaves, cost - ((await costWith(entry, price, undefined)) ?? Infinity));
  const tighter = await costWith(entry, price, stated - outward(price) * step);
  if (tighter === undefined) expect(price.tighterCosts, message).toBeUndefined();
  else near(price.tighterCosts ?? Number.NaN, tighter - cost);
}

let demo: Explained[];
let random: Explained[];
let discrete: Explained[];

beforeAll(async () => {
  demo = await explainedDemo();
  random = await explainedRandom(seeds(25, 71_001), CONTINUOUS);
  discrete = await explainedRandom(seeds(15, 72_001), DISCRETE);
});

describe('prices of limits', () => {
  test('each is the difference of two solves: demo, random, discrete', async () => {
    let compared = 0;
    for (const entry of [...demo, ...random, ...discrete]) {
      for (const price of entry.explanation.limits) {
        await expectFiniteDifferences(entry, price);
        if (price.looserSaves > 0) compared++;
      }
    }
    expect(compared).toBeGreaterThan(30);
  });

  test('an end that is not listed saves nothing when taken away', async () => {
    let asked = 0;
    for (const entry of [...random, ...discrete]) {
      const { explanation, order, cost, noise } = entry;
      for (const [place, limit] of order.limits.entries()) {
        for (const end of ['min', 'max'] as const) {
          if (limit[end] === undefined) continue;
          if (explanation.limits.some((price) => price.limit === place && price.end === end)) continue;
          asked++;
          const { [end]: _, ...rest } = limit;
          const without = await leastCost(withLimit(order, place, () => rest));
          expect(without, `${entry.name}, limit ${place}, ${end}`).toBeGreaterThan(cost - 2 * noise);
        }
      }
    }
    expect(asked).toBeGreaterThan(30);
  });

  test('a price holds to where it says, and not much further', async () => {
    let ended = 0;
    for (const entry of [...demo, ...random]) {
      for (const price of entry.explanation.limits) {
        const { holdsTo, stated, step, looserSaves } = price;
        const message = `${entry.name}, limit ${price.limit}, ${price.end}`;
        expect(holdsTo === undefined, message).toBe(looserSaves === 0);
        if (holdsTo === undefined) continue;
        const steps = Math.abs(holdsTo - stated) / step;
        const ratioAt = async (count: number) => {
          const cost = await costWith(entry, price, stated + outward(price) * count * step);
          return (entry.cost - (cost ?? Infinity)) / (looserSaves * count);
        };
        const slack = (3 * entry.noise) / looserSaves;
        expect(Math.abs((await ratioAt(steps)) - 1), message).toBeLessThanOrEqual(0.05 + slack);
        // Searched to a quarter of the way or one step: a little beyond that it no longer saves at the price.
        const beyond = Math.ceil(steps * 1.5) + 1;
        if (Math.abs((await ratioAt(beyond)) - 1) > 0.05 - slack) ended++;
      }
    }
    expect(ended).toBeGreaterThan(20);
  });

  test('the step is round, within a hundredth of the end or one reporting unit', () => {
    const kv40 = demo.find((entry) => entry.name === 'vg-46-hydraulic')?.explanation.limits[0];
    expect(kv40).toMatchObject({ stated: 44.6, step: 0.2 });
    const vi = demo.find((entry) => entry.name === 'multigrade-base')?.explanation.limits[1];
    expect(vi).toMatchObject({ stated: 155, step: 1 });
  });
});
