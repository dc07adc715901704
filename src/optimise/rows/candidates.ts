import { type BlendQuantity, blendQuantity } from '../../blend/blendQuantity';
import type { PredictionOptions, PropertyAt } from '../../blend/predictionOptions';
import { propertyDefinition } from '../../property/propertyTable';
import type { Stock } from '../../stock/stock';
import type { Order } from '../order';
import type { LeftOut, OrderProblem } from '../outcome';
import { percent } from '../ruleInWords';
import { doseShares } from './doseShares';
import { limitCelsius, limitDefinition } from './limitEnds';

/** The stocks the search may use, and the properties it needs of them. */
export interface Candidates {
  /** Usable stocks, sorted by id: the same order gives the same search, whatever the order of the list. */
  stocks: Stock[];
  /** The properties that limits need, by `quantityKey`; terms run along `stocks`. */
  quantities: Map<string, BlendQuantity>;
  /** Stocks that take the value of the rest in some limited property, with the key of that property. */
  takingTheRest: ReadonlyMap<string, string>;
  leftOut: LeftOut[];
  problems: OrderProblem[];
}

export function quantityKey({ property, celsius }: PropertyAt): string {
  return celsius === undefined ? property : `${property}@${celsius}`;
}

export function predictionOptions(order: Order): PredictionOptions {
  return {
    viscosityRule: order.viscosityRule ?? 'wright',
    depressant: order.depressant ?? false,
    ownProperties: order.ownProperties ?? [],
  };
}

/** Properties that the limits need of every stock; a viscosity index needs KV40 and KV100. */
export function neededProperties(order: Order): PropertyAt[] {
  const needed = new Map<string, PropertyAt>();
  const add = (at: PropertyAt) => void needed.set(quantityKey(at), at);
  for (const limit of order.limits) {
    const definition = limitDefinition(limit, order);
    if (!definition) continue;
    if (definition.id === 'vi') {
      add({ property: 'kv', celsius: 40 });
      add({ property: 'kv', celsius: 100 });
    } else {
      const celsius = limitCelsius(limit, definition);
      add(celsius === undefined ? { property: definition.id } : { property: definition.id, celsius });
    }
  }
  if (order.costBasis === 'cubic metre') add({ property: 'density', celsius: 15 });
  return [...needed.values()];
}

/** A stock the order cannot do without: a dose that is compulsory. */
export function isCompulsory(order: Order, stockId: string): boolean {
  return (order.doses ?? []).some(
    (dose) =>
      dose.stockId === stockId && dose.required !== false && (dose.required || (dose.exactly ?? dose.min ?? 0) > 0),
  );
}

/** Why a stock cannot serve for one property, if it cannot. */
function obstacle(stock: Stock, quantity: BlendQuantity, place: number): LeftOut | undefined {
  const term = quantity.terms[place];
  if (term.state !== 'unknown') return undefined;
  const { missing, message, outOfRange } = term;
  const reason = outOfRange ? 'figure out of range' : 'unknown figure';
  return { stockId: stock.id, name: stock.name, reason, ...missing, message };
}

/** Viscosity must fall as temperature rises, whatever the blending rule; a viscosity index needs it at both, or neither. */
function unfitViscosity(
  stock: Stock,
  kv40: BlendQuantity | undefined,
  kv100: BlendQuantity | undefined,
  place: number,
): LeftOut | undefined {
  const cold = kv40?.terms[place];
  const hot = kv100?.terms[place];
  if (!cold || !hot) return undefined;
  if (cold.state !== hot.state) {
    const message = `${stock.name}: KV40 and KV100 must both be given, or both be taken from the rest.`;
    return { stockId: stock.id, name: stock.name, reason: 'unknown figure', property: 'kv', celsius: 40, message };
  }
  if (cold.state !== 'term' || hot.state !== 'term' || cold.value > hot.value) return undefined;
  return {
    stockId: stock.id,
    name: stock.name,
    reason: 'figure out of range',
    property: 'kv',
    celsius: 40,
    message: `${stock.name}: KV40 (${cold.value} mm²/s) must be above KV100 (${hot.value} mm²/s). Check both figures.`,
  };
}

