import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { chartScene } from '../../../app/chart/chartScene';
import { labelPlaces } from '../../../app/chart/labelPlaces';
import { isExtrapolated, kvOnLine, pointsOf, viscosityLines } from '../../../app/chart/viscosityLines';
import { viscosityWindows } from '../../../app/chart/viscosityWindows';
import { kinematicViscosityAt, logTemperature, waltherIndex } from '../../../src';
import { LIGHT, mixOf, orderOf, outcomeOf } from '../answer/answers';

const PLOT = { width: 300, height: 268 };

describe('the lines of the chart', () => {
  it('are the mix and the stocks in it, the largest share first', () => {
    const lines = viscosityLines(orderOf(), mixOf());
    expect(lines.map(({ name }) => name)).toEqual(['Mix', 'Light oil', 'Heavy oil']);
    expect(lines[0]?.points).toEqual([
      { celsius: 40, kv: 38.12 },
      { celsius: 100, kv: 6.67 },
    ]);
  });

  it('are none without a recipe', () => {
    expect(viscosityLines(orderOf(), outcomeOf())).toEqual([]);
  });

  it('leave out a stock with one viscosity only, or with viscosities that rise', () => {
    const [kv40, kv100] = LIGHT.figures;
    expect(pointsOf({ figures: kv40 ? [kv40] : [] })).toEqual([]);
    const rising = [kv40, kv100].flatMap((figure, place) => (figure ? [{ ...figure, value: place + 1 }] : []));
    expect(pointsOf({ figures: rising })).toEqual([]);
  });

  it('are straight on these axes, and dashed outside the measured points', () => {
    const scene = chartScene(viscosityLines(orderOf(), mixOf()), [], PLOT);
    const light = scene.lines.find(({ name }) => name === 'Light oil');
    expect(light?.solid.map(({ x }) => x)).toEqual([logTemperature(40), logTemperature(100)]);
    expect(light?.dashed).toHaveLength(2);
    // 70 °C by D341 through 40 and 100 °C lies on the straight line between the two places.
    const [a, b] = light?.solid ?? [];
    const share = (logTemperature(70) - (a?.x ?? 0)) / ((b?.x ?? 0) - (a?.x ?? 0));
    const points = pointsOf(LIGHT);
    const between = (a?.y ?? 0) + share * ((b?.y ?? 0) - (a?.y ?? 0));
    expect(waltherIndex(kinematicViscosityAt(70, points))).toBeCloseTo(between, 12);
    expect(isExtrapolated({ points }, 20)).toBe(true);
    expect(isExtrapolated({ points }, 40)).toBe(false);
  });

  it('end where D341 does', () => {
    const points = [
      { celsius: 40, kv: 1e6 },
      { celsius: 100, kv: 10 },
    ];
    expect(kvOnLine({ points }, -40)).toBeUndefined();
    const scene = chartScene([{ id: 'a', name: 'A', isMix: false, points }], [], PLOT);
    expect(scene.lines[0]?.dashed.length).toBeLessThanOrEqual(2);
  });

  it('reach the coldest measured point and beyond', () => {
    const points = [
      { celsius: -20, kv: 900 },
      { celsius: 40, kv: 20 },
      { celsius: 100, kv: 4 },
    ];
    const { xDomain, lines } = chartScene([{ id: 'a', name: 'A', isMix: false, points }], [], PLOT);
    expect(xDomain[0]).toBeLessThan(logTemperature(-20));
    expect(lines[0]?.solid).toHaveLength(3);
  });
});

describe('the windows of the chart', () => {
  it('are the limits on viscosity, and the ISO grade the mix falls into', () => {
    const order = orderOf({
      limits: [
        { property: 'kv', celsius: 100, min: 6, below: 7 },
        { property: 'vi', min: 95 },
      ],
    });
    const windows = viscosityWindows(order, mixOf());
    expect(windows).toContainEqual({ kind: 'limit', name: 'Limit at 100 °C', celsius: 100, min: 6, max: 7 });
    // KV40 of 38.12 lies between VG 32 (28.8 to 35.2) and VG 46 (41.4 to 50.6): no grade (ISO 3448).
    expect(windows).toHaveLength(1);
    const kv40 = { property: 'kv', celsius: 40, value: 45, unknownFrom: [], asTheRest: [], estimatedFrom: [] };
    const vg46 = viscosityWindows(orderOf(), mixOf({ properties: { properties: [kv40], spread: [] } }));
    // ISO 3448, VG 46: 41.4 to 50.6 mm²/s at 40 °C.
    expect(vg46).toEqual([{ kind: 'grade', name: 'ISO VG 46', celsius: 40, min: 41.4, max: 50.6 }]);
  });

  it('stand at their temperature, from their least to their greatest viscosity; open ones reach the edge', () => {
    const lines = viscosityLines(orderOf(), mixOf());
    const { windows, yDomain } = chartScene(
      lines,
      [
        { kind: 'limit', name: 'a', celsius: 40, min: 30, max: 40 },
        { kind: 'limit', name: 'b', celsius: 100, max: 7 },
      ],
      PLOT,
    );
    const [first, second] = windows;
    expect([first?.y1, first?.y2]).toEqual([waltherIndex(30), waltherIndex(40)]);
    expect(first?.x1).toBeLessThan(logTemperature(40));
    expect(first?.x2).toBeGreaterThan(logTemperature(40));
    expect(second?.y1).toBe(yDomain[0]);
  });
});

describe('the names at the lines’ ends', () => {
  it('keep their order and their distance, and stay within the plot', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: 0, max: 300, noNaN: true }), { maxLength: 15 }), (wanted) => {
        const places = labelPlaces(wanted, 13, 0, 300);
        const order = wanted.map((_, i) => i).sort((a, b) => (places[a] ?? 0) - (places[b] ?? 0));
        order.slice(1).forEach((place, i) => {
          const before = order[i] ?? 0;
          expect((places[place] ?? 0) - (places[before] ?? 0)).toBeGreaterThanOrEqual(13 - 1e-9);
          expect(wanted[place]).toBeGreaterThanOrEqual(wanted[before] ?? 0);
        });
        for (const place of places) expect(place).toBeLessThanOrEqual(300);
      }),
    );
  });

  it('stay where they are where there is room', () => {
    expect(labelPlaces([10, 100, 50], 13, 0, 300)).toEqual([10, 100, 50]);
  });
});
