import { describe, expect, test } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import { reproducibilityOfIndex } from '../../../src/explain/precision/methodPrecision';
import { normalBelow } from '../../../src/explain/precision/normalDistribution';
import {
  chanceOfPassing,
  type Limit,
  type LimitCheck,
  marginFor,
  type Order,
  type PredictedProperties,
  solveBlend,
  toOrder,
} from '../../../src/index';
import { Draw } from '../../oracle/mulberry32';
import { kv40OfVi, viOf } from '../../oracle/viscosityIndex';

function orderOf(limit: Limit): Order {
  return { stocks: [], limits: [limit] };
}

function checkOf({ property, celsius }: Limit, value: number): LimitCheck {
  const at = celsius === undefined ? { property } : { property, celsius };
  return { limit: 0, ...at, value, passes: true, onLimit: false };
}

function chance(limit: Limit, value: number): number | undefined {
  return chanceOfPassing(checkOf(limit, value), orderOf(limit));
}

function predicted(kv40: number, kv100: number): PredictedProperties {
  const entry = (celsius: number, value: number) => ({
    property: 'kv',
    celsius,
    value,
    unknownFrom: [],
    asTheRest: [],
    estimatedFrom: [],
  });
  return { properties: [entry(40, kv40), entry(100, kv100)], spread: [] };
}

describe('the normal distribution', () => {
  // Published: Abramowitz and Stegun (1964), Table 26.1, from memory.
  test.each([
    [0, 0.5],
    [0.5, 0.691462461274013],
    [1, 0.841344746068543],
    [1.645, 0.950015094460879],
    [2, 0.97724986805182],
    [3, 0.99865010196837],
    [4, 0.999968328758167],
  ])('below %d standard deviations: %d', (x, published) => {
    expect(normalBelow(x)).toBeCloseTo(published, 12);
    expect(normalBelow(-x)).toBeCloseTo(1 - published, 12);
  });

  test('far out it is none or all, and no number stays none', () => {
    expect([normalBelow(-Infinity), normalBelow(-50), normalBelow(50), normalBelow(Infinity)]).toEqual([0, 0, 1, 1]);
    expect(normalBelow(Number.NaN)).toBeNaN();
  });
});

describe('the chance of passing', () => {
  test('on a limit it is one half (ISO 4259-2)', () => {
    expect(chance({ property: 'pourPoint', max: -24 }, -24)).toBeCloseTo(0.5, 12);
    expect(chance({ property: 'flashPoint', min: 200 }, 200)).toBeCloseTo(0.5, 12);
    expect(chance({ property: 'noack', max: 13, below: true }, 13)).toBeCloseTo(0.5, 12);
    expect(chance({ property: 'noack', below: 13 }, 13)).toBeCloseTo(0.5, 12);
  });

  test('0.59 R inside it is 95 % (ASTM D3244), whatever margin the order keeps', () => {
    const inside = -24 - 6 * 0.5935; // R of the pour point 6 °C (ISO 3016)
    expect(chance({ property: 'pourPoint', max: -24 }, inside)).toBeCloseTo(0.95, 3);
    expect(chance({ property: 'pourPoint', max: -24, insideBy: 3.6 }, inside)).toBeCloseTo(0.95, 3);
  });

  test('two ends: both tails count', () => {
    // σ = R/2.77 of the density: 0.5/2.77 kg/m³; ends at one and two σ. Φ(1) and Φ(2) as above.
    const sigma = 0.5 / 2.77;
    const limit: Limit = { property: 'density', celsius: 15, min: 870 - sigma, max: 870 + 2 * sigma };
    expect(chance(limit, 870)).toBeCloseTo(0.841344746 + 0.977249868 - 1, 8);
  });

  test('a relative R counts at the value of the mix', () => {
    const limit: Limit = { property: 'noack', max: 11 };
    expect(chance(limit, 10)).toBeCloseTo(normalBelow(1 / ((0.18 * 10) / 2.77)), 12);
  });

  test("a laboratory's own precision takes the place of the table's, by temperature where stated", () => {
    const limit: Limit = { property: 'kv', celsius: 100, min: 5.8, max: 100 };
    const own = { 'kv@100': { relative: 0.019 }, kv: { relative: 0.5 } };
    const found = chanceOfPassing(checkOf(limit, 6), orderOf(limit), undefined, own);
    expect(found).toBeCloseTo(normalBelow(0.2 / ((0.019 * 6) / 2.77)), 12);
  });

  test('nothing is said where nothing is known', () => {
    expect(chance({ property: 'sulphur', max: 300 }, 200)).toBeUndefined();
    expect(chance({ property: 'noack', aim: 12 }, 12)).toBeUndefined();
    expect(chance({ property: 'noack', max: 13 }, Number.NaN)).toBeUndefined();
    expect(chance({ property: 'vi', min: 95 }, 97)).toBeUndefined();
  });
});

