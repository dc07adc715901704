import { kinematicViscosityAt, type ViscosityPoint } from '../property/kinematicViscosity';
import { propertyDefinition } from '../property/propertyTable';
import { kv40ForViscosityIndex } from '../property/viscosityIndex';
import type { Figure } from '../stock/figure';
import { findFigure } from '../stock/findFigure';
import type { Stock } from '../stock/stock';
import { type PredictionOptions, type PropertyAt, propertyAt } from './predictionOptions';

/** What is known of one property of one stock. `missing` names the figure that would help. */
export type StockValue =
  | { state: 'known'; value: number; estimated: boolean }
  | { state: 'as the rest' }
  | { state: 'unknown'; missing: PropertyAt; message: string; outOfRange?: true };

/** A property in words, "Kinematic viscosity at 40 °C". */
export function propertyInWords({ property, celsius }: PropertyAt, options: PredictionOptions = {}): string {
  const label = propertyDefinition(property, options.ownProperties)?.label ?? property;
  return celsius === undefined ? label : `${label} at ${celsius} °C`;
}

function unknown(stock: Stock, missing: PropertyAt, options: PredictionOptions): StockValue {
  const what = propertyInWords(missing, options);
  return {
    state: 'unknown',
    missing,
    message: `${stock.name}: ${what} is unknown. Enter the figure to use the stock.`,
  };
}

function known(figure: Figure): StockValue | undefined {
  if (figure.origin === 'as the rest') return { state: 'as the rest' };
  if (figure.value === undefined) return undefined;
  return { state: 'known', value: figure.value, estimated: figure.origin === 'estimated' };
}

interface ViscosityLine {
  points: ViscosityPoint[];
  estimated: boolean;
}

/** The stock's measured viscosities; a single KV100 with a stated viscosity index gives KV40 back (ASTM D2270). */
function viscosityLine(stock: Stock): ViscosityLine {
  const figures = stock.figures.filter((figure) => figure.property === 'kv');
  const points: ViscosityPoint[] = [];
  for (const { celsius, value } of figures) {
    if (celsius !== undefined && value !== undefined) points.push({ celsius, kv: value });
  }
  let estimated = figures.some((figure) => figure.origin === 'estimated');
  const vi = findFigure(stock, 'vi')?.value;
  const kv100 = points.find((point) => point.celsius === 100)?.kv;
  if (points.length === 1 && kv100 !== undefined && vi !== undefined) {
    points.push({ celsius: 40, kv: kv40ForViscosityIndex(vi, kv100) });
    estimated = true;
  }
  return { points, estimated };
}

function viscosityValue(stock: Stock, celsius: number, options: PredictionOptions): StockValue {
  const exact = findFigure(stock, 'kv', celsius);
  const direct = exact && known(exact);
  if (direct) return direct;
  const stated = stock.figures.filter((figure) => figure.property === 'kv');
  if (stated.length > 0 && stated.every((figure) => figure.origin === 'as the rest')) return { state: 'as the rest' };
  try {
    const { points, estimated } = viscosityLine(stock);
    if (points.length < 2) {
      const missing = points.some((point) => point.celsius === 100) ? 40 : 100;
      return unknown(
        stock,
        { property: 'kv', celsius: celsius === 40 || celsius === 100 ? celsius : missing },
        options,
      );
    }
    return { state: 'known', value: kinematicViscosityAt(celsius, points), estimated };
  } catch (error) {
    const message = error instanceof RangeError ? error.message : String(error);
    return { state: 'unknown', missing: { property: 'kv', celsius }, message: `${stock.name}: ${message}` };
  }
}

function tableValue(stock: Stock, { property, celsius }: PropertyAt, options: PredictionOptions): StockValue {
  if (property === 'pourPoint' && options.depressant) {
    const depressed = findFigure(stock, 'pourPointDepressed');
    const value = depressed && known(depressed);
    if (value) return value;
  }
  const figure = findFigure(stock, property, celsius) ?? withoutTemperature(stock, { property, celsius }, options);
  return (figure && known(figure)) ?? unknown(stock, propertyAt(property, celsius), options);
}

/** A figure stated without its temperature, where the property has but one (density at 15 °C). */
function withoutTemperature(stock: Stock, { property, celsius }: PropertyAt, options: PredictionOptions) {
  const temperatures = propertyDefinition(property, options.ownProperties)?.temperatures;
  if (temperatures?.length !== 1 || temperatures[0] !== celsius) return undefined;
  return stock.figures.find((figure) => figure.property === property && figure.celsius === undefined);
}

/** A figure that cannot be right counts as unknown, with the reason. */
function inSense(stock: Stock, at: PropertyAt, found: StockValue, options: PredictionOptions): StockValue {
  const definition = propertyDefinition(at.property, options.ownProperties);
  if (found.state !== 'known' || !definition) return found;
  const { sense, unit } = definition;
  if (found.value >= sense.min && found.value <= sense.max) return found;
  const what = propertyInWords(at, options);
  const message = `${stock.name}: ${what} of ${found.value} ${unit} cannot be right. Check the figure.`;
  return { state: 'unknown', missing: at, message, outOfRange: true };
}

/**
 * The value of a property of a stock, in the unit of the property table: the figure itself; for viscosities at
 * other temperatures the D341 line through the measured ones; for pour points in an order with depressant the
 * figure "with depressant", else the neat one (a depressant does not raise a pour point).
 */
export function stockValue(stock: Stock, at: PropertyAt, options: PredictionOptions): StockValue {
  const found =
    at.property === 'kv' ? viscosityValue(stock, at.celsius ?? 100, options) : tableValue(stock, at, options);
  return inSense(stock, at, found, options);
}
