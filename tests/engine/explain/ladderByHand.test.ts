import { describe, expect, test } from 'vitest';
import { applyRelaxation, type Limit, type Order, type Stock } from '../../../src/index';
import { ladderOf } from './ladderChecks';

const OWN = ['p', 'q', 'r'].map((id) => ({ id, label: id, unit: '%', rule: 'linear by mass' as const, digits: 1 }));

function stock(id: string, pricePerTonne: number, values: Record<string, number>): Stock {
  const figures = Object.entries(values).map(([property, value]) => ({ property, value, origin: 'measured' as const }));
  return { id, name: id, family: 'other', pricePerTonne, figures };
}

/**
 * Two stocks: with a share x of the second, sulphur is 100 + 900 x mg/kg and p is 100 x %. Source: hand calculation,
 * like everything in this file. p of at least 60 needs x of at least 0.6; sulphur of at most 400 one of at most 1/3.
 */
function twoStocks(sulphur: Partial<Limit> = { max: 400 }): Order {
  return {
    stocks: [stock('clean', 500, { sulphur: 100, p: 0 }), stock('rich', 300, { sulphur: 1000, p: 100 })],
    limits: [
      { property: 'sulphur', ...sulphur },
      { property: 'p', min: 60 },
    ],
    ownProperties: OWN,
  };
}

describe('two stocks (source: hand calculation)', () => {
  test('conflict, reach and cost', async () => {
    const ladder = await ladderOf(twoStocks());
    expect(ladder).toMatchObject({
      conflict: [
        { kind: 'limit', limit: 0, end: 'max' },
        { kind: 'limit', limit: 1, end: 'min' },
      ],
      conflictProven: true,
      stopped: 'finished',
    });
    // Sulphur at x = 0.6 is 640; p at x = 1/3 is 33.33, which is typed as 33.3.
    expect(ladder.reach).toMatchObject([
      { limit: 0, end: 'max', stated: 400, reachable: 640, step: 1, proven: true },
      { limit: 1, end: 'min', stated: 60, reachable: 33.3, step: 0.1, proven: true },
    ]);
    expect(ladder.reach[0].costPerTonne).toBeCloseTo(0.4 * 500 + 0.6 * 300, 4);
    expect(ladder.reach[1].costPerTonne).toBeCloseTo((2 / 3) * 500 + (1 / 3) * 300, 4);
    // 240 units of sulphur, 267 of p; in between the sum of both falls all the way: 300 - 100 x.
    expect(ladder.relaxations.map(({ changes, effort }) => [changes.map(({ to }) => to), Math.round(effort)])).toEqual([
      [[640], 240],
      [[33.3], 267],
    ]);
    // So 240 is the least there is; the bound comes within a twentieth of it.
    expect(ladder.leastEffort).toBeGreaterThanOrEqual(0.95 * 240);
    expect(ladder.leastEffort).toBeLessThanOrEqual(240);
  });

  test('a stated end between reporting units moves to whole ones', async () => {
    const ladder = await ladderOf(twoStocks({ max: 400.4 }));
    expect(ladder.reach).toMatchObject([
      { stated: 400.4, reachable: 640, proven: true },
      { stated: 60, reachable: 33.3, proven: true },
    ]);
  });

  test.each<[string, Partial<Limit>, number, Partial<Limit>]>([
    ['a margin', { max: 400, insideBy: 10 }, 650, { max: 650, insideBy: 10 }],
    ['below a number', { below: 400 }, 641, { below: 641 }],
    ['"below" beside the number', { max: 400, below: true }, 641, { max: 641, below: true }],
    ['below, with a margin', { below: 400, insideBy: 10 }, 651, { below: 651, insideBy: 10 }],
    ['at most and below, below counts', { max: 500, below: 400 }, 641, { max: 640, below: 641 }],
    ['at most and below, at most counts', { max: 400, below: 500 }, 640, { max: 640, below: 641 }],
    ['at most and a looser below', { max: 400, below: 900 }, 640, { max: 640, below: 900 }],
  ])('%s is kept when the end is moved', async (_, sulphur, reachable, moved) => {
    const order = twoStocks(sulphur);
    const ladder = await ladderOf(order);
    expect(ladder.reach[0]).toMatchObject({ limit: 0, end: 'max', stated: 400, reachable, proven: true });
    const relaxation = ladder.relaxations.find(({ changes }) => changes[0].limit === 0);
    expect(relaxation && applyRelaxation(order, relaxation).limits[0]).toEqual({ property: 'sulphur', ...moved });
    expect(order).toEqual(twoStocks(sulphur));
  });

  test('a weight of a tenth on p puts p first', async () => {
    const ladder = await ladderOf(twoStocks(), { weights: { 1: 0.1 } });
    expect(ladder.relaxations.map(({ effort }) => Math.round(10 * effort))).toEqual([267, 2400]);
  });
});

/** Three stocks, each bringing one property alone: p + q + r = 100 %. */
function threeStocks(least: number): Order {
  return {
    stocks: [
      stock('P', 100, { p: 100, q: 0, r: 0 }),
      stock('Q', 200, { p: 0, q: 100, r: 0 }),
      stock('R', 300, { p: 0, q: 0, r: 100 }),
    ],
    limits: ['p', 'q', 'r'].map((property) => ({ property, min: least })),
    ownProperties: OWN,
  };
}

describe('three stocks, two limits of which must move (source: hand calculation)', () => {
  test('no limit alone is enough, two together give way by 80 %, which is 800 reporting units', async () => {
    // 60 % three times is 180 %; even with one given up, two times 60 % is more than the whole.
    const ladder = await ladderOf(threeStocks(60));
    expect(ladder.conflict).toHaveLength(2);
    expect(ladder.reach.map(({ reachable, proven }) => ({ reachable, proven }))).toEqual(
      Array.from({ length: 3 }, () => ({ reachable: undefined, proven: true })),
    );
    expect(ladder.relaxations.length).toBeGreaterThan(0);
    // Every way of sharing the 800 is as good as any other: the hardest case for the bound, which runs out of solves.
    expect(ladder.leastEffort).toBeGreaterThanOrEqual(0.85 * 800);
    expect(ladder.leastEffort).toBeLessThanOrEqual(800);
    for (const { changes, effort, proven } of ladder.relaxations) {
      expect(changes.length).toBeGreaterThan(1);
      expect(effort).toBeCloseTo(800, 6);
      expect(proven).toBe(true);
      expect(changes.reduce((sum, { to }) => sum + to, 0)).toBeCloseTo(40, 6);
    }
  });

  test('weighted three to one: the light one gives up all it has', async () => {
    // 600 units of the light one, 200 of the heavy one at 3: 1 200.
    const weights = { 0: 1, 1: 3, 2: 3 };
    const [first] = (await ladderOf(threeStocks(60), { weights })).relaxations;
    expect(first.effort).toBeCloseTo(1200, 6);
    expect(first.changes.find(({ limit }) => limit === 0)?.to).toBe(0);
  });

  test('at 40 % one limit alone is enough: 20 %', async () => {
    const ladder = await ladderOf(threeStocks(40));
    expect(ladder.conflict).toHaveLength(3);
    expect(ladder.reach.map(({ reachable }) => reachable)).toEqual([20, 20, 20]);
    expect(ladder.relaxations.map(({ effort }) => Math.round(effort))).toEqual([200, 200, 200]);
  });
});