describe('the viscosity index', () => {
  // A PAO of 6 mm²/s: R of its VI is 2.6 with the R of ISO 3104:1994 (0.65 %), 7 with that of newer D445 for base oils
  // (1.36 % at 40 °C, 1.90 % at 100 °C). From memory.
  test.each([
    [2.6, { kv: { relative: 0.0065 } }],
    [7, { 'kv@40': { relative: 0.0136 }, 'kv@100': { relative: 0.019 } }],
  ])('R of about %d for a PAO 6', (published, precisions) => {
    const r = reproducibilityOfIndex({ kv40: 31, kv100: 5.9 }, {}, precisions);
    expect(Math.abs((r ?? Number.NaN) - published)).toBeLessThan(0.06);
  });

  test('as by drawing both viscosities 40 000 times', () => {
    const draw = new Draw(46);
    const normal = () => Math.sqrt(-2 * Math.log(1 - draw.next())) * Math.cos(2 * Math.PI * draw.next());
    const limit: Limit = { property: 'vi', min: 95, max: 103 };
    const [kv40, kv100] = [kv40OfVi(97, 6.8), 6.8];
    const [cold, hot] = [0.0136 / 2.77, 0.019 / 2.77]; // the property table's R at 40 °C and at 100 °C
    let passed = 0;
    for (let i = 0; i < 40_000; i++) {
      const vi = viOf(kv40 * (1 + cold * normal()), kv100 * (1 + hot * normal()));
      if (vi >= 95 && vi <= 103) passed++;
    }
    const found = chanceOfPassing(checkOf(limit, 97), orderOf(limit), predicted(kv40, kv100));
    expect(Math.abs((found ?? Number.NaN) - passed / 40_000)).toBeLessThan(0.01);
  });

  test('at the end of the standard, KV100 of 2 mm²/s, it still has a precision; below, none', () => {
    expect(reproducibilityOfIndex({ kv40: 5, kv100: 2 }, {})).toBeGreaterThan(0);
    expect(reproducibilityOfIndex({ kv40: 5, kv100: 1.9 }, {})).toBeUndefined();
  });
});

describe('the margin', () => {
  test.each<[Limit, number]>([
    [{ property: 'pourPoint', max: -24 }, 4], // 0.593 · 6 = 3.56 °C, whole degrees
    [{ property: 'noack', max: 13 }, 1.4], // 0.593 · 18 % of 13
    [{ property: 'kv', celsius: 40, min: 44.6, max: 47.4 }, 0.39], // 0.593 · 1.36 % of the larger end
    [{ property: 'ccs', celsius: -25, below: 7000 }, 291], // 0.593 · 7 % of 7000
  ])('%o: 0.59 R of the stated end, rounded up to the digits shown (%d)', (limit, byHand) => {
    expect(marginFor(limit, orderOf(limit))).toBeCloseTo(byHand, 9);
  });

  test('none where no precision is known or the limit has no ends', () => {
    const margin = (limit: Limit) => marginFor(limit, orderOf(limit));
    expect(margin({ property: 'sulphur', max: 300 })).toBeUndefined();
    expect(margin({ property: 'noack', aim: 12 })).toBeUndefined();
    expect(margin({ property: 'vi', min: 95 })).toBeUndefined();
    expect(margin({ property: 'unheard of', min: 95 })).toBeUndefined();
  });

  test('of the viscosity index: a mix that keeps it passes 95 times in 100', () => {
    for (const [min, kv100] of [
      [95, 6.8],
      [130, 6],
      [155, 11],
      [100, 2.1],
    ]) {
      const limit: Limit = { property: 'vi', min };
      const margin = marginFor(limit, orderOf(limit), { kv100 }) ?? Number.NaN;
      const value = min + margin;
      const found = chanceOfPassing(checkOf(limit, value), orderOf(limit), predicted(kv40OfVi(value, kv100), kv100));
      expect(found).toBeGreaterThan(0.94);
      expect(found).toBeLessThan(0.99);
      expect(margin % 1).toBe(0);
    }
  });

  test('an index that no oil of that KV100 has: none', () => {
    const limit: Limit = { property: 'vi', min: 9000 };
    expect(marginFor(limit, orderOf(limit), { kv100: 2 })).toBeUndefined();
    expect(marginFor(limit, orderOf(limit), { kv100: 1 })).toBeUndefined();
  });
});

test('the demo: limits that bind pass half of the time; with their margins, 95 times in 100', async () => {
  const workbook = demoWorkbook();
  let bound = 0;
  for (const { order } of workbook.orders.map((entry) => toOrder(workbook, entry))) {
    const outcome = await solveBlend(order);
    const { properties } = outcome;
    if (!properties) continue;
    for (const check of outcome.checks.filter((entry) => entry.onLimit)) {
      const { min, max } = order.limits[check.limit];
      const found = chanceOfPassing(check, order, properties);
      if (found === undefined || (min !== undefined && max !== undefined)) continue;
      expect(found).toBeCloseTo(0.5, 2);
      bound++;
    }
    const kv100 = properties.properties.find((entry) => entry.property === 'kv' && entry.celsius === 100)?.value;
    const limits = order.limits.map((limit) => {
      const insideBy = marginFor(limit, order, kv100 === undefined ? {} : { kv100 });
      return insideBy === undefined ? limit : { ...limit, insideBy };
    });
    const kept = await solveBlend({ ...order, limits });
    for (const check of kept.checks) {
      const { min, max } = order.limits[check.limit];
      const found = chanceOfPassing(check, order, kept.properties);
      if (found !== undefined && (min === undefined || max === undefined)) expect(found).toBeGreaterThan(0.94);
    }
  }
  expect(bound).toBeGreaterThan(2);
});
