import { PROPERTY_TABLE, propertyDefinition } from '../property/propertyTable';
import { hasViscosityIndex, viscosityIndex } from '../property/viscosityIndex';
import { VISCOSITY_RULES } from '../property/viscosityRule';
import { isBaseOil } from '../stock/family';
import type { Recipe, Stock } from '../stock/stock';
import { type BlendQuantity, blendQuantity } from './blendQuantity';
import { blendValue } from './blendValue';
import type { PredictedProperties, PredictedProperty, RuleSpread } from './predictedProperties';
import { type PredictionOptions, type PropertyAt, propertyAt } from './predictionOptions';
import { stockValue } from './stockValue';

export interface PredictOptions extends PredictionOptions {
  /** Properties to predict beside the usual ones. */
  wanted?: readonly PropertyAt[];
}

interface Part {
  stock: Stock;
  massFraction: number;
}

const ALWAYS: readonly PropertyAt[] = [
  { property: 'kv', celsius: 40 },
  { property: 'kv', celsius: 100 },
  { property: 'vi' },
  { property: 'density', celsius: 15 },
  { property: 'noack' },
  { property: 'pourPoint' },
  { property: 'flashPoint' },
  { property: 'sulphur' },
];

/** The stocks of a recipe with their shares; throws RangeError where the recipe is none. */
function partsOf(stocks: readonly Stock[], recipe: Recipe): Part[] {
  const byId = new Map(stocks.map((stock) => [stock.id, stock]));
  let sum = 0;
  const parts: Part[] = [];
  for (const { stockId, massFraction } of recipe) {
    const stock = byId.get(stockId);
    if (!stock) throw new RangeError(`The recipe names a stock "${stockId}" that is not in the list.`);
    if (parts.some((part) => part.stock.id === stockId)) throw new RangeError(`The recipe names ${stock.name} twice.`);
    if (!(massFraction >= 0)) throw new RangeError(`The share of ${stock.name} must be zero or more.`);
    sum += massFraction;
    if (massFraction > 0) parts.push({ stock, massFraction });
  }
  if (!(Math.abs(sum - 1) <= 1e-6))
    throw new RangeError(`The shares of a recipe must add up to 1; they add up to ${sum}.`);
  return parts;
}

function mean(quantity: BlendQuantity, parts: readonly Part[]): PredictedProperty {
  const result: PredictedProperty = {
    property: quantity.property,
    ...(quantity.celsius === undefined ? {} : { celsius: quantity.celsius }),
    unknownFrom: [],
    asTheRest: [],
    estimatedFrom: [],
  };
  parts.forEach(({ stock }, place) => {
    const term = quantity.terms[place];
    if (term.state === 'unknown') result.unknownFrom.push(stock.id);
    else if (term.state === 'as the rest') result.asTheRest.push(stock.id);
    else if (term.estimated) result.estimatedFrom.push(stock.id);
  });
  const value = blendValue(
    quantity,
    parts.map((part) => part.massFraction),
  );
  return Number.isFinite(value) ? { ...result, value } : result;
}

function viscosityIndexOf(kv40: PredictedProperty, kv100: PredictedProperty): PredictedProperty {
  const union = (key: 'unknownFrom' | 'asTheRest' | 'estimatedFrom') => [...new Set([...kv40[key], ...kv100[key]])];
  const result: PredictedProperty = {
    property: 'vi',
    unknownFrom: union('unknownFrom'),
    asTheRest: union('asTheRest'),
    estimatedFrom: union('estimatedFrom'),
  };
  const { value: u } = kv40;
  const { value: y } = kv100;
  const defined = u !== undefined && y !== undefined && hasViscosityIndex(u, y);
  return defined ? { ...result, value: viscosityIndex(u, y) } : result;
}

function predictOne(parts: readonly Part[], at: PropertyAt, options: PredictionOptions): PredictedProperty {
  if (parts.length === 1) return ofOneStock(parts[0].stock, at, options);
  const stocks = parts.map((part) => part.stock);
  return mean(blendQuantity(stocks, at, options), parts);
}

/** A stock alone has its own figures: no weight, and so no density, is needed. */
function ofOneStock(stock: Stock, { property, celsius }: PropertyAt, options: PredictionOptions): PredictedProperty {
  const temperature = celsius ?? propertyDefinition(property, options.ownProperties)?.temperatures?.[0];
  const found = stockValue(stock, propertyAt(property, temperature), options);
  return {
    ...propertyAt(property, temperature),
    ...(found.state === 'known' ? { value: found.value } : {}),
    unknownFrom: found.state === 'unknown' ? [stock.id] : [],
    asTheRest: found.state === 'as the rest' ? [stock.id] : [],
    estimatedFrom: found.state === 'known' && found.estimated ? [stock.id] : [],
  };
}

