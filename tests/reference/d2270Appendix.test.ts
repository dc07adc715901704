import { describe, expect, it } from 'vitest';
import { kv40ForViscosityIndex, viscosityIndex } from '../../src';
import { basicValues } from '../../src/property/viscosityIndex';
import { published } from './closeTo';
import { fittedBasicValues, viscosityIndexFrom } from './d2270Figures';

// A second published form of the same standard: the quadratic fits of Appendix X2.
describe('ASTM D2270 Appendix X2', () => {
  it('published: its worked example, KV40 73.50 and KV100 8.860', () => {
    const fitted = fittedBasicValues(8.86);
    published('L', fitted.L, 119.9588, { absolute: 0.0005 });
    published('H', fitted.H, 69.4765, { absolute: 0.0005 });
    published('VI by the fits', Math.round(viscosityIndexFrom(73.5, 8.86, fitted)), 92, { absolute: 0 });
    published('VI by Table 1', viscosityIndex(73.5, 8.86), viscosityIndexFrom(73.5, 8.86, fitted), { absolute: 0.05 });
  });

  it('agrees with Table 1 on L and H within 0.2 %, and within a third of an index between VI 0 and 200', () => {
    const worst = { L: 0, H: 0, vi: 0 };
    for (let kv100 = 2; kv100 <= 70; kv100 += 0.005) {
      const fitted = fittedBasicValues(kv100);
      const table = basicValues(kv100);
      worst.L = Math.max(worst.L, Math.abs(fitted.L / table.L - 1));
      worst.H = Math.max(worst.H, Math.abs(fitted.H / table.H - 1));
      for (const vi of [0, 50, 80, 100, 120, 150, 200]) {
        const byFits = viscosityIndexFrom(kv40ForViscosityIndex(vi, kv100), kv100, fitted);
        worst.vi = Math.max(worst.vi, Math.abs(byFits - vi));
      }
    }
    expect(worst.L).toBeLessThan(0.002);
    expect(worst.H).toBeLessThan(0.002);
    expect(worst.vi).toBeLessThan(0.32);
    // Not so close that the fits could stand in for the table.
    expect(worst.vi).toBeGreaterThan(0.25);
  });

  it('agrees above 70 within 0.02 %', () => {
    for (let kv100 = 70.5; kv100 <= 400; kv100 *= 1.05) {
      const fitted = fittedBasicValues(kv100);
      published(`L at ${kv100}`, basicValues(kv100).L, fitted.L, { relative: 2e-4 });
      published(`H at ${kv100}`, basicValues(kv100).H, fitted.H, { relative: 2e-4 });
    }
  });

  // Recorded: how far the fits jump at 7.7, by VI. The table does not jump, so the fits are no search function.
  it.each([
    [50, 0.155],
    [100, 0.272],
    [150, 0.375],
    [200, 0.473],
  ])('jumps at 7.7, for an oil of VI %d by %d, where the table does not', (vi, jump) => {
    const kv40 = kv40ForViscosityIndex(vi, 7.7);
    const below = viscosityIndexFrom(kv40, 7.7, fittedBasicValues(7.7, true));
    const above = viscosityIndexFrom(kv40, 7.7, fittedBasicValues(7.7));
    published(`jump at VI ${vi}`, below - above, jump, { absolute: 0.001 });
    const step = viscosityIndex(kv40, 7.7 + 1e-9) - viscosityIndex(kv40, 7.7 - 1e-9);
    expect(Math.abs(step)).toBeLessThan(1e-5);
  });
});
