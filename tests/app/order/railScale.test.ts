import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  chooseScale,
  dragStep,
  fromFraction,
  keepScale,
  niceStep,
  scaleNumbers,
  snap,
  toFraction,
} from '../../../app/order/railScale';

const KV = { logarithmic: true, reportingUnit: 0.01, sense: { min: 0.3, max: 1e6 } };
const POUR = { logarithmic: false, reportingUnit: 1, sense: { min: -120, max: 80 } };

describe('the scale of a rail', () => {
  it.each([
    [0.03, 0.05],
    [1, 1],
    [1.2, 2],
    [4.9, 5],
    [51, 100],
  ])('steps by a round number: at least %s is %s', (least, step) => {
    expect(niceStep(least)).toBe(step);
  });

  it('shows every value with room at both sides', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 5000, noNaN: true }),
        fc.double({ min: 1, max: 3, noNaN: true }),
        (least, ratio) => {
          const scale = chooseScale({ ...KV, values: [least, least * ratio] });
          expect(toFraction(scale, least)).toBeGreaterThan(0.02);
          expect(toFraction(scale, least * ratio)).toBeLessThan(0.98);
          expect(scale.lo).toBeGreaterThan(0);
        },
      ),
    );
  });

  it('never leaves the sense of the property', () => {
    expect(chooseScale({ ...POUR, sense: { min: 0, max: 100 }, values: [1, 99] })).toMatchObject({ lo: 0, hi: 100 });
  });

  it('has a scale where nothing is known yet', () => {
    const scale = chooseScale({ ...POUR, values: [] });
    expect(scale.hi).toBeGreaterThan(scale.lo);
  });

  it('goes back and forth between value and place', () => {
    const scale = chooseScale({ ...KV, values: [41.4, 50.6] });
    for (const value of [38, 41.4, 46, 50.6])
      expect(fromFraction(scale, toFraction(scale, value))).toBeCloseTo(value, 9);
  });

  it('stays where it is while everything can be seen on it', () => {
    const scale = chooseScale({ ...POUR, values: [-24, -27] });
    expect(keepScale(scale, { ...POUR, values: [-25, -27] })).toBe(scale);
    expect(keepScale(scale, { ...POUR, values: [-60, -27] })).not.toBe(scale);
  });

  it('writes round numbers, by decades where the scale is wide', () => {
    expect(scaleNumbers({ lo: 40, hi: 52, logarithmic: true }, 4)).toEqual([40, 45, 50]);
    expect(scaleNumbers({ lo: 1, hi: 100, logarithmic: true }, 4)).toEqual([1, 2, 5, 10, 20, 50, 100]);
  });

  it('drags by about a pixel, by round numbers, never finer than a laboratory reports', () => {
    expect(dragStep({ lo: 40, hi: 52, logarithmic: true }, 300, 0.01)).toBe(0.05);
    expect(dragStep({ lo: -40, hi: -20, logarithmic: false }, 300, 1)).toBe(1);
    expect(snap(44.6321, 0.05)).toBe(44.65);
  });
});
