import { apiGroupOf, isBaseOil, type Order, type Recipe, type Stock } from '../../src';
import { formatNumber } from '../parts/numberText';

const STATED = ['I', 'II', 'III'].map((group) => `${group} as stated`);
const ORDER = ['I', 'II', 'III', ...STATED, 'IV', 'V', 'not classed', 'thickener', 'package', 'depressant'];

/** The group a stock is entered under, where its figures do not tell: saturates, say, are rarely at hand. */
function statedGroup({ family }: Stock): string {
  const group = /^Group (I{1,3})$/.exec(family)?.[1];
  return group ? `${group} as stated` : 'not classed';
}

/** Base oils by their API group, additives by their kind. */
function kindOf(stock: Stock): string {
  return isBaseOil(stock.family) ? (apiGroupOf(stock).group ?? statedGroup(stock)) : stock.family;
}

/** "III 62.1 %, IV 30.0 %, not classed 5.0 %, package 1.1 %": shares of the mix by mass. */
export function apiGroupsInWords({ stocks }: Pick<Order, 'stocks'>, recipe: Recipe): string {
  const shares = new Map<string, number>();
  for (const { stockId, massFraction } of recipe) {
    const stock = stocks.find(({ id }) => id === stockId);
    if (!stock || !(massFraction > 0)) continue;
    const kind = kindOf(stock);
    shares.set(kind, (shares.get(kind) ?? 0) + massFraction);
  }
  return [...shares]
    .sort(([a], [b]) => ORDER.indexOf(a) - ORDER.indexOf(b))
    .map(([kind, share]) => `${kind} ${formatNumber(share * 100, 1)} %`)
    .join(', ');
}
