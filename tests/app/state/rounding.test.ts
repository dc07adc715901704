import { expect, test } from 'vitest';
import { roundingsOf, stepOf } from '../../../app/state/rounding';

test('shares are rounded to percentages, and to divisions that make up a fixed batch', () => {
  expect(roundingsOf({})).toEqual(['0.1 %', '0.01 %']);
  expect(roundingsOf({ batchTonnes: { min: 8, max: 10 } })).toEqual(['0.1 %', '0.01 %']);
  expect(roundingsOf({ batchTonnes: 1 })).toEqual([
    '0.1 %',
    '0.01 %',
    '0.1 kg',
    '0.2 kg',
    '0.5 kg',
    '1 kg',
    '2 kg',
    '5 kg',
    '10 kg',
  ]);
  // 1005 kg is no whole number of tens.
  expect(roundingsOf({ batchTonnes: 1.005 })).not.toContain('10 kg');
});

test('a rounding is a step of the shares', () => {
  expect(stepOf('0.1 %', {})).toBe(0.001);
  expect(stepOf('0.01 %', {})).toBe(0.0001);
  expect(stepOf('5 kg', { batchTonnes: 10 })).toBe(0.0005);
  expect(stepOf('5 kg', {})).toBeUndefined();
  expect(stepOf('', {})).toBeUndefined();
});
