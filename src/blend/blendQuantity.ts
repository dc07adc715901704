import { BLENDING_INDICES, type BlendingIndex } from '../property/blendingIndex';
import { logTemperature, waltherIndex } from '../property/kinematicViscosity';
import type { PropertyDefinition } from '../property/propertyDefinition';
import { propertyDefinition } from '../property/propertyTable';
import { VISCOSITY_RULE_TABLE } from '../property/viscosityRule';
import type { Stock } from '../stock/stock';
import type { PredictionOptions, PropertyAt } from './predictionOptions';
import { type StockValue, stockValue } from './stockValue';

/**
 * How one stock enters a blended property: the mix has index Σ x w I / Σ x w over mass fractions x. A stock that
 * takes the value of the rest enters neither sum.
 */
export type BlendTerm =
  | { state: 'term'; weight: number; index: number; value: number; estimated: boolean }
  | Exclude<StockValue, { state: 'known' }>;

/** A property of a mix as a weighted mean of an index: every limit on it is linear in the mass fractions. */
export interface BlendQuantity extends PropertyAt {
  definition: PropertyDefinition;
  index: BlendingIndex;
  /** One a stock, in the order of the stocks. */
  terms: BlendTerm[];
}

/** Volume of a kilogram at 15 °C [L], or what is missing for it. */
function specificVolume(stock: Stock, options: PredictionOptions): number | Exclude<StockValue, { state: 'known' }> {
  const density = stockValue(stock, { property: 'density', celsius: 15 }, options);
  return density.state === 'known' ? 1000 / density.value : density;
}

/**
 * Weight of a stock under the Wright method (ASTM D7152), per unit of volume: -s with
 * s = (τ_anchor - τ)/(W_anchor - W), τ = log10 T. Averaging W by -s·v at one temperature is the same as averaging
 * the temperatures at equal viscosity. The second temperature of the method is 100 °C, or 40 °C from 70 °C up.
 */
function wrightSlope(stock: Stock, celsius: number, kv: number, options: PredictionOptions): number | StockValue {
  const anchor = celsius < 70 ? 100 : 40;
  const other = stockValue(stock, { property: 'kv', celsius: anchor }, options);
  if (other.state === 'as the rest') return halfRest(stock, celsius, anchor);
  if (other.state !== 'known') return other;
  const slope = (logTemperature(anchor) - logTemperature(celsius)) / (waltherIndex(other.value) - waltherIndex(kv));
  if (slope < 0 && Number.isFinite(slope)) return -slope;
  return {
    state: 'unknown',
    missing: { property: 'kv', celsius: celsius === 100 ? 40 : celsius },
    message:
      `${stock.name}: viscosity must fall as temperature rises, but it is ${kv} mm²/s at ${celsius} °C and ` +
      `${other.value} mm²/s at ${anchor} °C. Check both figures.`,
  };
}

/** The Wright method needs both temperatures of a stock, or neither. */
function halfRest(stock: Stock, celsius: number, anchor: number): StockValue {
  return {
    state: 'unknown',
    missing: { property: 'kv', celsius: anchor },
    message:
      `${stock.name}: its viscosity is given at ${celsius} °C but taken from the rest at ${anchor} °C. ` +
      'Enter both, or take both from the rest.',
  };
}

function viscosityTerm(stock: Stock, celsius: number, options: PredictionOptions): BlendTerm {
  const rule = VISCOSITY_RULE_TABLE[options.viscosityRule ?? 'wright'];
  const viscosity = stockValue(stock, { property: 'kv', celsius }, options);
  if (viscosity.state !== 'known') return viscosity;
  const { value, estimated } = viscosity;
  let weight = stock.blendWeight ?? 1;
  if (rule.basis !== 'mass') {
    const volume = specificVolume(stock, options);
    if (typeof volume !== 'number') return asUnknownDensity(stock, volume);
    weight *= volume;
  }
  if (rule.basis === 'wright') {
    const slope = wrightSlope(stock, celsius, value, options);
    if (typeof slope !== 'number') return slope.state === 'known' ? { state: 'as the rest' } : slope;
    weight *= slope;
  }
  return { state: 'term', weight, index: BLENDING_INDICES[rule.index].toIndex(value), value, estimated };
}

/** A density taken from the rest says nothing of the volume that a stock adds to an average: it is missing. */
function asUnknownDensity(stock: Stock, volume: Exclude<StockValue, { state: 'known' }>): BlendTerm {
  if (volume.state === 'unknown') return volume;
  return {
    state: 'unknown',
    missing: { property: 'density', celsius: 15 },
    message: `${stock.name}: Density at 15 °C is needed to count volumes. Enter the figure to use the stock.`,
  };
}

function tableTerm(
  stock: Stock,
  at: PropertyAt,
  definition: PropertyDefinition,
  index: BlendingIndex,
  options: PredictionOptions,
): BlendTerm {
  const found = stockValue(stock, at, options);
  if (found.state !== 'known') return found;
  let weight = 1;
  if (definition.basis === 'volume') {
    const volume = specificVolume(stock, options);
    if (typeof volume !== 'number') return asUnknownDensity(stock, volume);
    weight = volume;
  }
  return { state: 'term', weight, index: index.toIndex(found.value), value: found.value, estimated: found.estimated };
}

/** The property of any mix of the stocks, as a weighted mean. Throws RangeError for an unknown property. */
export function blendQuantity(
  stocks: readonly Stock[],
  at: PropertyAt,
  options: PredictionOptions = {},
): BlendQuantity {
  const definition = propertyDefinition(at.property, options.ownProperties);
  if (!definition || definition.id === 'vi') throw new RangeError(`"${at.property}" is not a property that blends.`);
  const celsius = at.celsius ?? definition.temperatures?.[0];
  const where: PropertyAt = celsius === undefined ? { property: at.property } : { property: at.property, celsius };
  if (definition.index === 'viscosity') {
    const rule = VISCOSITY_RULE_TABLE[options.viscosityRule ?? 'wright'];
    const index = BLENDING_INDICES[rule.index];
    return { ...where, definition, index, terms: stocks.map((stock) => viscosityTerm(stock, celsius ?? 100, options)) };
  }
  const index = BLENDING_INDICES[definition.index];
  const terms = stocks.map((stock) => tableTerm(stock, where, definition, index, options));
  return { ...where, definition, index, terms };
}
