import type { Order } from '../../../src/index';
import { Draw } from '../../oracle/mulberry32';
import { CONTINUOUS, randomOrder } from '../../oracle/randomOrder';

/**
 * A random order in which light oils look dear by the tonne: densities over a wide range, prices nearly alike by volume,
 * so that the cheapest mix by mass is far from the cheapest by volume and the search needs several rounds.
 */
export function orderByVolume(seed: number): Order {
  const draw = new Draw(seed);
  const order = randomOrder(seed, { ...CONTINUOUS, stocks: [12, 20], rules: false });
  const stocks = order.stocks.map((stock) => {
    const density = draw.between(700, 1100);
    const figures = stock.figures.map((figure) =>
      figure.property === 'density' ? { ...figure, value: density } : figure,
    );
    return { ...stock, pricePerTonne: (draw.between(900, 1100) * 1000) / density, figures };
  });
  return {
    ...order,
    stocks,
    limits: order.limits.filter((limit) => limit.property !== 'density'),
    costBasis: 'cubic metre',
  };
}
