import { buildModel } from '../../optimise/rows/buildModel';
import { findCandidates } from '../../optimise/rows/candidates';
import type { ModelRow, SearchModel, ViLimits } from '../../optimise/rows/searchModel';
import { viscosityIndex } from '../../property/viscosityIndex';
import { leastSquares } from './leastSquares';
import type { SolvesAgain } from './solvesAgain';

/** A row is met with no room up to this: thousandths of a reporting unit, or of a share's row. */
const ON_ROW = 1e-3;
const ON_BOUND = 1e-8;
/** Prices of the stocks in use must come out to this part of the greatest price, or the guess is none. */
const FIT = 1e-2;
/** Step of a difference [blending index of viscosity], and what part of a slope a change of slope at a knot is. */
const STEP = 1e-5;
const KINK = 1e-3;

/**
 * Guesses of entry prices, without a solve: at the least cost the price of every stock used freely is the sum of what
 * the rows that the mix sits on make of it; the same sum for an unused stock is the price at which it would be as good.
 * Exact where rows and knots fix the recipe, near where the viscosity index curves; with discrete rules any number. So a
 * guess is only where to ask first.
 * Empty where the stocks in use say nothing (aims, cost per m³, more rows than stocks).
 */
export function guessEntryPrices({ order, outcome }: SolvesAgain): ReadonlyMap<string, number> {
  if (order.costBasis === 'cubic metre' || order.limits.some((limit) => limit.aim !== undefined)) return new Map();
  const { model } = buildModel(order, findCandidates(order));
  const share = new Map(outcome.recipe?.map((line) => [line.stockId, line.massFraction]));
  const shares = Float64Array.from(model.stocks, (stock) => share.get(stock.id) ?? 0);
  const rows = model.rows.filter((row) => isOnRow(row, shares)).map((row) => coefficients(row, shares.length));
  if (model.vi) rows.push(...viRows(model.vi, shares));
  const equation = (i: number) => [1, ...rows.map((row) => row[i])];
  const free = [...shares.keys()].filter((i) => isFree(model, i, shares[i]));
  if (free.length < rows.length + 1) return new Map();
  const prices = free.map((i) => model.stocks[i].pricePerTonne);
  const unknowns = leastSquares(free.map(equation), prices);
  const priceOf = (i: number) => equation(i).reduce((sum, value, k) => sum + value * unknowns[k], 0);
  const greatest = Math.max(...prices.map(Math.abs));
  if (!free.every((i, at) => Math.abs(priceOf(i) - prices[at]) <= FIT * greatest)) return new Map();
  return new Map(model.stocks.flatMap((stock, i) => (shares[i] === 0 ? [[stock.id, priceOf(i)] as const] : [])));
}

function isFree(model: SearchModel, i: number, share: number): boolean {
  return share > 0 && share > model.lower[i] + ON_BOUND && share < model.upper[i] - ON_BOUND;
}

/** Whether the shares sit on a row over the stocks alone; the row of the sum is the price of a tonne. */
function isOnRow(row: ModelRow, shares: Float64Array): boolean {
  if (row.source.kind === 'sum' || row.columns.some((column) => column >= shares.length)) return false;
  const activity = row.columns.reduce((sum, column, k) => sum + row.values[k] * shares[column], 0);
  const tolerance = row.source.kind === 'limit' ? ON_ROW : ON_BOUND;
  return Math.abs(activity - row.lower) <= tolerance || Math.abs(activity - row.upper) <= tolerance;
}

function coefficients(row: ModelRow, count: number): number[] {
  const all = new Array<number>(count).fill(0);
  for (const [k, column] of row.columns.entries()) all[column] = row.values[k];
  return all;
}

/**
 * How the viscosity index answers to a little of each stock, where the mix sits on a limit of it. At a knot of Table 1
 * of D2270 the index bends in KV100, and the mix sits on two lines.
 */
function viRows(vi: ViLimits, shares: Float64Array): number[][] {
  const sumOf = (terms: (i: number) => number) => shares.reduce((sum, share, i) => sum + share * terms(i), 0);
  const weight = sumOf((i) => vi.weights[i]);
  const mean40 = sumOf((i) => vi.weights[i] * vi.index40[i]) / weight;
  const mean100 = sumOf((i) => vi.weights[i] * vi.index100[i]) / weight;
  const at = (index40: number, index100: number) =>
    viscosityIndex(vi.index.fromIndex(index40), vi.index.fromIndex(index100));
  const value = at(mean40, mean100);
  const isOn = (end: { value: number } | undefined) => end !== undefined && Math.abs(end.value - value) <= ON_ROW;
  if (!isOn(vi.min) && !isOn(vi.max)) return [];
  const by40 = (at(mean40 + STEP, mean100) - at(mean40 - STEP, mean100)) / (2 * STEP);
  const above = (at(mean40, mean100 + 2 * STEP) - at(mean40, mean100 + STEP)) / STEP;
  const below = (at(mean40, mean100 - STEP) - at(mean40, mean100 - 2 * STEP)) / STEP;
  const row = (by100: number) =>
    Array.from(
      shares,
      (_, i) => (vi.weights[i] / weight) * (by40 * (vi.index40[i] - mean40) + by100 * (vi.index100[i] - mean100)),
    );
  const isKnot = Math.abs(above - below) > KINK * Math.abs(above);
  return isKnot ? [row(below), row(above)] : [row((below + above) / 2)];
}
