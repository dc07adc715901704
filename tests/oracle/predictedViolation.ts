import { type Order, type PredictedProperties, predictBlend } from '../../src/index';
import { endsOf, unitOf } from './figures';

export type Predict = typeof predictBlend;

function lookUp(predicted: PredictedProperties, property: string, celsius?: number): number | undefined {
  return predicted.properties.find((p) => p.property === property && (celsius === undefined || p.celsius === celsius))
    ?.value;
}

/** The worst miss of the limits in reporting units, as `predictBlend` alone sees it; Infinity where unknown. */
export function predictedViolation(order: Order, x: readonly number[], predict: Predict = predictBlend): number {
  const recipe = order.stocks.flatMap((stock, i) => (x[i] > 0 ? [{ stockId: stock.id, massFraction: x[i] }] : []));
  const predicted = predict(order.stocks, recipe, {
    viscosityRule: order.viscosityRule,
    depressant: order.depressant,
    ownProperties: order.ownProperties,
    wanted: order.limits.map(({ property, celsius }) => (celsius === undefined ? { property } : { property, celsius })),
  });
  let worst = -Infinity;
  for (const limit of order.limits) {
    const celsius = limit.property === 'kv' ? (limit.celsius ?? 100) : limit.celsius;
    const value = lookUp(predicted, limit.property, celsius);
    const { min, max } = endsOf(limit);
    if (value === undefined) return Infinity;
    worst = Math.max(worst, Math.max((min ?? -Infinity) - value, value - (max ?? Infinity)) / unitOf(limit));
  }
  return worst;
}

export function costOf(order: Order, x: readonly number[]): number {
  return order.stocks.reduce((sum, stock, i) => sum + x[i] * stock.pricePerTonne, 0);
}
