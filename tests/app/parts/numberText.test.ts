import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  commonSign,
  decimalSignOf,
  exactText,
  formatForEditing,
  formatNumber,
  parseNumber,
  unreadInWords,
} from '../../../app/parts/numberText';

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
  ])('reads %s by either decimal sign', (text, value) => {
    expect(parseNumber(text, '.')).toEqual({ value });
    expect(parseNumber(text, ',')).toEqual({ value });
  });

  it('takes three digits after the decimal sign for decimals', () => {
    expect(parseNumber('4.123', '.')).toEqual({ value: 4.123 });
    expect(parseNumber('4,123', ',')).toEqual({ value: 4.123 });
    expect(parseNumber('-4,123', ',')).toEqual({ value: -4.123 });
  });

  it('tells an empty field from a zero', () => {
    expect(parseNumber('  ')).toEqual({ empty: true });
    expect(parseNumber('0')).toEqual({ value: 0 });
  });

  it('refuses three digits after the other sign, and shows both readings', () => {
    expect(parseNumber('1,182', '.')).toEqual({ problem: '“1,182” can be read in two ways. Write 1182 or 1.182.' });
    expect(parseNumber('1.182', ',')).toEqual({ problem: '“1.182” can be read in two ways. Write 1182 or 1,182.' });
  });

  it.each(['1.234,5,6', '1,23,4', '12..5'])('refuses %s as readable in more than one way', (text) => {
    expect(parseNumber(text)).toEqual({
      problem: `“${text}” can be read in more than one way. Write it with one decimal sign only.`,
    });
  });

  it.each(['abc', '12 5', '5 mm²/s', '--3', '1e400'])('refuses %s', (text) => {
    expect(parseNumber(text)).toHaveProperty('problem');
  });

  it.each(['en-GB', 'de-DE', 'fr-FR', 'ar-EG'])('reads back whatever it writes in %s', (locale) => {
    const sign = decimalSignOf(locale);
    fc.assert(
      fc.property(fc.integer({ min: -1e9, max: 1e9 }), fc.integer({ min: 0, max: 4 }), (whole, decimals) => {
        const value = whole === 0 ? 0 : whole / 10 ** decimals;
        expect(parseNumber(formatForEditing(value, 2, locale), sign)).toEqual({ value });
      }),
    );
  });

  it('reads back every digit of a number by the sign it was written with', () => {
    const number = fc.double({ noNaN: true, noDefaultInfinity: true }).filter((value) => !Object.is(value, -0));
    fc.assert(
      fc.property(number, fc.constantFrom(',' as const, '.' as const), (value, sign) => {
        expect(parseNumber(exactText(value, sign), sign)).toEqual({ value });
      }),
    );
  });
});

describe('decimalSignOf', () => {
  // Unicode CLDR, number symbols of these locales.
  it.each([
    ['en-GB', '.'],
    ['de-DE', ','],
    ['fr-FR', ','],
    ['de-CH', '.'],
  ])('of %s is %s', (locale, sign) => {
    expect(decimalSignOf(locale)).toBe(sign);
  });
});

describe('commonSign', () => {
  it.each([
    [['1.182', '12,5', 'n.d.', '7'], ','],
    [['1,182', '12.5'], '.'],
    [['1.182', '1.240.000'], ','],
    [['1 240,500'], ','],
    [['0.123', '1,182'], '.'],
  ])('of %j is %s', (texts, sign) => {
    expect(commonSign(texts)).toBe(sign);
  });

  it.each([[['1.182', '1,182', '40', 'two']], [['12,5', '12.5']]])('of %j is not told', (texts) => {
    expect(commonSign(texts)).toBeUndefined();
  });
});

describe('unreadInWords', () => {
  it('shows both readings of a text that only a block could not place', () => {
    expect(unreadInWords('1.182', '.')).toBe('“1.182” can be read in two ways. Write 1182 or 1.182.');
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
