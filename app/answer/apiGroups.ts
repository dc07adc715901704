import { apiGroupOf, isBaseOil, type Order, type Recipe } from '../../src';
import { formatNumber } from '../parts/numberText';

const ORDER = ['I', 'II', 'III', 'IV', 'V'] as const;

/** "III 62.1 %, IV 30.0 %, not classed 5.0 %, additives 1.1 %": shares of the mix by mass, by the stocks' API groups. */
export function apiGroupsInWords({ stocks }: Pick<Order, 'stocks'>, recipe: Recipe): string {
  const shares = new Map<string, number>();
  for (const { stockId, massFraction } of recipe) {
    const stock = stocks.find(({ id }) => id === stockId);
    if (!stock || !(massFraction > 0)) continue;
    const group = isBaseOil(stock.family) ? (apiGroupOf(stock).group ?? 'not classed') : 'additives';
    shares.set(group, (shares.get(group) ?? 0) + massFraction);
  }
  return [...ORDER, 'not classed', 'additives']
    .flatMap((group) => {
      const share = shares.get(group);
      return share === undefined ? [] : [`${group} ${formatNumber(share * 100, 1)} %`];
    })
    .join(', ');
}
