import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { labelPlaces } from '../../../app/chart/labelPlaces';

describe('labelPlaces', () => {
  it('leaves labels that are apart where they are', () => {
    expect(labelPlaces([80, 20, 50], 13, 0, 100)).toEqual([80, 20, 50]);
  });

  it('moves labels apart that would meet, in their own order', () => {
    const [upper, lower] = labelPlaces([50, 51], 13, 0, 100);
    expect((lower ?? 0) - (upper ?? 0)).toBeGreaterThanOrEqual(13);
  });

  it('stays within the plot', () => {
    expect(labelPlaces([99, 100, 100], 13, 0, 100)).toEqual([74, 87, 100]);
    expect(labelPlaces([-5, 0], 13, 0, 100)).toEqual([0, 13]);
  });

  it('brings labels closer rather than out of the plot where there are too many', () => {
    const places = labelPlaces([10, 10, 10, 10, 10], 13, 0, 40);
    expect(Math.min(...places)).toBeGreaterThanOrEqual(0);
    expect(Math.max(...places)).toBeLessThanOrEqual(40);
    expect(new Set(places).size).toBe(5);
  });

  it('keeps order and distance whatever is wanted', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: 0, max: 300, noNaN: true }), { maxLength: 15 }), (wanted) => {
        const places = labelPlaces(wanted, 13, 0, 300);
        const order = wanted.map((_, place) => place).sort((a, b) => (places[a] ?? 0) - (places[b] ?? 0));
        order.slice(1).forEach((place, rank) => {
          const before = order[rank] ?? 0;
          expect((places[place] ?? 0) - (places[before] ?? 0)).toBeGreaterThanOrEqual(13 - 1e-9);
          expect(wanted[place]).toBeGreaterThanOrEqual(wanted[before] ?? 0);
        });
        for (const place of places) expect(place).toBeLessThanOrEqual(300);
      }),
    );
  });
});
