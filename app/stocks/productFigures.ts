import type { Figure, Product } from '../../src';

/** Which figure: a property, at a temperature [°C] where it has one. */
export type FigureAt = Pick<Figure, 'property' | 'celsius'>;

/** "kv@40", "noack": the column of a figure, and its key in `Product.unread`. */
export function figureKey({ property, celsius }: FigureAt): string {
  return celsius === undefined ? property : `${property}@${celsius}`;
}

export function figureOf(product: Product, { property, celsius }: FigureAt): Figure | undefined {
  return product.figures.find((figure) => figure.property === property && figure.celsius === celsius);
}

/** The figure's value where it counts: not while the cell's text stands unread. */
export function countingValue(product: Product, at: FigureAt): number | undefined {
  return product.unread?.[figureKey(at)] === undefined ? figureOf(product, at)?.value : undefined;
}

/** Puts a figure in place of the one on the same property, or after the others. */
export function putFigure(product: Product, figure: Figure): void {
  const place = product.figures.findIndex((entry) => figureKey(entry) === figureKey(figure));
  if (place >= 0) product.figures[place] = figure;
  else product.figures.push(figure);
}