function missingFlag(stock: Stock, order: Order): LeftOut | undefined {
  for (const rule of order.shares ?? []) {
    if (rule.kind === 'flag' && !stock.flags?.includes(rule.flag)) {
      const message = `${stock.name} does not carry the flag "${rule.flag}" that the order asks of every stock.`;
      return { stockId: stock.id, name: stock.name, reason: 'missing flag', message };
    }
  }
  return undefined;
}

function whyLeftOut(
  stock: Stock,
  place: number,
  order: Order,
  quantities: ReadonlyMap<string, BlendQuantity>,
): LeftOut | undefined {
  const flag = missingFlag(stock, order);
  if (flag) return flag;
  for (const quantity of quantities.values()) {
    const found = obstacle(stock, quantity, place);
    if (found) return found;
  }
  if (order.costBasis === 'cubic metre' && quantities.get('density@15')?.terms[place].state !== 'term') {
    const message = `${stock.name}: Density at 15 °C is needed for a cost per m³. Enter the figure to use the stock.`;
    return { stockId: stock.id, name: stock.name, reason: 'unknown figure', property: 'density', celsius: 15, message };
  }
  return unfitViscosity(stock, quantities.get('kv@40'), quantities.get('kv@100'), place);
}

/** Compulsory doses of stocks that take the value of the rest, above the dose that is allowed for that. */
function dosesAboveTheRest(order: Order, takingTheRest: ReadonlyMap<string, string>): OrderProblem[] {
  const most = greatestDoseAsTheRest(order);
  return (order.doses ?? []).flatMap((stated) => {
    const dose = doseShares(stated, order);
    const key = takingTheRest.get(dose.stockId);
    const stock = order.stocks.find((candidate) => candidate.id === dose.stockId);
    if (key === undefined || !stock || !isCompulsory(order, dose.stockId)) return [];
    const ofMix = dose.of === 'base oil' ? 0 : (dose.exactly ?? dose.min ?? 0);
    const least = Math.max(ofMix, stock.leastDoseIfUsed ?? 0);
    if (least <= most) return [];
    const { name } = stock;
    const message =
      `${name} takes the value of the rest of the mix in a limited property, which is allowed up to ${percent(most)}; ` +
      `its dose is ${percent(least)}. Enter an in-blend figure, or raise the dose allowed "as the rest".`;
    return [{ path: ['stocks', dose.stockId, key], message }];
  });
}

/** The share up to which a stock may take the value of the rest. */
export function greatestDoseAsTheRest(order: Order): number {
  return order.greatestDoseAsTheRest ?? 0.02;
}

function requiredButLeftOut(entry: LeftOut): OrderProblem {
  const key =
    entry.property === undefined
      ? 'flags'
      : quantityKey({ property: entry.property, ...(entry.celsius === undefined ? {} : { celsius: entry.celsius }) });
  return { path: ['stocks', entry.stockId, key], message: `The order requires this stock, but: ${entry.message}` };
}

function sortedById(stocks: readonly Stock[]): Stock[] {
  return [...stocks].sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : 0));
}

/** Splits the stocks of a valid order into usable ones and those left out, with the reasons. */
export function findCandidates(order: Order): Candidates {
  const options = predictionOptions(order);
  const all = sortedById(order.stocks);
  const needed = neededProperties(order).filter((at) => propertyDefinition(at.property, order.ownProperties));
  const everyQuantity = new Map(needed.map((at) => [quantityKey(at), blendQuantity(all, at, options)]));
  const leftOut: LeftOut[] = [];
  const kept: number[] = [];
  all.forEach((stock, place) => {
    const reason = whyLeftOut(stock, place, order, everyQuantity);
    if (reason) leftOut.push(reason);
    else kept.push(place);
  });
  const quantities = new Map<string, BlendQuantity>();
  const takingTheRest = new Map<string, string>();
  for (const [key, quantity] of everyQuantity) {
    quantities.set(key, { ...quantity, terms: kept.map((place) => quantity.terms[place]) });
    for (const place of kept) if (quantity.terms[place].state === 'as the rest') takingTheRest.set(all[place].id, key);
  }
  const problems = [
    ...leftOut.filter((entry) => isCompulsory(order, entry.stockId)).map(requiredButLeftOut),
    ...dosesAboveTheRest(order, takingTheRest),
  ];
  return { stocks: kept.map((place) => all[place]), quantities, takingTheRest, leftOut, problems };
}
