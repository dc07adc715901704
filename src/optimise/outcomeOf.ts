import { predictBlend } from '../blend/predictBlend';
import type { PredictedProperties } from '../blend/predictedProperties';
import { stockValue } from '../blend/stockValue';
import type { Recipe, Stock } from '../stock/stock';
import { cautionsOf } from './cautions';
import { checkLimits, type ValueOf } from './checkLimits';
import { conflictOf } from './conflictInWords';
import type { Order } from './order';
import type { BlendOutcome, LeftOut, OrderProblem, Proof } from './outcome';
import { recipeOf } from './recipeCheck';
import { type Candidates, neededProperties, predictionOptions } from './rows/candidates';
import { costOfTonnes } from './rows/priceSegments';
import type { SearchModel } from './rows/searchModel';
import type { SearchResult } from './search/branchAndBound';
import { gapReference } from './search/gapReference';

/** Tells what a search found: the recipe predicted anew and held against every limit, or what stands in the way. */
export function outcomeOf(
  order: Order,
  candidates: Candidates,
  model: SearchModel,
  found: SearchResult,
  relativeGap: number,
  milliseconds: number,
): BlendOutcome {
  const { leftOut } = candidates;
  const base = {
    stopped: found.stopped,
    proof: proofOf(found, model, candidates, relativeGap),
    leftOut,
    problems: [],
    work: { nodes: found.nodes, linearPrograms: found.linearPrograms, milliseconds },
  };
  if (!found.best) {
    const isImpossible = base.proof.kind !== 'none';
    const { limits, rules } = conflictOf(order, model, found.conflict);
    return { ...base, checks: [], cautions: [], ...(isImpossible ? { conflict: limits, conflictRules: rules } : {}) };
  }
  const recipe = recipeOf(model, found.best.values);
  const properties = predictBlend(order.stocks, recipe, {
    ...predictionOptions(order),
    wanted: neededProperties(order),
  });
  const checks = checkLimits(order, valueOfPrediction(properties));
  const failed = checks.find((check) => !check.passes);
  if (failed) throw new Error(`the recipe found misses limit ${failed.limit + 1} when predicted anew`);
  return {
    ...base,
    recipe,
    ...costsOf(order, recipe),
    objective: found.best.cost,
    properties,
    checks,
    cautions: cautionsOf(order, recipe, properties, checks),
  };
}

/** An order in which no stock can be used: impossible as far as the figures are known. */
export function nothingUsable(leftOut: LeftOut[], milliseconds: number): BlendOutcome {
  return {
    stopped: 'finished',
    proof: {
      kind: leftOut.every((entry) => entry.reason === 'missing flag') ? 'impossible' : 'impossible with known figures',
    },
    checks: [],
    leftOut,
    cautions: [],
    problems: [],
    conflict: [],
    conflictRules: ['no stock can be used: every one was left out'],
    work: { nodes: 0, linearPrograms: 0, milliseconds },
  };
}

export function refused(problems: OrderProblem[], leftOut: LeftOut[], milliseconds: number): BlendOutcome {
  return {
    stopped: 'refused',
    proof: { kind: 'none' },
    checks: [],
    leftOut,
    cautions: [],
    problems,
    work: { nodes: 0, linearPrograms: 0, milliseconds },
  };
}

export function engineFailed(error: unknown, leftOut: LeftOut[], milliseconds: number): BlendOutcome {
  const reason = error instanceof Error ? error.message : String(error);
  const message = `The solver failed (${reason}). Nothing is lost: solve again, or reload the page.`;
  return { ...refused([{ path: [], message }], leftOut, milliseconds), stopped: 'engine failed' };
}

function proofOf(found: SearchResult, model: SearchModel, candidates: Candidates, relativeGap: number): Proof {
  const { best, lowerBound } = found;
  if (!best) {
    if (lowerBound === Infinity)
      return { kind: leansOnFigures(candidates, found) ? 'impossible with known figures' : 'impossible' };
    return Number.isFinite(lowerBound) ? { kind: 'none', lowerBound } : { kind: 'none' };
  }
  if (!Number.isFinite(lowerBound)) return { kind: 'none' };
  const missing = best.cost - lowerBound;
  const gap = missing > 0 ? missing / gapReference(best.cost, model.prices) : 0;
  // A part closed at the cut-off lies one rounding beyond the gap asked for.
  return { kind: gap <= relativeGap * (1 + 1e-6) + 1e-12 ? 'least cost' : 'within gap', lowerBound, gap };
}

/** For want of figures stocks were left out, or the proof holds one to the small dose "as the rest". */
function leansOnFigures({ stocks, leftOut, takingTheRest }: Candidates, { conflict }: SearchResult): boolean {
  const heldBack = conflict.bounds.some(({ stock, end }) => end === 'most' && takingTheRest.has(stocks[stock].id));
  return heldBack || leftOut.some((entry) => entry.reason !== 'missing flag');
}

function valueOfPrediction(predicted: PredictedProperties): ValueOf {
  return (property, celsius) =>
    predicted.properties.find((entry) => entry.property === property && entry.celsius === celsius)?.value;
}

/** m³ per tonne at 15 °C, where the density is known. */
export function cubicMetresPerTonne(stock: Stock): number | undefined {
  const density = stockValue(stock, { property: 'density', celsius: 15 }, {});
  return density.state === 'known' ? 1000 / density.value : undefined;
}

/** A share this little below a price step has reached it: the tolerance of shares (see recipeCheck). */
const STEP_TOLERANCE = 1e-8;

/**
 * What a share of a stock costs per tonne of mix: its price, and in a batch of fixed size its price steps and what
 * using it costs at all.
 */
export function costOfShare(stock: Stock, massFraction: number, { batchTonnes }: Order): number {
  if (typeof batchTonnes !== 'number') return stock.pricePerTonne * massFraction;
  return costOfTonnes(stock, massFraction * batchTonnes, STEP_TOLERANCE * batchTonnes) / batchTonnes;
}

/** Cost per tonne from shares and what they cost alone, and per m³ where every density is known. */
function costsOf(order: Order, recipe: Recipe): Pick<BlendOutcome, 'costPerTonne' | 'costPerCubicMetre'> {
  const { stocks } = order;
  let costPerTonne = 0;
  let volume: number | undefined = 0;
  for (const { stockId, massFraction } of recipe) {
    const stock = stocks.find((candidate) => candidate.id === stockId);
    if (!stock) continue;
    costPerTonne += costOfShare(stock, massFraction, order);
    const specific = cubicMetresPerTonne(stock);
    volume = volume === undefined || specific === undefined ? undefined : volume + specific * massFraction;
  }
  return volume ? { costPerTonne, costPerCubicMetre: costPerTonne / volume } : { costPerTonne };
}
