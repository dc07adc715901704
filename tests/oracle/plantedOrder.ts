import type { Order, ViscosityRule } from '../../src/index';
import { boundingLine } from './boundingLine';
import { INDEX_RULES, VISCOSITY_INDEX, type ViscosityTerm, viscosityTerm } from './indices';
import { Draw } from './mulberry32';
import { type Place, type PlantedWidth, windowAround, windowLimit } from './plantedWindow';
import { figureOf, randomMix, randomStock } from './randomStock';
import { viOf } from './viscosityIndex';
import { invert } from './walther';

/**
 * An order whose least cost is known before anyone solves it. A mix x* is chosen and limits are laid through it; with
 * multipliers λ ≥ 0 on their rows A (all A x ≤ 0, with A x* = 0) the prices are c = μ - λA, plus slack on stocks that
 * x* does not use. Then c·x ≥ μ for every mix that meets the rows, and c·x* = μ. For the viscosity index the row is a
 * line that touches the exact curve at x* and lies on the outside of it over the whole KV100 window.
 */
export interface Planted {
  order: Order;
  cost: number;
  x: number[];
  /** Where x* sits in the KV100 window. */
  place: Place;
  width: PlantedWidth;
}

/** Rows scaled so that their largest coefficient is 1, with their multipliers. */
class Prices {
  private readonly pull: number[];

  constructor(
    private readonly draw: Draw,
    count: number,
  ) {
    this.pull = Array.from({ length: count }, () => 0);
  }

  add(row: readonly number[], least = 0): void {
    const largest = Math.max(...row.map(Math.abs));
    const multiplier = (this.draw.between(least, 1) * 300) / largest;
    row.forEach((value, i) => {
      this.pull[i] += multiplier * value;
    });
  }

  at(base: number, x: readonly number[]): number[] {
    return this.pull.map(
      (pull, i) => base - pull + (x[i] > 0 || this.draw.chance(0.15) ? 0 : this.draw.between(0, 250)),
    );
  }
}

/** Limits on averages, laid through x* or with room, and their rows. */
function addMeans(draw: Draw, order: Order, x: readonly number[], prices: Prices): void {
  const laid: [string, 'min' | 'max', number][] = [
    ['noack', 'max', 0.6],
    ['pourPoint', 'max', 0.4],
    ['flashPoint', 'min', 0.3],
    ['sulphur', 'max', 0.2],
    ['density', 'max', 0.2],
    ['density', 'min', 0.15],
  ];
  for (const [property, end, chance] of laid) {
    if (!draw.chance(chance)) continue;
    const { basis, toIndex, fromIndex, sense } = INDEX_RULES[property];
    const weights = order.stocks.map((stock) => (basis === 'mass' ? 1 : 1000 / figureOf(stock, 'density')));
    const indices = order.stocks.map((stock) => toIndex(figureOf(stock, property)));
    const sum = weights.reduce((total, w, i) => total + w * x[i], 0);
    const mean = weights.reduce((total, w, i) => total + w * x[i] * indices[i], 0) / sum;
    const sign = (end === 'max' ? 1 : -1) * sense;
    if (Math.max(...indices) - Math.min(...indices) < 1e-9) continue;
    order.limits.push({ property, ...(property === 'density' ? { celsius: 15 } : {}), [end]: fromIndex(mean) });
    prices.add(weights.map((w, i) => w * sign * (indices[i] - mean)));
  }
}

function addRules(draw: Draw, order: Order, x: readonly number[], cost: number[]): void {
  const used = x.flatMap((share, i) => (share > 0 ? [i] : []));
  const [some] = draw.shuffled(used);
  const kind = draw.whole(0, 9);
  if (kind < 3) {
    // A cap at x*: its multiplier makes the capped stock cheaper still.
    order.stocks[some].greatestDose = x[some];
    cost[some] -= draw.between(0, 200);
  } else if (kind < 6) {
    // An exact dose: the price of such a stock is free.
    order.doses = [{ stockId: order.stocks[some].id, exactly: x[some] }];
    cost[some] = draw.between(500, 4000);
  }
  // Rules that x* keeps only make the set of mixes smaller: x* stays the cheapest.
  if (draw.chance(0.3)) order.mostStocks = used.length;
  if (draw.chance(0.3)) order.stocks[some].leastDoseIfUsed = x[some] * draw.between(0.3, 1);
}

