import { describe, expect, it } from 'vitest';
import { reportedViscosityIndex, viscosityIndex } from '../../src';
import { apiGroupOf } from '../../src/property/grades';
import { referenceStock } from './referenceStocks';

/**
 * Typical PAO figures, handbook ranges from memory: KV100 and KV40 [mm²/s] and the index the handbooks state. A
 * sanity check only: the index worked from the middle of both viscosity ranges must lie near the stated range.
 */
const PAO = [
  { name: 'PAO 4', kv100: [3.9, 4.1], kv40: [16.5, 18.5], vi: [120, 130] },
  { name: 'PAO 6', kv100: [5.8, 6.0], kv40: [30, 32], vi: [135, 140] },
  { name: 'PAO 8', kv100: [7.8, 8.0], kv40: [46, 48], vi: [136, 140] },
  { name: 'PAO 40', kv100: [39, 40], kv40: [390, 410], vi: [145, 150] },
  { name: 'PAO 100', kv100: [100, 100], kv40: [1200, 1300], vi: [165, 175] },
] as const;

const middle = ([low, high]: readonly [number, number]) => (low + high) / 2;

describe('typical PAO figures (handbook ranges, from memory)', () => {
  it.each(PAO)('$name: the index of the middle figures lies within five of the stated range', ({ kv40, kv100, vi }) => {
    const index = reportedViscosityIndex(viscosityIndex(middle(kv40), middle(kv100)));
    expect(index).toBeGreaterThanOrEqual(vi[0] - 5);
    expect(index).toBeLessThanOrEqual(vi[1] + 5);
  });

  it.each(PAO)('$name: the corners of the two ranges hold the stated range', ({ kv40, kv100, vi }) => {
    expect(viscosityIndex(kv40[1], kv100[0])).toBeLessThan(vi[1]);
    expect(viscosityIndex(kv40[0], kv100[1])).toBeGreaterThan(vi[0]);
  });

  it('is Group IV without a figure', () => {
    expect(apiGroupOf(referenceStock('PAO 4', { kv40: 17.5, kv100: 4, density: 820 }, { family: 'PAO' })).group).toBe(
      'IV',
    );
  });
});
