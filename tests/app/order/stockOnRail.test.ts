import { describe, expect, it } from 'vitest';
import { stockMarks } from '../../../app/order/stockOnRail';
import type { Figure, Limit, Order, Stock } from '../../../src';

const figure = (property: string, value: number, celsius?: number): Figure => ({
  property,
  value,
  origin: 'typical',
  ...(celsius !== undefined && { celsius }),
});

function markOf(figures: Figure[], limit: Limit, change: Partial<Order> = {}): number | undefined {
  const stock: Stock = { id: 'one', name: 'One', family: 'Group II', pricePerTonne: 900, figures };
  return stockMarks({ stocks: [stock], limits: [limit], ...change }, ['one'], limit)[0]?.value;
}

describe('the mark of a stock on a rail', () => {
  it('works KV40 back from KV100 and a stated viscosity index, as the engine does', () => {
    // ASTM D2270, worked example of its appendix X1 as widely quoted: KV40 73.30, KV100 8.860 is VI 92 (from memory).
    const limit = { property: 'kv', celsius: 40, max: 100 };
    expect(markOf([figure('kv', 8.86, 100), figure('vi', 92)], limit)).toBeCloseTo(73.3, 0);
  });

  it('calculates the viscosity index from the viscosities', () => {
    const figures = [figure('kv', 73.3, 40), figure('kv', 8.86, 100)];
    expect(markOf(figures, { property: 'vi', min: 90 })).toBeCloseTo(92, 0);
  });

  it('reads pour points with depressant where one is used', () => {
    const figures = [figure('pourPoint', -12), figure('pourPointDepressed', -30)];
    const limit = { property: 'pourPoint', max: -20 };
    expect(markOf(figures, limit)).toBeCloseTo(-12, 6);
    expect(markOf(figures, limit, { depressant: true })).toBeCloseTo(-30, 6);
  });

  it('is not there where the figure is unknown', () => {
    expect(markOf([], { property: 'noack', max: 13 })).toBeUndefined();
    expect(markOf([], { property: 'density', celsius: 15, max: 900 })).toBeUndefined();
  });
});
