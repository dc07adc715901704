import { describe, expect, it } from 'vitest';
import { kinematicViscosityAt, kvFromWalther, logTemperature, waltherIndex } from '../../src';
import { explicitKvFromWalther, waltherCurvature, waltherSlope } from '../../src/property/kinematicViscosity';
import { published, recorded } from './closeTo';
import { dynamicToKinematic, kinematicToDynamic, MINERAL_OILS, PAO_AT_MINUS_40 } from './measuredOils';

const VISCOSITIES = Array.from({ length: 4001 }, (_, i) => 0.5 * 40_000 ** (i / 4000));

describe('the inverse of D341', () => {
  it('recorded: the standard’s explicit inverse differs from the exact one by at most 0.0122 % from 0.5 to 20 000 mm²/s', () => {
    let worst = 0;
    let where = 0;
    for (const kv of VISCOSITIES) {
      const difference = Math.abs(explicitKvFromWalther(waltherIndex(kv)) / kvFromWalther(waltherIndex(kv)) - 1);
      if (difference > worst) [worst, where] = [difference, kv];
    }
    published('largest difference', worst, 1.22e-4, { absolute: 1e-6 });
    published('where it lies', where, 0.55, { absolute: 0.02 });
  });

  it('is exact: there and back within rounding', () => {
    for (const kv of [0.21, 0.25, ...VISCOSITIES, 1e6, 2e7]) {
      published(`${kv}`, kvFromWalther(waltherIndex(kv)), kv, { relative: 1e-13 });
    }
  });

  it('agrees with bisection, a second way', () => {
    for (const kv of [0.3, 0.9, 2, 7.3, 46, 320, 12_000]) {
      const target = waltherIndex(kv);
      let [low, high] = [0.21, 2e7];
      for (let i = 0; i < 200; i++) {
        const middle = Math.sqrt(low * high);
        if (waltherIndex(middle) < target) low = middle;
        else high = middle;
      }
      published(`${kv}`, kvFromWalther(target), low, { relative: 1e-12 });
    }
  });
});

describe('the derivatives of W', () => {
  it.each([0.4, 0.8, 1.5, 3, 8, 46, 1000])('at %d mm²/s are those found by differences', (kv) => {
    const h = 1e-4 * kv;
    const [below, here, above] = [kv - h, kv, kv + h].map(waltherIndex);
    const slope = (above - below) / (2 * h);
    const second = (above - 2 * here + below) / (h * h);
    published('slope', waltherSlope(kv), slope, { relative: 1e-6 });
    published('curvature', waltherCurvature(kv), -second / slope, { relative: 1e-4 });
  });
});

describe('the line through measured points', () => {
  const two = [
    { celsius: 40, kv: 30.4 },
    { celsius: 100, kv: 5.15 },
  ];

  it('passes through its points, in any order, and is straight in log T and W', () => {
    expect(kinematicViscosityAt(40, two)).toBe(30.4);
    expect(kinematicViscosityAt(100, [two[1], two[0]])).toBe(5.15);
    const [w40, w100] = [waltherIndex(30.4), waltherIndex(5.15)];
    for (const celsius of [-20, 0, 25, 60, 80, 120]) {
      const share = (logTemperature(celsius) - logTemperature(40)) / (logTemperature(100) - logTemperature(40));
      const kv = kinematicViscosityAt(celsius, two);
      published(`W at ${celsius}`, waltherIndex(kv), w40 + share * (w100 - w40), { absolute: 1e-12 });
      recorded(`reversed at ${celsius}`, kinematicViscosityAt(celsius, [two[1], two[0]]), kv);
    }
  });

  it('a point on the line changes nothing; a point off it changes its own side only', () => {
    const on = [...two, { celsius: 70, kv: kinematicViscosityAt(70, two) }];
    for (const celsius of [0, 55, 85, 130]) {
      published(`${celsius}`, kinematicViscosityAt(celsius, on), kinematicViscosityAt(celsius, two), {
        relative: 1e-11,
      });
    }
    const off = [...two, { celsius: 0, kv: 400 }];
    expect(kinematicViscosityAt(20, off)).not.toBeCloseTo(kinematicViscosityAt(20, two), 1);
    recorded('80 °C', kinematicViscosityAt(80, off), kinematicViscosityAt(80, two));
  });

  it.each([
    [[two[0]], 'needs two measured points'],
    [[two[0], { celsius: 100, kv: 31 }], 'must fall as temperature rises'],
    [[two[0], { celsius: 40, kv: 29 }], 'must fall as temperature rises'],
  ])('refuses points that make no line', (points, words) => {
    expect(() => kinematicViscosityAt(60, points)).toThrow(RangeError);
    expect(() => kinematicViscosityAt(60, points)).toThrow(words);
  });

  it('refuses a viscosity outside the formula, and a temperature below zero kelvin', () => {
    expect(() => waltherIndex(0.2)).toThrow('outside ASTM D341');
    expect(() => waltherIndex(2.1e7)).toThrow('outside ASTM D341');
    expect(() => logTemperature(-274)).toThrow('absolute zero');
    for (const celsius of [800, -100]) {
      expect(() => kinematicViscosityAt(celsius, two), `${celsius} °C`).toThrow('leaves the range of ASTM D341');
    }
  });
});

describe('published: measured oils', () => {
  const errors = MINERAL_OILS.map(({ name, at30, at60, at100 }) => {
    const points = [
      { celsius: 30, kv: dynamicToKinematic(at30, 30) },
      { celsius: 100, kv: dynamicToKinematic(at100, 100) },
    ];
    return { name, error: kinematicToDynamic(kinematicViscosityAt(60, points), 60) / at60 - 1 };
  });

  it.each(errors)('$name: between 30 and 100 °C the line is within 6 % at 60 °C', ({ error }) => {
    expect(Math.abs(error)).toBeLessThan(0.06);
  });

  it('half of them are within 2 %', () => {
    const sizes = errors.map(({ error }) => Math.abs(error)).sort((a, b) => a - b);
    expect(sizes[Math.floor(sizes.length / 2)]).toBeLessThan(0.02);
  });

  it.each(PAO_AT_MINUS_40)('$name at -40 °C comes out 1.4 to 2 times too thick from 40 and 100 °C', (oil) => {
    const points = [
      { celsius: 40, kv: oil.kv40 },
      { celsius: 100, kv: oil.kv100 },
    ];
    const ratio = kinematicViscosityAt(-40, points) / oil.kvAtMinus40;
    expect(ratio).toBeGreaterThan(1.4);
    expect(ratio).toBeLessThan(2);
  });
});
