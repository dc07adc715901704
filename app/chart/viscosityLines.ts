import {
  type BlendOutcome,
  kinematicViscosityAt,
  kv40ForViscosityIndex,
  type Order,
  predictBlend,
  type Stock,
  type ViscosityPoint,
} from '../../src';
import { COLDEST, WARMEST } from './chartLayout';

/** One line of the chart, and what it was drawn through. */
export interface ViscosityLine {
  id: string;
  name: string;
  isMix: boolean;
  /** Where the line may bend, cold to warm: measured points of a stock, predicted ones of the mix. */
  points: readonly ViscosityPoint[];
  /** Coldest and warmest temperature [°C] that the figures carry. The line is dashed outside. */
  known: readonly [number, number];
}

/** Steps of the mix's line [°C]: under a one-temperature rule it bends at every temperature. */
const STEP = 10;

/** A stock's viscosities, cold to warm; none where fewer than two are known or they do not fall. */
export function pointsOf({ figures }: Pick<Stock, 'figures'>): ViscosityPoint[] {
  const points = figures.flatMap(({ property, celsius, value }) =>
    property === 'kv' && celsius !== undefined && value !== undefined ? [{ celsius, kv: value }] : [],
  );
  points.push(...kv40FromIndex(figures, points));
  points.sort((a, b) => a.celsius - b.celsius);
  const falls = points.every((point, place) => {
    const before = points[place - 1];
    return point.kv > 0.21 && (!before || (point.celsius > before.celsius && point.kv < before.kv));
  });
  return falls && points.length >= 2 ? points : [];
}

/** Data sheets often give KV100 and the viscosity index only: KV40 follows (ASTM D2270), as the engine reads it. */
function kv40FromIndex(figures: Stock['figures'], points: readonly ViscosityPoint[]): ViscosityPoint[] {
  const [only, another] = points;
  const vi = figures.find(({ property }) => property === 'vi')?.value;
  if (!only || another || only.celsius !== 100 || vi === undefined) return [];
  return outsideIsUnknown(() => [{ celsius: 40, kv: kv40ForViscosityIndex(vi, only.kv) }]) ?? [];
}

/** The mix at temperatures of the chart, by the order's own blending rule: not D341 through its KV40 and KV100. */
function mixLine(order: Order, outcome: BlendOutcome, stocks: readonly ViscosityLine[]): ViscosityLine | undefined {
  if (!outcome.recipe || stocks.length === 0) return undefined;
  const bends = stocks.flatMap(({ points }) => points.map(({ celsius }) => celsius));
  const temperatures = [...new Set([...evenTemperatures(), ...bends])];
  const { viscosityRule, ownProperties } = order;
  const { properties } = predictBlend(order.stocks, outcome.recipe, {
    viscosityRule,
    ownProperties,
    wanted: temperatures.map((celsius) => ({ property: 'kv', celsius })),
  });
  const points = properties
    .flatMap(({ property, celsius, value }) =>
      property === 'kv' && celsius !== undefined && value !== undefined ? [{ celsius, kv: value }] : [],
    )
    .sort((a, b) => a.celsius - b.celsius);
  const known = [
    Math.max(...stocks.map((line) => line.known[0])),
    Math.min(...stocks.map((line) => line.known[1])),
  ] as const;
  return points.length < 2 ? undefined : { id: 'mix', name: 'Mix', isMix: true, points, known };
}

function evenTemperatures(): number[] {
  return Array.from({ length: (WARMEST - COLDEST) / STEP + 1 }, (_, place) => COLDEST + STEP * place);
}

/** The lines of the mix and of the stocks in it, the mix first, then by share. No recipe: no lines. */
export function viscosityLines(order: Order, outcome: BlendOutcome): ViscosityLine[] {
  const stocks = [...(outcome.recipe ?? [])]
    .filter(({ massFraction }) => massFraction > 0)
    .sort((a, b) => b.massFraction - a.massFraction)
    .flatMap(({ stockId }) => order.stocks.find(({ id }) => id === stockId) ?? [])
    .flatMap(stockLine);
  const mix = mixLine(order, outcome, stocks);
  return mix ? [mix, ...stocks] : stocks;
}

function stockLine(stock: Stock): ViscosityLine[] {
  const points = pointsOf(stock);
  const first = points[0];
  const last = points.at(-1);
  if (!first || !last) return [];
  return [{ id: stock.id, name: stock.name, isMix: false, points, known: [first.celsius, last.celsius] }];
}

/** Viscosity [mm²/s] on a line at a temperature, undefined beyond the range of D341. */
export function kvOnLine({ points }: Pick<ViscosityLine, 'points'>, celsius: number): number | undefined {
  return outsideIsUnknown(() => kinematicViscosityAt(celsius, points));
}

/** Whether a temperature lies outside what the figures carry. */
export function isExtrapolated({ known: [coldest, warmest] }: Pick<ViscosityLine, 'known'>, celsius: number): boolean {
  return celsius < coldest || celsius > warmest;
}

function outsideIsUnknown<Value>(calculate: () => Value): Value | undefined {
  try {
    return calculate();
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}
