import { type Figure, type Limit, type Order, type PredictedProperty, predictBlend, type Stock } from '../../src';

/** Marks for a rail: the stocks of the recipe with their own values. */
export interface StockMark {
  stockId: string;
  name: string;
  value: number;
}

/** An order is answered once and drawn often: what its stocks are alone is worked out once. */
const ALONE = new WeakMap<Order, Map<string, readonly PredictedProperty[]>>();

/** Any will do [kg/m³]: alone, a stock has all of the volume whatever its density. */
const STAND_IN: Figure = { property: 'density', celsius: 15, value: 900, origin: 'typical' };

/** A stock on its own as the engine reads it: a pure mix of one. */
function alone(order: Order, stock: Stock): readonly PredictedProperty[] {
  const known = ALONE.get(order) ?? new Map<string, readonly PredictedProperty[]>();
  ALONE.set(order, known);
  const properties = known.get(stock.id) ?? predictedAlone(order, stock);
  known.set(stock.id, properties);
  return properties;
}

function predictedAlone({ viscosityRule, depressant, ownProperties, limits }: Order, stock: Stock) {
  const hasDensity = stock.figures.some(({ property }) => property === 'density');
  const weighed = hasDensity ? stock : { ...stock, figures: [...stock.figures, STAND_IN] };
  const options = { viscosityRule, depressant, ownProperties, wanted: limits };
  const { properties } = predictBlend([weighed], [{ stockId: stock.id, massFraction: 1 }], options);
  return hasDensity ? properties : properties.filter(({ property }) => property !== 'density');
}

/** The stocks that are used, each at its own value of the limited property; those without one have no mark. */
export function stockMarks(order: Order, usedStockIds: readonly string[], limit: Limit): StockMark[] {
  return order.stocks
    .filter(({ id }) => usedStockIds.includes(id))
    .flatMap((stock) => {
      const found = alone(order, stock).find(
        ({ property, celsius }) =>
          property === limit.property && (limit.celsius === undefined || celsius === limit.celsius),
      );
      return found?.value === undefined ? [] : [{ stockId: stock.id, name: stock.name, value: found.value }];
    });
}
