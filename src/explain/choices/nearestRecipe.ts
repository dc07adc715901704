import { stockValue } from '../../blend/stockValue';
import type { Limit, Order } from '../../optimise/order';
import type { BlendOutcome } from '../../optimise/outcome';
import type { SolveOptions } from '../../optimise/solveOptions';
import type { OwnProperty } from '../../property/ownProperty';
import type { Figure } from '../../stock/figure';
import type { Recipe, Stock } from '../../stock/stock';
import { kv100Of, LimitedSolves } from '../limitedSolves';
import { AIM_TIME_MS, type AimedRecipe, USUAL_CEILING } from './aimedRecipe';

export interface NearestRecipe extends AimedRecipe {
  /** Sum of the changes of all shares, up and down [mass fraction]: 0 is the same recipe, 2 has no stock in common. */
  totalChange: number;
}

/** Ids of the properties that carry shares and cost; no property of a user's has a control character in it. */
const SHARE = '\u0001share ';
const COST = '\u0001cost';
const PER_CENT = 100;
/**
 * What every stock costs while changes are counted: the same for every mix, so that a gap relative to the whole is an
 * absolute one of the changes, 1e-4 %. No gap is small against nothing.
 */
const PRICE_OF_ANY = 100;

/** Cost as a property that averages: per tonne by mass, or per m³ by volume. */
function costFigure(stock: Stock, order: Order): Figure[] {
  if (order.costBasis !== 'cubic metre') {
    return [{ property: COST, value: stock.pricePerTonne, origin: 'measured' }];
  }
  const density = stockValue(stock, { property: 'density', celsius: 15 }, {});
  if (density.state !== 'known') return [];
  return [{ property: COST, value: (stock.pricePerTonne * density.value) / 1000, origin: 'measured' }];
}

/**
 * The order with changes in place of prices: the share of every stock is a property with the share in use as its aim,
 * one a per cent; the cost is a property with the ceiling as its limit. Both average exactly, so the search is exact.
 */
function asChanges(order: Order, inUse: Recipe, ceiling: number): Order {
  const share = (stockId: string) => inUse.find((line) => line.stockId === stockId)?.massFraction ?? 0;
  const own = (id: string, rule: OwnProperty['rule']): OwnProperty => ({ id, label: id, unit: '', rule, digits: 2 });
  const figures = (stock: Stock): Figure[] => [
    ...stock.figures,
    ...order.stocks.map(
      (other): Figure => ({
        property: SHARE + other.id,
        value: other.id === stock.id ? PER_CENT : 0,
        origin: 'measured',
      }),
    ),
    ...costFigure(stock, order),
  ];
  // An aim's weight is for one reporting unit, here 0.01 %.
  const aims = order.stocks.map(
    ({ id }): Limit => ({ property: SHARE + id, aim: share(id) * PER_CENT, aimWeight: 0.01 }),
  );
  return {
    ...order,
    costBasis: 'tonne',
    stocks: order.stocks.map((stock) => ({ ...stock, pricePerTonne: PRICE_OF_ANY, figures: figures(stock) })),
    limits: [...order.limits.map(({ aim: _, ...limit }) => limit), ...aims, { property: COST, max: ceiling }],
    ownProperties: [
      ...(order.ownProperties ?? []),
      ...order.stocks.map(({ id }) => own(SHARE + id, 'linear by mass')),
      own(COST, order.costBasis === 'cubic metre' ? 'linear by volume' : 'linear by mass'),
    ],
  };
}

/** True where the cost is more than prices and shares, and so no property of the mix. */
function hasOtherCosts(order: Order): boolean {
  const has = order.stocks.some(({ flushCost = 0, priceSteps = [] }) => flushCost > 0 || priceSteps.length > 0);
  return has && typeof order.batchTonnes === 'number';
}

/**
 * The recipe that changes a recipe in use least, at a cost of at most `within` (default 5 %) above the cheapest, in
 * the order's cost basis: one proven search, to a ten-thousandth of a per cent. Stocks in use that the order does not offer count as changed whatever the
 * recipe. Aims of the order are set aside. Undefined where there is no such recipe, or where flush costs or price
 * steps count: they are no property of a mix, and a ceiling over them cannot be held exactly in this way.
 */
export async function nearestRecipe(
  order: Order,
  outcome: BlendOutcome,
  inUse: Recipe,
  options: SolveOptions & { within?: number } = {},
): Promise<NearestRecipe | undefined> {
  const { within = USUAL_CEILING, ...solveOptions } = options;
  const { costPerTonne, costPerCubicMetre } = outcome;
  const least = order.costBasis === 'cubic metre' ? costPerCubicMetre : costPerTonne;
  if (costPerTonne === undefined || least === undefined || hasOtherCosts(order)) return undefined;
  const solves = new LimitedSolves(solveOptions, AIM_TIME_MS);
  const ceiling = least + (within + 2 * solves.relativeGap) * Math.abs(least);
  const { recipe, proof, stopped } = await solves.solve(asChanges(order, inUse, ceiling), kv100Of(outcome));
  if (!recipe) return undefined;
  const price = new Map(order.stocks.map((stock) => [stock.id, stock.pricePerTonne]));
  const cost = recipe.reduce((sum, line) => sum + line.massFraction * (price.get(line.stockId) ?? Number.NaN), 0);
  return {
    recipe,
    costPerTonne: cost,
    dearerBy: cost - costPerTonne,
    totalChange: totalChange(recipe, inUse),
    proven: proof.kind === 'least cost',
    stopped: stopped === 'time limit' || stopped === 'cancelled' ? stopped : 'finished',
    solves: solves.count,
  };
}

function totalChange(recipe: Recipe, inUse: Recipe): number {
  const ids = new Set([...recipe, ...inUse].map((line) => line.stockId));
  const share = (lines: Recipe, id: string) => lines.find((line) => line.stockId === id)?.massFraction ?? 0;
  return [...ids].reduce((sum, id) => sum + Math.abs(share(recipe, id) - share(inUse, id)), 0);
}
