import { findFigure, kinematicViscosityAt, type Limit, type Order, type Stock, viscosityIndex } from '../../src';

/** A stock's own value of a limited property, or undefined where it is not known (or not defined). */
export function stockValue(stock: Stock, limit: Limit, depressant: boolean): number | undefined {
  if (limit.property === 'vi') return outsideIsUnknown(() => ownViscosityIndex(stock));
  if (limit.property === 'kv' && limit.celsius !== undefined) return viscosityOf(stock, limit.celsius);
  if (limit.property === 'pourPoint' && depressant) {
    const depressed = findFigure(stock, 'pourPointDepressed')?.value;
    if (depressed !== undefined) return depressed;
  }
  return findFigure(stock, limit.property, limit.celsius)?.value;
}

/** Marks for a rail: the stocks of the recipe with their own values. */
export interface StockMark {
  stockId: string;
  name: string;
  value: number;
}

export function stockMarks(order: Order, usedStockIds: readonly string[], limit: Limit): StockMark[] {
  return order.stocks
    .filter((stock) => usedStockIds.includes(stock.id))
    .flatMap((stock) => {
      const value = stockValue(stock, limit, order.depressant ?? false);
      return value === undefined ? [] : [{ stockId: stock.id, name: stock.name, value }];
    });
}

function viscosityOf(stock: Stock, celsius: number): number | undefined {
  const measured = findFigure(stock, 'kv', celsius)?.value;
  if (measured !== undefined) return measured;
  const points = stock.figures.flatMap(({ property, celsius: at, value }) =>
    property === 'kv' && at !== undefined && value !== undefined ? [{ celsius: at, kv: value }] : [],
  );
  return points.length < 2 ? undefined : outsideIsUnknown(() => kinematicViscosityAt(celsius, points));
}

function ownViscosityIndex(stock: Stock): number | undefined {
  const kv40 = viscosityOf(stock, 40);
  const kv100 = viscosityOf(stock, 100);
  if (kv40 !== undefined && kv100 !== undefined) return viscosityIndex(kv40, kv100);
  return findFigure(stock, 'vi')?.value;
}

/** A stock outside a standard's range simply has no mark. */
function outsideIsUnknown(calculate: () => number | undefined): number | undefined {
  try {
    return calculate();
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}
