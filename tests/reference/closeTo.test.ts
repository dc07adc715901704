import { describe, expect, it } from 'vitest';
import { published, recorded } from './closeTo';

describe('the comparison', () => {
  it('passes inside the tolerance, both ends included', () => {
    published('a', 10.5, 10, { absolute: 0.5 });
    published('a', 9.5, 10, { absolute: 0.5 });
    published('a', 101, 100, { relative: 0.01 });
    published('a', -101, -100, { relative: 0.01 });
    recorded('a', 0.1 + 0.2, 0.3);
  });

  it('fails outside, and prints the path, both values, the difference and the relative error', () => {
    expect(() => published('KV100 of the mix', 11, 10, { absolute: 0.5 })).toThrow(
      'KV100 of the mix: got 11, published 10; difference 1, relative 0.1, allowed 0.5',
    );
    expect(() => recorded('P', 2.001, 2)).toThrow(/P: got 2\.001, recorded 2; difference 0\.00099.*relative 0\.00049/);
    expect(() => published('a', 0.1, 0, { absolute: 0.01 })).toThrow('zero expected');
  });

  it.each([
    [Number.NaN, 1],
    [1, Number.NaN],
    [Number.POSITIVE_INFINITY, 1],
    [1.02, 1],
    [-1, 1],
  ])('fails on %d against %d', (actual, expected) => {
    expect(() => published('a', actual, expected, { relative: 0.01 })).toThrow('a: got');
    expect(() => recorded('a', actual, expected)).toThrow('a: got');
  });

  it('takes a relative tolerance of zero as none', () => {
    expect(() => published('a', 1e-9, 0, { relative: 0.01 })).toThrow();
  });
});
