import type { Dose, Limit, Order, ShareRule } from '../../src/index';
import { Draw } from './mulberry32';
import { figureOf, mixViscosities, randomMix, randomStock } from './randomStock';
import { viOf } from './viscosityIndex';

export type Width = 0.05 | 0.25 | 'none';

/** What a generated order contains; every part can be switched off. */
export interface OrderShape {
  stocks: [number, number];
  width?: Width;
  rules: boolean;
  choices: boolean;
}

export const CONTINUOUS: OrderShape = { stocks: [4, 14], rules: true, choices: false };
export const DISCRETE: OrderShape = { stocks: [4, 8], rules: true, choices: true };

function viscosityWindow(draw: Draw, width: Width, kv40: number, kv100: number): Limit[] {
  const centre = kv100 * draw.between(0.98, 1.02);
  if (width === 'none')
    return draw.chance(0.5)
      ? [{ property: 'kv', celsius: 40, min: kv40 * draw.between(0.8, 0.97), max: kv40 * draw.between(1.03, 1.3) }]
      : [];
  return [{ property: 'kv', celsius: 100, min: centre * (1 - width), max: centre * (1 + width) }];
}

function addRules(draw: Draw, order: Order, mix: readonly number[]): void {
  const { stocks } = order;
  const doses: Dose[] = [];
  const shares: ShareRule[] = [];
  if (draw.chance(0.3)) {
    const place = draw.whole(0, stocks.length - 1);
    const dose = draw.between(0.005, 0.12);
    doses.push(
      draw.chance(0.5)
        ? { stockId: stocks[place].id, exactly: dose }
        : { stockId: stocks[place].id, min: dose, max: dose * 2 },
    );
  }
  if (draw.chance(0.3)) {
    const place = draw.whole(0, stocks.length - 1);
    stocks[place].greatestDose = Math.min(1, Math.max(0.3, mix[place] * draw.between(0.7, 1.2)));
  }
  if (draw.chance(0.25)) {
    const family = draw.pick(stocks).family;
    shares.push({
      kind: 'share',
      set: { families: [family] },
      max: draw.between(0.15, 0.6),
      ...(draw.chance(0.3) ? { of: 'base oil' as const } : {}),
    });
  }
  if (draw.chance(0.15)) {
    order.batchTonnes = draw.whole(5, 40);
    stocks[draw.whole(0, stocks.length - 1)].availableTonnes = order.batchTonnes * draw.between(0.1, 0.6);
  }
  if (draw.chance(0.1)) {
    const [a, b] = draw.shuffled(stocks);
    shares.push({ kind: 'ratio', set: { stockIds: [a.id] }, to: { stockIds: [b.id] }, max: draw.between(0.5, 3) });
  }
  if (doses.length > 0) order.doses = doses;
  if (shares.length > 0) order.shares = shares;
}

function addChoices(draw: Draw, order: Order): void {
  const { stocks } = order;
  if (draw.chance(0.6)) order.mostStocks = draw.whole(2, 4);
  for (const stock of stocks) {
    if (draw.chance(0.5)) stock.leastDoseIfUsed = Math.min(stock.greatestDose ?? 1, draw.between(0.02, 0.15));
  }
  const shares = order.shares ?? [];
  if (draw.chance(0.25)) {
    const [a, b, c] = draw.shuffled(stocks);
    shares.push({ kind: 'excludes', stockId: a.id, set: { stockIds: [b.id, c.id] } });
  }
  if (draw.chance(0.25)) {
    const some = draw.shuffled(stocks).slice(0, 3);
    shares.push({ kind: 'count', set: { stockIds: some.map((stock) => stock.id) }, max: draw.whole(1, 2) });
  }
  if (shares.length > 0) order.shares = shares;
}

/** A seeded order: limits near what a random mix has, the viscosity index a little above or below it. */
export function randomOrder(seed: number, shape: OrderShape = CONTINUOUS): Order {
  const draw = new Draw(seed);
  const stocks = Array.from({ length: draw.whole(...shape.stocks) }, (_, place) => randomStock(draw, place));
  const mix = randomMix(draw, stocks);
  const { kv40, kv100 } = mixViscosities(stocks, mix);
  const width = shape.width ?? draw.pick<Width>([0.05, 0.25, 'none']);
  const mean = (property: string) => stocks.reduce((sum, stock, i) => sum + mix[i] * figureOf(stock, property), 0);
  const limits: Limit[] = viscosityWindow(draw, width, kv40, kv100);
  if (kv100 >= 2) limits.push({ property: 'vi', min: Math.round(10 * (viOf(kv40, kv100) + draw.between(-4, 2))) / 10 });
  if (draw.chance(0.6)) limits.push({ property: 'noack', max: mean('noack') * draw.between(0.95, 1.4) });
  const order: Order = { stocks, limits };
  if (draw.chance(0.4)) {
    order.depressant = draw.chance(0.5);
    limits.push({
      property: 'pourPoint',
      max: Math.round(mean('pourPoint')) + draw.whole(-3, 9) - (order.depressant ? 12 : 0),
    });
  }
  if (draw.chance(0.2))
    limits.push({ property: 'flashPoint', min: Math.round(mean('flashPoint')) - draw.whole(0, 30) });
  if (draw.chance(0.15))
    limits.push({ property: 'density', celsius: 15, max: mean('density') * draw.between(0.995, 1.02) });
  if (draw.chance(0.15))
    limits.push({ property: 'sulphur', max: Math.max(50, mean('sulphur') * draw.between(0.6, 1.5)) });
  if (shape.rules) addRules(draw, order, mix);
  if (shape.choices) addChoices(draw, order);
  return order;
}
