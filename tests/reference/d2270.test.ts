import { describe, expect, it } from 'vitest';
import { kv40ForViscosityIndex, reportedViscosityIndex, viscosityIndex } from '../../src';
import { TABLE_H, TABLE_L, TABLE_Y } from '../../src/property/d2270Table1';
import { basicValues } from '../../src/property/viscosityIndex';
import { published, recorded } from './closeTo';
import { TABLE_1_SPOTS } from './d2270Figures';

describe('published: the worked examples of ASTM D2270', () => {
  it.each([
    [73.3, 8.86, 92],
    [22.83, 5.05, 156],
    [53.47, 7.8, 111],
  ])('KV40 %d and KV100 %d give %d', (kv40, kv100, vi) => {
    expect(reportedViscosityIndex(viscosityIndex(kv40, kv100))).toBe(vi);
  });

  it('interpolates L and H of the examples', () => {
    published('L at 8.86', basicValues(8.86).L, 119.94, { absolute: 0.005 });
    published('H at 8.86', basicValues(8.86).H, 69.48, { absolute: 0.005 });
    published('H at 5.05', basicValues(5.05).H, 28.975, { absolute: 0.0005 });
    published('H at 7.80', basicValues(7.8).H, 57.31, { absolute: 0.005 });
  });
});

describe('published: Table 1 of ASTM D2270', () => {
  it('is tried at 40 rows and more', () => {
    expect(new Set(TABLE_1_SPOTS.map(([kv100]) => kv100)).size).toBeGreaterThanOrEqual(40);
  });

  it.each(TABLE_1_SPOTS)('at KV100 %d, L = %d has VI 0 and H = %d has VI 100', (kv100, L, H) => {
    published(`VI of L at ${kv100}`, viscosityIndex(L, kv100), 0, { absolute: 1e-9 });
    published(`VI of H at ${kv100}`, viscosityIndex(H, kv100), 100, { absolute: 1e-9 });
  });

  it('recorded: keeps its rows and their sum', () => {
    expect([TABLE_Y.length, TABLE_L.length, TABLE_H.length]).toEqual([311, 311, 311]);
    const sum = [...TABLE_L, ...TABLE_H].reduce((total, value) => total + value, 0);
    recorded('sum of L and H', Math.round(sum * 1000) / 1000, 404637.871);
  });

  it('rises in KV100, L and H, with L above H', () => {
    for (let row = 1; row < TABLE_Y.length; row++) {
      expect(TABLE_Y[row], `row ${row}`).toBeGreaterThan(TABLE_Y[row - 1]);
      expect(TABLE_L[row], `row ${row}`).toBeGreaterThan(TABLE_L[row - 1]);
      expect(TABLE_H[row], `row ${row}`).toBeGreaterThan(TABLE_H[row - 1]);
      expect(TABLE_L[row], `row ${row}`).toBeGreaterThan(TABLE_H[row]);
    }
  });
});

describe('the boundary at 70 mm²/s', () => {
  it('published: takes the table at 70 and the formulas above', () => {
    expect(basicValues(70)).toEqual({ L: 4905, H: 1558 });
    // ASTM D2270, formulas above 70, worked by hand at 80: 5345.92 + 1173.6 - 216 and 1077.76 + 948 - 97.
    published('L at 80', basicValues(80).L, 6303.52, { absolute: 1e-9 });
    published('H at 80', basicValues(80).H, 1928.76, { absolute: 1e-9 });
  });

  it('recorded: KV40 at a viscosity index steps down by 0.02 % there', () => {
    for (const vi of [0, 80, 100, 150, 200]) {
      const step = kv40ForViscosityIndex(vi, 70 * (1 + 1e-12)) / kv40ForViscosityIndex(vi, 70) - 1;
      expect(step, `VI ${vi}`).toBeGreaterThan(-2.4e-4);
      expect(step, `VI ${vi}`).toBeLessThan(-2.0e-4);
    }
  });
});

describe('an invariant of D2270', () => {
  const thins = Array.from({ length: 120 }, (_, i) => 2 * 150 ** (i / 119));

  it('the index falls strictly as KV40 rises', () => {
    for (const kv100 of [...thins, 70, 70.0001]) {
      const start = kv100 * 1.02;
      const ratio = (3 * basicValues(kv100).L) / start;
      let before = Number.POSITIVE_INFINITY;
      for (let i = 0; i <= 200; i++) {
        const vi = viscosityIndex(start * ratio ** (i / 200), kv100);
        expect(vi, `KV100 ${kv100}, step ${i}`).toBeLessThan(before);
        before = vi;
      }
    }
  });

  it('KV40 of an index and the index are inverse', () => {
    let tried = 0;
    for (const kv100 of thins) {
      for (let vi = -60; vi <= 400; vi += 2.5) {
        // An index that no KV40 above KV100 can have is refused, and rightly.
        if (viscosityIndex(kv100 * (1 + 1e-9), kv100) <= vi) continue;
        const back = viscosityIndex(kv40ForViscosityIndex(vi, kv100), kv100);
        published(`VI ${vi} at KV100 ${kv100}`, back, vi, { absolute: 1e-9 });
        tried++;
      }
    }
    expect(tried).toBeGreaterThan(15_000);
  });

  it('meets itself at VI 100, where the two formulas join', () => {
    for (const kv100 of thins) {
      const { H } = basicValues(kv100);
      const jump = viscosityIndex(H * (1 - 1e-10), kv100) - viscosityIndex(H * (1 + 1e-10), kv100);
      expect(Math.abs(jump), `KV100 ${kv100}`).toBeLessThan(1e-6);
    }
  });
});

describe('outside D2270', () => {
  it.each([
    [5, 1.999, 'is not defined at a KV100 of 1.999'],
    [5, Number.NaN, 'is not defined at a KV100 of NaN'],
    [5, Number.POSITIVE_INFINITY, 'is not defined at a KV100 of Infinity'],
    [5, 5, 'KV40 (5 mm²/s) must be above KV100 (5 mm²/s)'],
    [4, 5, 'must be above'],
    [Number.NaN, 5, 'must be above'],
    [Number.POSITIVE_INFINITY, 5, 'must be above'],
  ])('KV40 %d and KV100 %d are refused', (kv40, kv100, words) => {
    expect(() => viscosityIndex(kv40, kv100)).toThrow(RangeError);
    expect(() => viscosityIndex(kv40, kv100)).toThrow(words);
  });

  it.each([
    [100, 1.99],
    [1000, 60],
    [Number.NaN, 5],
    [Number.NEGATIVE_INFINITY, 5],
  ])('VI %d at KV100 %d has no KV40', (vi, kv100) => {
    expect(() => kv40ForViscosityIndex(vi, kv100)).toThrow(RangeError);
  });
});

describe('the reported index', () => {
  it.each([
    [116.5, 116],
    [117.5, 118],
    [116.51, 117],
    [-0.5, 0],
    [-1.5, -2],
    [119.4999, 119],
  ])('published (ASTM E29, half to even): %d is reported as %d', (vi, reported) => {
    expect(reportedViscosityIndex(vi) + 0).toBe(reported);
  });
});
