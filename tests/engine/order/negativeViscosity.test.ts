import { describe, expect, test } from 'vitest';
import { kinematicViscosityAt } from '../../../src/index';

describe('a viscosity outside ASTM D341 is refused at every temperature, that of the point itself included', () => {
  // ASTM D341: the formula holds from 0.21 to 2·10⁷ mm²/s.
  test.each([
    ['negative at both temperatures', -5, -9],
    ['negative at 100 °C', 30, -1],
    ['zero', 5, 0],
    ['below the range', 5, 0.2],
    ['above the range', 3e7, 1e6],
    ['no number', Number.NaN, 5],
    ['without end', Infinity, 5],
  ])('%s', (_, kv40, kv100) => {
    const points = [
      { celsius: 40, kv: kv40 },
      { celsius: 100, kv: kv100 },
    ];
    for (const celsius of [40, 100, 70]) expect(() => kinematicViscosityAt(celsius, points)).toThrow(RangeError);
  });

  test('inside it a point is given back as it stands', () => {
    const points = [
      { celsius: 40, kv: 46 },
      { celsius: 100, kv: 6.8 },
    ];
    expect(points.map(({ celsius }) => kinematicViscosityAt(celsius, points))).toEqual([46, 6.8]);
  });
});
