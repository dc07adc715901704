import type { Dose, ShareRule, StockSet } from '../optimise/order';
import type { Stock } from '../stock/stock';
import type { ProductStocks } from './engineStocks';
import { missingInRule } from './unfinishedRule';
import type { WorkbookOrder } from './workbook';

/** Doses and shares in terms of the engine's stocks, with a word where they had to be put differently. */
export interface EngineRules {
  doses: Dose[];
  shares: ShareRule[];
  notes: string[];
}

type StocksOf = ReadonlyMap<string, ProductStocks>;

/** A dose that a recipe must hold: the stock may not be missing. */
export function isRequired({ exactly, min, required }: Dose): boolean {
  return required ?? ((exactly ?? 0) > 0 || (min ?? 0) > 0);
}

function stocksFor(productId: string, known: StocksOf): readonly Stock[] {
  return known.get(productId)?.stocks ?? [];
}

/**
 * A dose on a product with several lots holds for the lots together. Where it says "absent, or at least so much",
 * each lot in use must reach that least dose alone: stricter than needed, so the recipe surely keeps the rule.
 */
function doseOverLots(dose: Dose, stocks: readonly Stock[], rules: EngineRules): void {
  const min = dose.exactly ?? dose.min;
  const max = dose.exactly ?? dose.max;
  const of = dose.of === undefined ? {} : { of: dose.of };
  const least = isRequired(dose) || min === undefined ? { min } : {};
  const ends = Object.fromEntries(Object.entries({ ...least, max }).filter(([, value]) => value !== undefined));
  rules.shares.push({ kind: 'share', set: { stockIds: stocks.map(({ id }) => id) }, ...ends, ...of });
  if (isRequired(dose) || !min) return;
  for (const stock of stocks) stock.leastDoseIfUsed = Math.max(stock.leastDoseIfUsed ?? 0, min);
  rules.notes.push(`${stocks[0]?.name.split(' · ')[0]}: each lot in use must reach the least dose on its own.`);
}

function addDose(dose: Dose, known: StocksOf, rules: EngineRules): void {
  const stocks = stocksFor(dose.stockId, known);
  const [only] = stocks;
  if (stocks.length > 1) doseOverLots(dose, stocks, rules);
  else if (only) rules.doses.push({ ...dose, stockId: only.id });
  // Left as it stands, the engine refuses the order by name: a compulsory product must not vanish.
  else if (isRequired(dose)) rules.doses.push(dose);
}

/** Products as their stocks. Those that are not there drop out; `keep` leaves them in, for the engine to refuse. */
function stockSet(set: StockSet, known: StocksOf, keep: boolean): StockSet {
  if (!set.stockIds) return set;
  const stockIds = set.stockIds.flatMap((id) => {
    const stocks = stocksFor(id, known);
    return stocks.length > 0 || !keep ? stocks.map((stock) => stock.id) : [id];
  });
  return { ...set, stockIds };
}

const namesOnlyProducts = ({ families = [], flag }: StockSet) => families.length === 0 && flag === undefined;

/** True where a set of named products has none left, so that a rule which needs some of it cannot be kept. */
function isGone(set: StockSet, known: StocksOf): boolean {
  const ids = set.stockIds ?? [];
  return namesOnlyProducts(set) && ids.length > 0 && ids.every((id) => stocksFor(id, known).length === 0);
}

function engineShares(rule: ShareRule, known: StocksOf): ShareRule[] {
  if (rule.kind === 'flag') return [rule];
  if (rule.kind === 'excludes') {
    const set = stockSet(rule.set, known, false);
    return isGone(rule.set, known)
      ? []
      : stocksFor(rule.stockId, known).map(({ id }) => ({ ...rule, stockId: id, set }));
  }
  if (rule.kind === 'needs') {
    const set = stockSet(rule.set, known, isGone(rule.set, known));
    return stocksFor(rule.stockId, known).map(({ id }) => ({ ...rule, stockId: id, set }));
  }
  const needed = (rule.min ?? 0) > 0;
  if (rule.kind === 'ratio') {
    const to = isGone(rule.to, known) ? rule.to : stockSet(rule.to, known, false);
    if (isGone(rule.set, known) && !needed) return [];
    return [{ ...rule, set: stockSet(rule.set, known, needed && isGone(rule.set, known)), to }];
  }
  if (!isGone(rule.set, known)) return [{ ...rule, set: stockSet(rule.set, known, false) }];
  return needed ? [{ ...rule, set: stockSet(rule.set, known, true) }] : [];
}

/** A greatest dose of a product with several lots holds for the lots together, too. */
function greatestOverLots({ product, stocks }: ProductStocks): ShareRule[] {
  if (product.greatestDose === undefined || stocks.length < 2) return [];
  return [{ kind: 'share', set: { stockIds: stocks.map(({ id }) => id) }, max: product.greatestDose }];
}

/** The order's doses and shares, which name products, in terms of the stocks that stand for them. */
export function engineRules(order: WorkbookOrder, products: readonly ProductStocks[]): EngineRules {
  const known: StocksOf = new Map(products.map((entry) => [entry.product.id, entry]));
  const rules: EngineRules = { doses: [], shares: [], notes: [] };
  for (const dose of order.doses) addDose(dose, known, rules);
  const whole = order.shares.filter((rule) => missingInRule(rule) === undefined);
  const unfinished = order.shares.length - whole.length;
  if (unfinished === 1) rules.notes.push('One rule of the order is not finished: it asks for nothing yet.');
  if (unfinished > 1) rules.notes.push(`${unfinished} rules of the order are not finished: they ask for nothing yet.`);
  rules.shares.push(...whole.flatMap((rule) => engineShares(rule, known)), ...products.flatMap(greatestOverLots));
  if (order.mostStocks !== undefined && products.some(({ stocks }) => stocks.length > 1)) {
    rules.notes.push('The greatest number of stocks counts lots: two lots of a product count as two.');
  }
  return rules;
}
