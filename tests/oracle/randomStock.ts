import type { Family, Figure, Stock } from '../../src/index';
import { viscosityTerm } from './indices';
import type { Draw } from './mulberry32';
import { kv40OfVi } from './viscosityIndex';
import { invert, waltherOf } from './walther';

/** Ranges of a family, wide enough to be unkind and close enough to be believed. Invented. */
interface Kind {
  family: Family;
  kv100: [number, number];
  vi: [number, number];
  density: [number, number];
  price: [number, number];
  pour: [number, number];
}

const KINDS: Kind[] = [
  { family: 'Group I', kv100: [3.5, 33], vi: [88, 104], density: [862, 905], price: [820, 1250], pour: [-15, -6] },
  { family: 'Group II', kv100: [2.1, 13], vi: [95, 118], density: [840, 875], price: [880, 1100], pour: [-21, -12] },
  {
    family: 'Group III',
    kv100: [2.4, 8.5],
    vi: [115, 138],
    density: [822, 848],
    price: [1050, 1450],
    pour: [-24, -12],
  },
  { family: 'PAO', kv100: [1.7, 10], vi: [110, 142], density: [795, 835], price: [1900, 2600], pour: [-70, -48] },
  { family: 'PAO', kv100: [38, 110], vi: [145, 172], density: [845, 858], price: [3000, 4200], pour: [-36, -27] },
  { family: 'ester', kv100: [2.6, 20], vi: [95, 165], density: [900, 1000], price: [2400, 3600], pour: [-60, -30] },
  { family: 'naphthenic', kv100: [2, 20], vi: [80, 95], density: [880, 925], price: [780, 1000], pour: [-50, -24] },
  { family: 'thickener', kv100: [60, 400], vi: [120, 170], density: [840, 900], price: [1900, 3300], pour: [-30, -9] },
];

/** One believable stock. */
export function randomStock(draw: Draw, place: number): Stock {
  const kind = draw.pick(KINDS);
  const kv100 = draw.ratio(...kind.kv100);
  const vi = draw.between(...kind.vi);
  const kv40 = kv40OfVi(vi, Math.max(2, kv100)) * (kv100 < 2 ? (kv100 / 2) ** 1.35 : 1);
  const quality = (vi - kind.vi[0]) / (kind.vi[1] - kind.vi[0]);
  const price =
    (kind.price[0] + (kind.price[1] - kind.price[0]) * (0.6 * quality + 0.4 * draw.next())) * draw.between(0.97, 1.03);
  const noack = Math.min(60, (62 / kv100 ** 1.15) * draw.between(0.7, 1.2));
  const round = (value: number, digits: number) => Number(value.toFixed(digits));
  const figure = (property: string, value: number, celsius?: number): Figure => ({
    property,
    ...(celsius === undefined ? {} : { celsius }),
    value,
    origin: 'measured',
  });
  const neat = Math.round(draw.between(...kind.pour));
  const waxy = kind.family.startsWith('Group');
  return {
    id: `s${place}`,
    name: `Stock ${place} (${kind.family})`,
    family: kind.family,
    pricePerTonne: round(price, 0),
    figures: [
      figure('density', round(draw.between(...kind.density), 1), 15),
      figure('kv', round(kv40, 2), 40),
      figure('kv', round(kv100, 3), 100),
      figure('noack', round(noack, 1)),
      figure('pourPoint', neat),
      ...(waxy ? [figure('pourPointDepressed', neat - Math.round(draw.between(9, 24)))] : []),
      figure('flashPoint', Math.min(320, Math.round(180 + 35 * Math.log(kv100) * draw.between(0.8, 1.2)))),
      figure(
        'sulphur',
        kind.family === 'Group I' ? Math.round(draw.between(500, 7000)) : Math.round(draw.between(0, 300)),
      ),
    ],
  };
}

/** The value of a figure that is there. */
export const figureOf = (stock: Stock, property: string, celsius?: number): number =>
  stock.figures.find((f) => f.property === property && (celsius === undefined || f.celsius === celsius))?.value ??
  Number.NaN;

/** KV40 and KV100 of a mix by the Wright method, for setting limits that are near what can be made. */
export function mixViscosities(stocks: readonly Stock[], x: readonly number[]): { kv40: number; kv100: number } {
  let weight = 0;
  let sum40 = 0;
  let sum100 = 0;
  stocks.forEach((stock, i) => {
    const kv40 = figureOf(stock, 'kv', 40);
    const kv100 = figureOf(stock, 'kv', 100);
    const density = figureOf(stock, 'density');
    const term = viscosityTerm('wright', { kv40, kv100, density, blendWeight: stock.blendWeight ?? 1 });
    weight += x[i] * term.weight;
    sum40 += x[i] * term.weight * term.index40;
    sum100 += x[i] * term.weight * term.index100;
  });
  return { kv40: invert(waltherOf, sum40 / weight), kv100: invert(waltherOf, sum100 / weight) };
}

/** A mix of two to four stocks, KV100 at least 2.2. */
export function randomMix(draw: Draw, stocks: readonly Stock[]): number[] {
  for (let attempt = 0; ; attempt++) {
    const chosen = draw.shuffled(stocks.map((_, i) => i)).slice(0, draw.whole(2, Math.min(4, stocks.length)));
    const x = stocks.map(() => 0);
    for (const place of chosen) x[place] = -Math.log(1 - draw.next());
    const sum = x.reduce((a, b) => a + b, 0);
    const mix = x.map((v) => v / sum);
    const { kv100 } = mixViscosities(stocks, mix);
    if ((kv100 >= 2.2 && kv100 < 60) || attempt > 50) return mix;
  }
}
