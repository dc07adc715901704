import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatForEditing, formatNumber, parseNumber } from '../../../app/parts/numberText';

describe('parseNumber', () => {
  it.each([
    ['12.5', 12.5],
    ['12,5', 12.5],
    [' 46 ', 46],
    ['-39', -39],
    ['−39', -39],
    ['+0,85', 0.85],
    ['.5', 0.5],
    ['1234', 1234],
    ['1234,567', 1234.567],
    ['0,125', 0.125],
    ['1 240,5', 1240.5],
    ['1\u202f240', 1240],
    ["1'240.5", 1240.5],
    ['1,240.5', 1240.5],
    ['1.240,5', 1240.5],
    ['1.240.000', 1_240_000],
    ['2e7', 2e7],
  ])('reads %s', (text, value) => {
    expect(parseNumber(text)).toEqual({ value });
  });

  it('tells an empty field from a zero', () => {
    expect(parseNumber('  ')).toEqual({ empty: true });
    expect(parseNumber('0')).toEqual({ value: 0 });
  });

  it('refuses what can be read in two ways and says what to write', () => {
    expect(parseNumber('1,234')).toEqual({
      problem: '“1,234” can be read in two ways. Write 1234 or 1.234.',
    });
  });

  it.each(['1.234,5,6', '1,23,4', '12..5'])('refuses %s as readable in more than one way', (text) => {
    expect(parseNumber(text)).toEqual({
      problem: `“${text}” can be read in more than one way. Write it with one decimal sign only.`,
    });
  });

  it.each(['abc', '12 5', '5 mm²/s', '--3', '1e400'])('refuses %s', (text) => {
    expect(parseNumber(text)).toHaveProperty('problem');
  });

  it('reads back whatever it writes for editing, where that has fewer than three decimals', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1e9, max: 1e9 }), (hundredths) => {
        const value = hundredths / 100;
        expect(parseNumber(formatForEditing(value, 2))).toEqual({ value: value === 0 ? 0 : value });
      }),
    );
  });
});

describe('formatNumber', () => {
  it('shows a fixed number of decimals and a dash for what is not known', () => {
    expect(formatNumber(5.8, 2)).toBe('5.80');
    expect(formatNumber(undefined, 2)).toBe('–');
    expect(formatNumber(Number.NaN, 2)).toBe('–');
  });

  it('never shows a negative zero', () => {
    expect(formatNumber(-0.001, 2)).toBe('0.00');
    expect(formatNumber(-0.01, 2)).toBe('-0.01');
  });
});

describe('formatForEditing', () => {
  it('hides no decimals that were typed', () => {
    expect(formatForEditing(44.625, 2)).toBe('44.625');
    expect(formatForEditing(44.6, 2)).toBe('44.60');
    expect(formatForEditing(undefined, 2)).toBe('');
  });
});
