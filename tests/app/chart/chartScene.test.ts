import { describe, expect, it } from 'vitest';
import { plotSize } from '../../../app/chart/chartLayout';
import { chartScene } from '../../../app/chart/chartScene';
import { viscosityLines } from '../../../app/chart/viscosityLines';
import { viscosityWindows } from '../../../app/chart/viscosityWindows';
import { kinematicViscosityAt, logTemperature, type Order, waltherIndex } from '../../../src';
import { celsiusAt, kvAt } from './axesBack';
import { answered, stockThrough, THICK, THIN } from './chartOrders';

const PLOT = plotSize(366);

function sceneOf(stocks = [THIN, THICK], shares = [0.5, 0.5], change: Partial<Order> = {}) {
  const { order, outcome } = answered(stocks, shares, change);
  return chartScene(viscosityLines(order, outcome), viscosityWindows(order, outcome), PLOT);
}

describe('chartScene', () => {
  it('draws the known part solid and the rest dashed, without a gap', () => {
    const { lines } = sceneOf();
    for (const { solid, dashed } of lines) {
      const [cold, warm] = dashed;
      expect(celsiusAt(solid[0]?.x ?? 0)).toBeCloseTo(40, 6);
      expect(celsiusAt(solid.at(-1)?.x ?? 0)).toBeCloseTo(100, 6);
      expect(cold?.at(-1)).toEqual(solid[0]);
      expect(warm?.[0]).toEqual(solid.at(-1));
      expect(celsiusAt(cold?.[0]?.x ?? 0)).toBeCloseTo(-30, 6);
      expect(celsiusAt(warm?.at(-1)?.x ?? 0)).toBeCloseTo(150, 6);
    }
  });

  it('places a stock where D341 through its points places it', () => {
    const thin = sceneOf().lines.find(({ name }) => name === 'Thin');
    const points = [
      { celsius: 40, kv: 17.4 },
      { celsius: 100, kv: 3.95 },
    ];
    expect(thin?.end?.y).toBeCloseTo(waltherIndex(kinematicViscosityAt(150, points)), 12);
    expect(thin?.solid[0]).toEqual({ x: logTemperature(40), y: waltherIndex(17.4) });
  });

  it('keeps every place and window inside its axes', () => {
    const limits = [{ property: 'kv', celsius: 40, min: 60, max: 90 }];
    const { lines, windows, yDomain } = sceneOf(undefined, undefined, { limits });
    const all = [
      ...lines.flatMap(({ solid, dashed }) => [...solid, ...dashed.flat()].map(({ y }) => y)),
      ...windows.flatMap(({ y1, y2 }) => [y1, y2]),
    ];
    expect(Math.min(...all)).toBeGreaterThanOrEqual(yDomain[0]);
    expect(Math.max(...all)).toBeLessThanOrEqual(yDomain[1]);
  });

  it('does not move its axes for a small change of the mix', () => {
    expect(sceneOf([THIN, THICK], [0.5, 0.5]).yDomain).toEqual(sceneOf([THIN, THICK], [0.49, 0.51]).yDomain);
  });

  it('draws a limit as a bar, an open end to the edge, and the ISO grade of the mix', () => {
    const vg46 = stockThrough('VG 46', [
      { celsius: 40, kv: 46 },
      { celsius: 100, kv: 6.8 },
    ]);
    const limits = [{ property: 'kv', celsius: 100, min: 6 }];
    const { windows, yDomain } = sceneOf([vg46], [1], { limits });
    const limit = windows.find(({ kind }) => kind === 'limit');
    expect(limit?.y1).toBe(waltherIndex(6));
    expect(limit?.y2).toBe(yDomain[1]);
    // ISO 3448: VG 46 reaches from 41.4 to 50.6 mm²/s at 40 °C.
    const grade = windows.find(({ kind }) => kind === 'grade');
    expect(grade?.name).toBe('ISO VG 46');
    expect(kvAt(grade?.y1 ?? 0)).toBeCloseTo(41.4, 6);
    expect(kvAt(grade?.y2 ?? 0)).toBeCloseTo(50.6, 6);
  });

  it('reaches down to a measured point below its usual range', () => {
    const arctic = stockThrough('Arctic', [
      { celsius: -54, kv: 1500 },
      { celsius: 40, kv: 14 },
      { celsius: 100, kv: 3.4 },
    ]);
    expect(celsiusAt(sceneOf([arctic], [1]).xDomain[0])).toBeCloseTo(-60, 6);
  });
});
