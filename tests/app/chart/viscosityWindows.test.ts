import { describe, expect, it } from 'vitest';
import { viscosityWindows } from '../../../app/chart/viscosityWindows';
import { mixOf, orderOf } from '../answer/answers';

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
});
