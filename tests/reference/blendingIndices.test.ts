import { describe, expect, it } from 'vitest';
import { BLENDING_INDICES, type BlendingIndex } from '../../src/property/blendingIndex';
import { published } from './closeTo';
import { ESTER, PAO_4, predicted, referenceStock, SN_150, SN_500 } from './referenceStocks';

const SENSE: Record<keyof typeof BLENDING_INDICES, number[]> = {
  linear: [-5, 0, 870],
  logarithmic: [0.5, 6, 6600],
  walther: [0.4, 1.5, 5.15, 46, 1000],
  refutas: [0.4, 1.5, 5.15, 46, 1000],
  'cube root': [0.4, 1.5, 5.15, 46, 1000],
  'hu-burns pour point': [-66, -30, -9, 0, 12],
  'wickey-chittenden flash point': [60, 150, 220, 298],
  'riazi aniline point': [70, 100, 130],
};

describe.each(Object.entries(BLENDING_INDICES) as [keyof typeof BLENDING_INDICES, BlendingIndex][])(
  '%s',
  (id, index) => {
    it('goes there and back, and its slope and curvature are those found by differences', () => {
      for (const value of SENSE[id]) {
        published(`back at ${value}`, index.fromIndex(index.toIndex(value)), value, { absolute: 1e-9 });
        const h = 1e-4 * Math.max(1, Math.abs(value));
        const step = id === 'walther' || id === 'refutas' || id === 'cube root' ? 1e-4 * value : h;
        const [below, here, above] = [value - step, value, value + step].map(index.toIndex);
        const slope = (above - below) / (2 * step);
        published(`slope at ${value}`, index.slope(value), slope, { relative: 1e-6 });
        expect(index.rising, `${value}`).toBe(slope > 0);
        if (!index.curvature) continue;
        const second = (above - 2 * here + below) / (step * step);
        published(`curvature at ${value}`, index.curvature(value), -second / slope, { relative: 2e-3 });
      }
    });
  },
);

describe('Refutas', () => {
  // A public calculator's page gives 12.492 for 2.234 mm²/s, "approximately".
  it('published: the VBN of 2.234 mm²/s is 12.49', () => {
    published('VBN', BLENDING_INDICES.refutas.toIndex(2.234), 12.492, { absolute: 0.005 });
  });

  it('is the mean of log log (ν + 0.8) by mass, whatever its two constants', () => {
    const mean = 0.6 * Math.log10(Math.log10(5.15 + 0.8)) + 0.4 * Math.log10(Math.log10(10.8 + 0.8));
    const kv = predicted([SN_150, SN_500], [0.6, 0.4], { property: 'kv', celsius: 100 }, { viscosityRule: 'refutas' });
    published('KV100', kv, 10 ** (10 ** mean) - 0.8, { relative: 1e-12 });
  });
});

describe('pour point', () => {
  const mix = predicted([SN_150, SN_500], [0.5, 0.5], { property: 'pourPoint' });

  it('published (Riazi, ASTM MNL50): the index at 0 °C, 491.67 °R, by hand', () => {
    // ln 0.49167 = -0.709948; 12.5 times it = -8.87435; exp = 1.39934e-4; times 3 262 000.
    published('index', BLENDING_INDICES['hu-burns pour point'].toIndex(0), 456.46, { absolute: 0.02 });
  });

  it('published (Hu and Burns, 1970): the same as averaging T to the power 1/0.08 by volume, T in kelvin', () => {
    const [a, b] = [1 / 868, 1 / 882].map((volume) => volume / (1 / 868 + 1 / 882));
    const power = 1 / 0.08;
    const kelvin = (a * (273.15 - 12) ** power + b * (273.15 - 9) ** power) ** 0.08;
    published('pour point', mix, kelvin - 273.15, { absolute: 1e-9 });
  });

  it('lies nearer to the waxier stock than the mean does', () => {
    expect(mix).toBeGreaterThan(-10.5);
    expect(mix).toBeLessThan(-9);
    expect(predicted([PAO_4, SN_500], [0.5, 0.5], { property: 'pourPoint' })).toBeGreaterThan(-37.5);
  });
});

describe('flash point', () => {
  it('published (a depot’s table of the index): 155 at 60 °C', () => {
    published('index', BLENDING_INDICES['wickey-chittenden flash point'].toIndex(60), 155, { absolute: 0.5 });
  });

  // Thiele, Ind. Eng. Chem. (February 1927), on lubricating oils: 10^(-F/100) is additive by volume, F in °F.
  it.each([
    [218, 248],
    [220, 284],
    [222, 298],
  ])('published: %d and %d °C half and half agree with Thiele’s rule for lubricating oils within 6 °C', (low, high) => {
    const fahrenheit = (celsius: number) => 1.8 * celsius + 32;
    const mean = (10 ** (-fahrenheit(low) / 100) + 10 ** (-fahrenheit(high) / 100)) / 2;
    const thiele = (-100 * Math.log10(mean) - 32) / 1.8;
    const stock = (id: string, flashPoint: number) =>
      referenceStock(id, { kv40: 46, kv100: 7, density: 860, flashPoint });
    const mix = predicted([stock('low', low), stock('high', high)], [0.5, 0.5], { property: 'flashPoint' });
    published('flash point', mix, thiele, { absolute: 6 });
  });

  it('lies nearer to the more volatile stock than the mean does', () => {
    const mix = predicted([PAO_4, ESTER], [0.5, 0.5], { property: 'flashPoint' });
    expect(mix).toBeGreaterThan(220);
    expect(mix).toBeLessThan(235);
  });
});

describe('aniline point', () => {
  it('published (Riazi, ASTM MNL50, equation 3.126): 1.124 exp(0.00657 t), by hand at 100 °C', () => {
    // exp(0.657) = 1.92899.
    published('index', BLENDING_INDICES['riazi aniline point'].toIndex(100), 2.16819, { absolute: 5e-5 });
  });

  it('is averaged by volume', () => {
    const stock = (id: string, density: number, anilinePoint: number) =>
      referenceStock(id, { kv40: 46, kv100: 7, density, anilinePoint });
    const [a, b] = [1 / 850, 1 / 950].map((volume) => volume / (1 / 850 + 1 / 950));
    const byHand = Math.log(a * Math.exp(0.00657 * 110) + b * Math.exp(0.00657 * 70)) / 0.00657;
    const mix = predicted([stock('a', 850, 110), stock('b', 950, 70)], [0.5, 0.5], { property: 'anilinePoint' });
    published('aniline point', mix, byHand, { absolute: 1e-9 });
  });
});

describe('linear by mass (common practice, no source)', () => {
  it.each([
    ['noack', 13, 4, 10.75],
    ['sulphur', 3800, 200, 2900],
    ['saturates', 70, 99, 77.25],
  ] as const)('%s: three parts of %d and one of %d are %d', (property, first, second, mean) => {
    const stock = (id: string, density: number, value: number) =>
      referenceStock(id, { kv40: 46, kv100: 7, density, [property]: value });
    const mix = predicted([stock('a', 800, first), stock('b', 950, second)], [0.75, 0.25], { property });
    published(property, mix, mean, { absolute: 1e-9 });
  });
});
