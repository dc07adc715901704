import { beforeAll, describe, expect, test } from 'vitest';
import type { BlendOutcome } from '../../../src/index';
import { CONTINUOUS, DISCRETE } from '../../oracle/randomOrder';
import { seeds } from '../optimum/judge';
import { atPrice, type Explained, explainedDemo, explainedRandom, keptAt, leastCost } from './explained';

let all: Explained[];

beforeAll(async () => {
  all = [
    ...(await explainedDemo()),
    ...(await explainedRandom(seeds(25, 73_001), CONTINUOUS)),
    ...(await explainedRandom(seeds(20, 74_001), DISCRETE)),
  ];
});

const uses = ({ recipe }: BlendOutcome, stockId: string) => recipe?.some((line) => line.stockId === stockId) ?? false;
const costOf = ({ objective }: BlendOutcome) => objective ?? Number.NaN;

/** So far from a break-even that the difference is no noise [of the price]. */
const ASIDE = 0.02;

describe('entry prices', () => {
  test('just below, the stock is in the recipe and the mix is cheaper; at the price and above, it is not', async () => {
    let entered = 0;
    for (const { name, order, explanation, cost, noise } of all) {
      for (const { stockId, pricePerTonne, entersBelow, proven } of explanation.entries) {
        const message = `${name}, ${stockId}`;
        expect(proven, message).toBe(true);
        if (entersBelow === undefined) {
          expect(costOf(await atPrice(order, stockId, 0)), message).toBeGreaterThan(cost - 2 * noise);
          continue;
        }
        entered++;
        expect(entersBelow, message).toBeLessThanOrEqual(pricePerTonne);
        expect(Math.abs(costOf(await atPrice(order, stockId, entersBelow)) - cost), message).toBeLessThan(2 * noise);
        const below = await atPrice(order, stockId, entersBelow * (1 - ASIDE));
        expect(uses(below, stockId), message).toBe(true);
        expect(costOf(below), message).toBeLessThan(cost - noise);
      }
    }
    expect(entered).toBeGreaterThan(100);
  });

  test('every stock is either used, priced for entry, or left out', () => {
    for (const { name, order, outcome, explanation } of all) {
      const told = [...explanation.used, ...explanation.entries, ...outcome.leftOut].map((entry) => entry.stockId);
      expect(told.sort(), name).toEqual(order.stocks.map((stock) => stock.id).sort());
    }
  });
});

describe('price ranges of the stocks in use', () => {
  test('inside, the recipe stays the cheapest', async () => {
    for (const entry of all) {
      for (const { stockId, pricePerTonne, standsFrom, standsTo, proven } of entry.explanation.used) {
        expect(proven, `${entry.name}, ${stockId}`).toBe(true);
        const from = standsFrom ?? 0;
        const to = standsTo ?? 3 * pricePerTonne;
        expect(from).toBeLessThanOrEqual(pricePerTonne);
        expect(to).toBeGreaterThanOrEqual(pricePerTonne);
        for (const part of [0.001, 0.5, 0.999]) {
          const price = from + part * (to - from);
          const kept = keptAt(entry, stockId, price);
          const message = `${entry.name}, ${stockId} at ${price} of ${from} to ${to}`;
          expect(costOf(await atPrice(entry.order, stockId, price)), message).toBeGreaterThan(
            kept - 3e-6 * Math.abs(kept),
          );
        }
      }
    }
  });

  test('outside, another recipe is cheaper', async () => {
    let ends = 0;
    let atOnce = 0;
    for (const entry of all) {
      for (const { stockId, pricePerTonne, standsFrom, standsTo } of entry.explanation.used) {
        for (const [end, sign] of [
          [standsFrom, -1],
          [standsTo, 1],
        ] as const) {
          if (end === undefined) continue;
          ends++;
          // Recipes that differ in traces of the stock only part far away: the way out is doubled until they do.
          let cheaperAt: number | undefined;
          for (let aside = ASIDE; aside < 2 && cheaperAt === undefined; aside *= 2) {
            const price = end + sign * aside * pricePerTonne;
            const gain = keptAt(entry, stockId, price) - costOf(await atPrice(entry.order, stockId, price));
            if (gain > entry.noise) cheaperAt = aside;
          }
          if (cheaperAt === ASIDE) atOnce++;
          expect(cheaperAt, `${entry.name}, ${stockId} beyond ${end}`).toBeDefined();
        }
      }
    }
    expect(ends).toBeGreaterThan(100);
    expect(atOnce).toBeGreaterThan(0.95 * ends);
  });

  test('the least cost is concave in a price and never falls with it, discrete rules or not', async () => {
    for (const { name, order, outcome, noise } of all) {
      const stockId = outcome.recipe?.[0].stockId ?? '';
      const present = order.stocks.find((stock) => stock.id === stockId)?.pricePerTonne ?? 0;
      const costs: number[] = [];
      for (const factor of [0.5, 0.75, 1, 1.25, 1.5])
        costs.push(costOf(await atPrice(order, stockId, factor * present)));
      for (let at = 1; at < costs.length; at++) {
        expect(costs[at], name).toBeGreaterThan(costs[at - 1] - 2 * noise);
        if (at < 2) continue;
        expect(2 * costs[at - 1], name).toBeGreaterThan(costs[at] + costs[at - 2] - 6 * noise);
      }
    }
  });

  test('a loss costs what the order costs without the stock', async () => {
    let lost = 0;
    let missed = 0;
    for (const { name, order, explanation, cost, noise } of all) {
      for (const { stockId, lossCosts, impossibleWithout } of explanation.used) {
        // Where a rule names the stock, taking it away takes more than a filter: those are checked by hand elsewhere.
        if (JSON.stringify([order.doses ?? [], order.shares ?? []]).includes(`"${stockId}"`)) continue;
        const stocks = order.stocks.filter((stock) => stock.id !== stockId);
        const without = await leastCost({ ...order, stocks });
        const message = `${name} without ${stockId}`;
        expect(impossibleWithout, message).toBe(without === undefined);
        if (without === undefined) missed++;
        else {
          lost++;
          expect(Math.abs((lossCosts ?? Number.NaN) - (without - cost)), message).toBeLessThan(3 * noise);
        }
      }
    }
    expect(lost).toBeGreaterThan(60);
    expect(missed).toBeGreaterThan(3);
  });

  test('a stock with a compulsory dose cannot be missed', () => {
    const order = all.find((entry) => entry.name === 'vg-46-hydraulic');
    const used = order?.explanation.used.find((stock) => stock.stockId === 'hydraulic-package');
    expect(used).toMatchObject({ impossibleWithout: true, proven: true });
    expect(used?.lossCosts).toBeUndefined();
  });
});
