import type { Limit, Stock } from '../../src/index';
import { INDEX_RULES } from './indices';

export type Seen = { value: number } | 'as the rest' | undefined;

/** A figure of a stock as it stands: a value, "as the rest", or unknown. */
export function seen(stock: Stock, property: string, celsius?: number): Seen {
  const figure = stock.figures.find((f) => f.property === property && (celsius === undefined || f.celsius === celsius));
  if (!figure) return undefined;
  if (figure.origin === 'as the rest') return 'as the rest';
  return figure.value === undefined ? undefined : { value: figure.value };
}

/** The pour point an order reads: with depressant where it is used and known. */
export function pour(stock: Stock, depressant: boolean): Seen {
  return (depressant ? seen(stock, 'pourPointDepressed') : undefined) ?? seen(stock, 'pourPoint');
}

/** One reporting unit of a property. */
export function unitOf({ property }: Limit): number {
  return property === 'kv' ? 0.01 : property === 'vi' ? 1 : INDEX_RULES[property].unit;
}

/** The ends of a limit: strict upper limits one reporting unit inside, margins applied. */
export function endsOf(limit: Limit): { min?: number; max?: number } {
  const unit = unitOf(limit);
  const margin = limit.insideBy ?? 0;
  const uppers: number[] = [];
  if (limit.max !== undefined) uppers.push(limit.below === true ? limit.max - unit : limit.max);
  if (typeof limit.below === 'number') uppers.push(limit.below - unit);
  return {
    ...(limit.min === undefined ? {} : { min: limit.min + margin }),
    ...(uppers.length === 0 ? {} : { max: Math.min(...uppers) - margin }),
  };
}

/** Volume of a kilogram at 15 °C [L]; NaN where the density is unknown. */
export function volumeOf(stock: Stock): number {
  const density = seen(stock, 'density');
  return typeof density === 'object' ? 1000 / density.value : Number.NaN;
}