function termsOf(order: Order, rule: ViscosityRule): ViscosityTerm[] {
  return order.stocks.map((stock) =>
    viscosityTerm(rule, {
      kv40: figureOf(stock, 'kv', 40),
      kv100: figureOf(stock, 'kv', 100),
      density: figureOf(stock, 'density'),
      blendWeight: stock.blendWeight ?? 1,
    }),
  );
}

function attempt(draw: Draw, width: PlantedWidth, place: Place): Planted | undefined {
  const stocks = Array.from({ length: draw.whole(5, 16) }, (_, place) => randomStock(draw, place));
  const order: Order = { stocks, limits: [] };
  if (draw.chance(0.15)) stocks[0].blendWeight = draw.between(0.7, 1.4);
  const rule = draw.chance(0.8) ? 'wright' : draw.pick(['walther', 'refutas', 'logarithmic'] as const);
  if (rule !== 'wright') order.viscosityRule = rule;
  const x = randomMix(draw, stocks);
  const terms = termsOf(order, rule);
  const index = VISCOSITY_INDEX[rule];
  const weight = terms.reduce((sum, t, i) => sum + x[i] * t.weight, 0);
  const u0 = terms.reduce((sum, t, i) => sum + x[i] * t.weight * t.index100, 0) / weight;
  const g0 = terms.reduce((sum, t, i) => sum + x[i] * t.weight * t.index40, 0) / weight;
  const y = invert(index, u0);
  if (!(y >= 2.1 && y < 90)) return undefined;
  const vi = viOf(invert(index, g0), y);
  if (!(vi > 60 && vi < 200)) return undefined;
  const thin = stocks.map((stock) => figureOf(stock, 'kv', 100));
  const window = windowAround(draw, y, width, place, [Math.min(...thin), Math.max(...thin)]);
  const side = window.place !== 'inside' && draw.chance(0.12) ? 'max' : 'min';
  const line = boundingLine({ vi, side, index }, y, window.low, window.high, draw);
  if (!line) return undefined;
  const prices = new Prices(draw, stocks.length);
  const sign = side === 'min' ? 1 : -1;
  order.limits.push({ property: 'vi', [side]: vi });
  prices.add(
    terms.map((t) => sign * t.weight * (t.index40 - g0 - line.slope * (t.index100 - u0))),
    0.2,
  );
  const kv = windowLimit(window, width);
  if (kv) order.limits.push(kv);
  if (window.place === 'low end') prices.add(terms.map((t) => -t.weight * (t.index100 - u0)));
  if (window.place === 'high end') prices.add(terms.map((t) => t.weight * (t.index100 - u0)));
  addMeans(draw, order, x, prices);
  const cost = prices.at(draw.between(1200, 2500), x);
  addRules(draw, order, x, cost);
  stocks.forEach((stock, i) => {
    stock.pricePerTonne = cost[i];
  });
  return { order, cost: x.reduce((sum, share, i) => sum + share * cost[i], 0), x, place: window.place, width };
}

/** A planted order; seeds whose first mixes cannot be planted draw on from the same stream. */
export function plantedOrder(seed: number): Planted {
  const draw = new Draw(seed);
  const width = draw.pick<PlantedWidth>([0.05, 0.25, 'none', 'piece']);
  const wish = draw.pick(['inside', 'low end', 'high end'] as const);
  for (let tries = 0; tries < 400; tries++) {
    // Over a wide window few mixes lie where one line bounds the curve: then the end of the window takes its place.
    const place = wish === 'inside' && tries >= 40 ? 'low end' : wish;
    const planted = attempt(draw, width, place);
    if (planted) return planted;
  }
  throw new Error(`Seed ${seed} plants nothing.`);
}