interface Viscosities {
  kv40: PredictedProperty;
  kv100: PredictedProperty;
  vi: PredictedProperty;
}

function viscositiesOf(parts: readonly Part[], options: PredictionOptions): Viscosities {
  const kv40 = predictOne(parts, { property: 'kv', celsius: 40 }, options);
  const kv100 = predictOne(parts, { property: 'kv', celsius: 100 }, options);
  return { kv40, kv100, vi: viscosityIndexOf(kv40, kv100) };
}

/** The same viscosities, and the index that follows, under every rule: the spread hints at the model's own error. */
function spreadOf(parts: readonly Part[], options: PredictionOptions, own: Viscosities): RuleSpread[] {
  const cold: RuleSpread = { property: 'kv', celsius: 40, byRule: [] };
  const hot: RuleSpread = { property: 'kv', celsius: 100, byRule: [] };
  const index: RuleSpread = { property: 'vi', byRule: [] };
  for (const rule of VISCOSITY_RULES) {
    const isOwn = rule === (options.viscosityRule ?? 'wright');
    const { kv40, kv100, vi } = isOwn ? own : viscositiesOf(parts, { ...options, viscosityRule: rule });
    const add = (spread: RuleSpread, { value }: PredictedProperty) =>
      spread.byRule.push(value === undefined ? { rule } : { rule, value });
    add(cold, kv40);
    add(hot, kv100);
    add(index, vi);
  }
  return [cold, hot, index];
}

function same(a: PropertyAt, b: PropertyAt): boolean {
  return a.property === b.property && (a.celsius ?? undefined) === (b.celsius ?? undefined);
}

/** Everything worth predicting: the usual properties, what is asked for, and what any stock has a figure of. */
function propertiesToPredict(parts: readonly Part[], options: PredictOptions): PropertyAt[] {
  const list: PropertyAt[] = [...ALWAYS];
  const add = ({ property, celsius }: PropertyAt) => {
    const at = celsius === undefined ? { property } : { property, celsius };
    if (!list.some((entry) => same(entry, at))) list.push(at);
  };
  for (const at of options.wanted ?? []) {
    const definition = propertyDefinition(at.property, options.ownProperties);
    if (!definition) throw new RangeError(`"${at.property}" is not a known property.`);
    add({ property: at.property, celsius: at.celsius ?? definition.temperatures?.[0] });
  }
  const known = [...PROPERTY_TABLE.map((entry) => entry.id), ...(options.ownProperties ?? []).map((own) => own.id)];
  for (const { stock } of parts.filter((part) => isBaseOil(part.stock.family))) {
    for (const figure of stock.figures) {
      if (figure.property === 'kv' || figure.property === 'pourPointDepressed') continue;
      if (known.includes(figure.property)) add(figure);
    }
  }
  return list;
}

/** Shares by volume at 15 °C, or undefined where a density is unknown. */
function volumeFractions(parts: readonly Part[], recipe: Recipe, options: PredictionOptions): number[] | undefined {
  const density = blendQuantity(
    parts.map((part) => part.stock),
    { property: 'density', celsius: 15 },
    options,
  );
  const volumes = new Map<string, number>();
  let total = 0;
  for (const [place, { stock, massFraction }] of parts.entries()) {
    const term = density.terms[place];
    if (term.state !== 'term') return undefined;
    volumes.set(stock.id, massFraction * term.weight);
    total += massFraction * term.weight;
  }
  return recipe.map(({ stockId, massFraction }) => (massFraction > 0 ? (volumes.get(stockId) ?? 0) / total : 0));
}

/**
 * Predicts the properties of a mix, in the units of the property table. Shares are mass fractions that add up to 1.
 * A property is left without a value where a stock in the mix has no figure for it; `unknownFrom` names the stocks.
 * Throws RangeError for a recipe that is none, or a wanted property that does not exist.
 */
export function predictBlend(
  stocks: readonly Stock[],
  recipe: Recipe,
  options: PredictOptions = {},
): PredictedProperties {
  const parts = partsOf(stocks, recipe);
  const viscosities = viscositiesOf(parts, options);
  const properties = propertiesToPredict(parts, options).map((at) => {
    if (at.property === 'vi') return viscosities.vi;
    if (at.property === 'kv' && at.celsius === 40) return viscosities.kv40;
    return at.property === 'kv' && at.celsius === 100 ? viscosities.kv100 : predictOne(parts, at, options);
  });
  const spread = spreadOf(parts, options, viscosities);
  const volumes = volumeFractions(parts, recipe, options);
  return volumes ? { properties, volumeFractions: volumes, spread } : { properties, spread };
}
