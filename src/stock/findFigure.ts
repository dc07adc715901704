import type { Figure } from './figure';
import type { Stock } from './stock';

/** The stock's figure for a property (at a temperature, where the property has one), or undefined: unknown. */
export function findFigure(stock: Stock, property: string, celsius?: number): Figure | undefined {
  return stock.figures.find(
    (figure) => figure.property === property && (celsius === undefined || figure.celsius === celsius),
  );
}
