import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { placeOfKv, temperatureTicks, viscosityTicks } from '../../../app/chart/d341Axes';
import { logTemperature, waltherIndex } from '../../../src';
import { celsiusAt, kvAt } from './axesBack';

describe('the axes of ASTM D341', () => {
  it('place temperatures and viscosities by the standard’s formula', () => {
    // Worked by hand from the formula of ASTM D341: lg 313.15 K, and lg lg (100 + 0.7), where exp(-1.47 - …) is nil.
    expect(logTemperature(40)).toBeCloseTo(2.495752, 6);
    expect(placeOfKv(100)).toBeCloseTo(Math.log10(Math.log10(100.7)), 12);
    expect(placeOfKv(100)).toBeCloseTo(0.301687, 6);
  });

  it('lead back to where they came from', () => {
    fc.assert(
      fc.property(fc.double({ min: -60, max: 200, noNaN: true }), (celsius) => {
        expect(celsiusAt(logTemperature(celsius))).toBeCloseTo(celsius, 8);
      }),
    );
    fc.assert(
      fc.property(fc.double({ min: 0.5, max: 1e6, noNaN: true }), (kv) => {
        expect(kvAt(placeOfKv(kv) ?? Number.NaN) / kv).toBeCloseTo(1, 9);
      }),
    );
  });

  it('have no place for what D341 does not cover', () => {
    expect(placeOfKv(0.2)).toBeUndefined();
    expect(placeOfKv(3e7)).toBeUndefined();
  });
});

describe('the ticks', () => {
  it('of viscosity are round numbers at their W, powers of ten first', () => {
    const ticks = viscosityTicks(2, 2000, 0);
    expect(ticks.map(({ value }) => value)).toEqual([2, 3, 5, 7, 10, 20, 30, 50, 100, 200, 500, 1000, 2000]);
    for (const { at, value } of ticks) expect(at).toBe(waltherIndex(value));
    const [ten, hundred] = [waltherIndex(10), waltherIndex(100)];
    expect(viscosityTicks(9, 110, hundred - ten).map(({ value }) => value)).toEqual([10, 100]);
  });

  it('keep their distance', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.001, max: 0.2, noNaN: true }), (apart) => {
        const ticks = viscosityTicks(0.5, 1e6, apart);
        for (const [place, { at }] of ticks.slice(1).entries()) {
          expect(at - (ticks[place]?.at ?? 0)).toBeGreaterThanOrEqual(apart);
        }
        expect(ticks.length).toBeGreaterThan(0);
      }),
    );
  });

  it('of temperature keep 40 and 100 °C where there is room for few', () => {
    expect(temperatureTicks(0, 120, 0).map(({ value }) => value)).toEqual([0, 20, 40, 60, 80, 100, 120]);
    const few = temperatureTicks(0, 120, logTemperature(100) - logTemperature(40)).map(({ value }) => value);
    expect(few).toEqual([40, 100]);
  });
});
