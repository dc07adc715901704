import type { Order } from '../../src/index';
import { Draw } from './mulberry32';
import { randomOrder } from './randomOrder';

/** A seeded order of 3 to 80 stocks with every kind of rule mixed in; small ones more often than large ones. */
export function mixedOrder(seed: number): Order {
  const draw = new Draw(seed * 7919 + 13);
  const most = draw.pick([6, 6, 10, 10, 10, 20, 40, 80]);
  const order = randomOrder(seed, { stocks: [3, most], rules: draw.chance(0.7), choices: draw.chance(0.6) });
  const { stocks } = order;
  if (draw.chance(0.4)) order.batchTonnes ??= draw.whole(4, 30);
  if (order.batchTonnes !== undefined && draw.chance(0.6)) {
    for (const stock of stocks) if (draw.chance(0.5)) stock.flushCost = draw.between(10, 800);
  }
  if (draw.chance(0.2)) {
    const [a, ...others] = draw.shuffled(stocks);
    const set = { stockIds: others.slice(0, draw.whole(1, 2)).map((stock) => stock.id) };
    order.shares = [...(order.shares ?? []), { kind: 'needs', stockId: a.id, set }];
  }
  if (typeof order.batchTonnes === 'number' && draw.chance(0.3)) {
    const free = stocks.filter((stock) => !order.doses?.some((dose) => dose.stockId === stock.id));
    if (free.length > 0) {
      const tonnes = order.batchTonnes * draw.between(0.005, 0.08);
      order.doses = [...(order.doses ?? []), { stockId: draw.pick(free).id, min: tonnes, unit: 'tonnes' }];
    }
  }
  return order;
}
