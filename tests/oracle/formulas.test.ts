import { describe, expect, test } from 'vitest';
import { INDEX_RULES, viscosityTerm } from './indices';
import { Draw } from './mulberry32';
import { lines } from './viSlices';
import { breakpoints, kv40OfVi, viOf } from './viscosityIndex';
import { invert, kvOfWalther, tau, waltherOf } from './walther';

// The second way must itself stand on published figures, or agreement with it means nothing.
describe('the formulas of the checks', () => {
  test.each([
    [73.3, 8.86, 92],
    [22.83, 5.05, 156],
    [53.47, 7.8, 111],
  ])('published: ASTM D2270 worked examples, KV40 %d, KV100 %d', (kv40, kv100, reported) => {
    expect(Math.round(viOf(kv40, kv100))).toBe(reported);
  });

  test('KV40 at a VI and VI are inverse', () => {
    for (let seed = 1; seed <= 300; seed++) {
      const draw = new Draw(seed);
      const y = draw.ratio(2, 150);
      const vi = draw.between(60, 200);
      expect(Math.abs(viOf(kv40OfVi(vi, y), y) - vi), `seed ${seed}`).toBeLessThan(1e-9);
    }
  });

  test('published: Wickey-Chittenden index 155 at 60 °C (a depot table)', () => {
    expect(Math.abs(INDEX_RULES.flashPoint.toIndex(60) - 155)).toBeLessThan(5);
  });

  test('W and its inverse agree', () => {
    for (const kv of [0.5, 1, 2, 6, 46, 1000, 20000])
      expect(Math.abs(kvOfWalther(waltherOf(kv)) / kv - 1)).toBeLessThan(1e-10);
  });

  test('published: half PAO 4 and half PAO 100 by mass have KV100 17.7 (Wright), 13.2 (Walther), 13.8, 19.9, 30.1', () => {
    const thin = { kv40: 17.4, kv100: 3.95, density: 820, blendWeight: 1 };
    const thick = { kv40: 1150, kv100: 103, density: 855, blendWeight: 1 };
    const expected = { wright: 17.7, walther: 13.2, refutas: 13.8, logarithmic: 19.9, 'cube root': 30.1 };
    for (const [rule, kv100] of Object.entries(expected)) {
      const [a, b] = [viscosityTerm(rule, thin), viscosityTerm(rule, thick)];
      const mean = (a.weight * a.index100 + b.weight * b.index100) / (a.weight + b.weight);
      const index = (kv: number) => viscosityTerm(rule, { ...thin, kv40: 2 * kv, kv100: kv }).index100;
      // The figures quoted are for stocks of about these viscosities: 6 %.
      expect(Math.abs(invert(index, mean) / kv100 - 1), rule).toBeLessThan(0.06);
    }
  });

  test('the Wright average is the average of temperatures at equal viscosity', () => {
    const stocks = [
      { kv40: 30.4, kv100: 5.15, density: 868, blendWeight: 1 },
      { kv40: 478, kv100: 31.8, density: 901, blendWeight: 1 },
    ];
    const x = [0.35, 0.65];
    const terms = stocks.map((stock) => viscosityTerm('wright', stock));
    const weight = terms.reduce((sum, t, i) => sum + x[i] * t.weight, 0);
    const w40 = terms.reduce((sum, t, i) => sum + x[i] * t.weight * t.index40, 0) / weight;
    const volumes = stocks.map((stock, i) => x[i] / stock.density);
    const total = volumes[0] + volumes[1];
    const meanTau = stocks.reduce((sum, { kv40, kv100 }, i) => {
      const slope = (tau(100) - tau(40)) / (waltherOf(kv100) - waltherOf(kv40));
      return sum + (volumes[i] / total) * (tau(100) + slope * (w40 - waltherOf(kv100)));
    }, 0);
    expect(Math.abs(meanTau - tau(40))).toBeLessThan(1e-13);
  });
});

test('the lines of the slices lie above and below the curve everywhere', () => {
  for (let seed = 1; seed <= 60; seed++) {
    const draw = new Draw(seed);
    const vi = draw.between(60, 190);
    const low = draw.ratio(2, 100);
    const cuts = breakpoints(low, low * draw.ratio(1.0001, 1.6));
    const slices = cuts.slice(1).map((cut, k) => ({ low: cuts[k], high: cut }));
    const { slope, above, below } = lines(vi, slices, waltherOf);
    let least = Infinity;
    let most = -Infinity;
    for (let k = 0; k <= 1000; k++) {
      const y = Math.min(slices[slices.length - 1].high, low * (slices[slices.length - 1].high / low) ** (k / 1000));
      const offset = waltherOf(kv40OfVi(vi, y)) - slope * waltherOf(y);
      least = Math.min(least, offset);
      most = Math.max(most, offset);
    }
    expect(most, `seed ${seed}, VI ${vi}, from ${low}`).toBeLessThanOrEqual(above);
    expect(least, `seed ${seed}, VI ${vi}, from ${low}`).toBeGreaterThanOrEqual(below);
  }
});

test('a window is cut at every knot of Table 1', () => {
  expect(breakpoints(2, 70)).toHaveLength(311);
});
