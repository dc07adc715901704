import { type BlendOutcome, kinematicViscosityAt, type Order, type Stock, type ViscosityPoint } from '../../src';

/** One line of the chart, and what it was drawn through. */
export interface ViscosityLine {
  id: string;
  name: string;
  isMix: boolean;
  /** Measured (for the mix: predicted) points, cold to warm. The line is dashed outside them. */
  points: readonly ViscosityPoint[];
}

/** A stock's viscosities, cold to warm; none where fewer than two are known or they do not fall. */
export function pointsOf({ figures }: Pick<Stock, 'figures'>): ViscosityPoint[] {
  const points = figures.flatMap(({ property, celsius, value }) =>
    property === 'kv' && celsius !== undefined && value !== undefined ? [{ celsius, kv: value }] : [],
  );
  points.sort((a, b) => a.celsius - b.celsius);
  const falls = points.every((point, place) => {
    const before = points[place - 1];
    return point.kv > 0.21 && (!before || (point.celsius > before.celsius && point.kv < before.kv));
  });
  return falls && points.length >= 2 ? points : [];
}

/** The mix is drawn through its two usual viscosities: under the Wright method its line is straight. */
function mixPoints({ properties }: BlendOutcome): ViscosityPoint[] {
  return [40, 100].flatMap((celsius) => {
    const kv = properties?.properties.find((entry) => entry.property === 'kv' && entry.celsius === celsius)?.value;
    return kv === undefined ? [] : [{ celsius, kv }];
  });
}

/** The lines of the mix and of the stocks in it, the mix first, then by share. No recipe: no lines. */
export function viscosityLines(order: Order, outcome: BlendOutcome): ViscosityLine[] {
  const { recipe } = outcome;
  if (!recipe) return [];
  const mix = mixPoints(outcome);
  const stocks = recipe
    .filter(({ massFraction }) => massFraction > 0)
    .sort((a, b) => b.massFraction - a.massFraction)
    .flatMap(({ stockId }) => order.stocks.find(({ id }) => id === stockId) ?? []);
  return [
    ...(mix.length === 2 ? [{ id: 'mix', name: 'Mix', isMix: true, points: mix }] : []),
    ...stocks.flatMap((stock) => {
      const points = pointsOf(stock);
      return points.length ? [{ id: stock.id, name: stock.name, isMix: false, points }] : [];
    }),
  ];
}

/** Viscosity [mm²/s] on a line at a temperature, undefined beyond the range of D341. */
export function kvOnLine({ points }: Pick<ViscosityLine, 'points'>, celsius: number): number | undefined {
  try {
    return kinematicViscosityAt(celsius, points);
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}

/** Whether a temperature lies outside what the line was drawn through. */
export function isExtrapolated({ points }: Pick<ViscosityLine, 'points'>, celsius: number): boolean {
  const [first] = points;
  const last = points.at(-1);
  return !first || !last || celsius < first.celsius || celsius > last.celsius;
}
