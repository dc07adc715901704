import { isBaseOil } from '../stock/family';
import type { Stock } from '../stock/stock';
import { limitInWords } from './checkLimits';
import { checkShape } from './checkShape';
import type { Dose, Limit, Order, ShareRule } from './order';
import type { OrderProblem } from './outcome';
import { doseShares } from './rows/doseShares';
import { limitDefinition, limitEnds } from './rows/limitEnds';
import { pricesRise } from './rows/priceSegments';
import { isInSet } from './stockSet';

type Path = (string | number)[];

/** A compulsory share below this cannot be told from none. */
const LEAST_DOSE = 1e-7;
/** No quantity of an order is larger; beyond it the engines lose their digits. */
const LARGEST = 1e9;

/** Collects problems: what is wrong and what to do, with the place in the order. */
class Problems {
  readonly found: OrderProblem[] = [];

  add(path: Path, message: string): void {
    this.found.push({ path, message });
  }

  /** Complains unless the value is absent or a number in the range. */
  number(path: Path, value: unknown, label: string, min = -LARGEST, max = LARGEST): void {
    if (value === undefined) return;
    if (typeof value !== 'number' || !Number.isFinite(value)) this.add(path, `${label} must be a number.`);
    else if (value < min || value > max) {
      const range = max === LARGEST ? `at least ${min}` : `${min} to ${max}`;
      this.add(path, `${label} must be ${range}; it is ${value}.`);
    }
  }

  range(path: Path, min: number | undefined, max: number | undefined, label: string): void {
    if (min !== undefined && max !== undefined && min > max) {
      this.add([...path, 'min'], `${label}: the least (${min}) is above the most (${max}). Swap or widen them.`);
    }
  }
}

function checkPriceSteps(stock: Stock, problems: Problems): void {
  const { id, name, priceSteps = [] } = stock;
  const path: Path = ['stocks', id, 'priceSteps'];
  const seen = new Set<number>();
  for (const { fromTonnes, pricePerTonne } of priceSteps) {
    problems.number(path, fromTonnes, `Quantity of a price step of ${name}`, 1e-6);
    problems.number(path, pricePerTonne, `Price of a step of ${name}`);
    if (typeof fromTonnes !== 'number' || typeof pricePerTonne !== 'number') {
      problems.add(path, `${name}: a price step needs a quantity and a price. Enter both, or remove the step.`);
    }
    if (seen.has(fromTonnes)) problems.add(path, `${name}: two price steps start at ${fromTonnes} t. Remove one.`);
    seen.add(fromTonnes);
  }
  if (pricesRise(stock)) {
    problems.add(path, `${name}: a price for all tonnes cannot rise with the quantity. Let it count for the excess.`);
  }
}

function checkStock(stock: Stock, problems: Problems): void {
  const at = (key: string): Path => ['stocks', stock.id, key];
  if (typeof stock.pricePerTonne !== 'number' || !Number.isFinite(stock.pricePerTonne)) {
    problems.add(
      at('pricePerTonne'),
      `${stock.name} has no price that is a number. Enter one, or leave the stock out.`,
    );
  }
  problems.number(at('leastDoseIfUsed'), stock.leastDoseIfUsed, `Least dose of ${stock.name}`, 0, 1);
  problems.number(at('greatestDose'), stock.greatestDose, `Greatest dose of ${stock.name}`, 0, 1);
  problems.number(at('availableTonnes'), stock.availableTonnes, `Quantity on hand of ${stock.name}`, 0);
  checkPriceSteps(stock, problems);
  problems.number(at('flushCost'), stock.flushCost, `Flush cost of ${stock.name}`, 0);
  problems.number(at('lotTonnes'), stock.lotTonnes, `Drum size of ${stock.name}`, 1e-6);
  problems.number(at('blendWeight'), stock.blendWeight, `Blending weight of ${stock.name}`, 1e-3, 1e3);
  for (const figure of stock.figures) {
    const key = figure.celsius === undefined ? figure.property : `${figure.property}@${figure.celsius}`;
    problems.number(at(key), figure.celsius, `Temperature of a figure of ${stock.name}`, -150, 400);
    problems.number(at(key), figure.value, `${stock.name}: the figure of ${key}`);
    if (figure.value === undefined && figure.origin !== 'as the rest') {
      problems.add(at(key), `${stock.name}: the figure of ${key} has no value. Enter it, or remove the figure.`);
    }
  }
}

function checkStocks(order: Order, problems: Problems): void {
  if (order.stocks.length === 0) problems.add(['stocks'], 'There are no stocks to blend. Add at least one.');
  const seen = new Set<string>();
  for (const stock of order.stocks) {
    if (seen.has(stock.id)) problems.add(['stocks', stock.id, 'id'], `Two stocks have the id "${stock.id}".`);
    seen.add(stock.id);
    checkStock(stock, problems);
  }
}

function checkLimit(limit: Limit, place: number, order: Order, problems: Problems): void {
  const path: Path = ['limits', place];
  const definition = limitDefinition(limit, order);
  if (!definition) {
    problems.add(
      [...path, 'property'],
      `"${limit.property}" is not a known property. Pick one of the list, or add it.`,
    );
    return;
  }
  const { sense } = definition;
  const label = limitInWords(limit, order);
  if (definition.anyTemperature || (definition.temperatures?.length ?? 0) > 1) {
    if (limit.celsius === undefined) problems.add([...path, 'celsius'], `${label} needs a temperature. Enter one.`);
  }
  for (const key of ['min', 'max', 'aim'] as const) {
    problems.number([...path, key], limit[key], label, sense.min, sense.max);
  }
  if (typeof limit.below !== 'boolean') problems.number([...path, 'below'], limit.below, label, sense.min, sense.max);
  else if (limit.below && limit.max === undefined)
    problems.add([...path, 'below'], `${label}: "below" needs the number beside it.`);
  problems.number([...path, 'insideBy'], limit.insideBy, `${label}, margin`, 0);
  problems.number([...path, 'aimWeight'], limit.aimWeight, `${label}, weight of the aim`, 0);
  problems.number([...path, 'celsius'], limit.celsius, `${label}, temperature`, -100, 300);
  if (definition.id === 'vi' && limit.aim !== undefined) {
    problems.add([...path, 'aim'], 'An aim on the viscosity index is not possible yet. Give a range instead.');
  }
  const ends = limitEnds(limit, definition);
  if (ends.min !== undefined && ends.max !== undefined && ends.min > ends.max) {
    const margin = limit.insideBy || limit.below !== undefined ? ' once the margin and "below" are counted' : '';
    problems.add(
      [...path, 'min'],
      `${label}: the least (${ends.min}) is above the most (${ends.max})${margin}. Swap or widen them.`,
    );
  }
}

function checkDoseInTonnes(dose: Dose, path: Path, name: string, order: Order, problems: Problems): void {
  if (dose.of === 'base oil') problems.add([...path, 'unit'], `Dose of ${name}: tonnes are counted on the mix.`);
  if (order.batchTonnes === undefined) {
    problems.add(
      [...path, 'unit'],
      `Dose of ${name}: tonnes need a batch size. Enter it, or give the dose in per cent.`,
    );
  } else if (dose.exactly !== undefined && typeof order.batchTonnes === 'object') {
    problems.add([...path, 'exactly'], `Dose of ${name}: an exact number of tonnes needs a fixed batch size.`);
  } else {
    const least = dose.exactly ?? dose.min ?? 0;
    const batch = typeof order.batchTonnes === 'object' ? order.batchTonnes.min : order.batchTonnes;
    if (least > batch) {
      problems.add(path, `Dose of ${name}: ${least} t are more than the batch of ${batch} t. Reduce it, or make more.`);
    }
  }
}

function checkDose(dose: Dose, place: number, order: Order, problems: Problems): void {
  const path: Path = ['doses', place];
  const stock = order.stocks.find((candidate) => candidate.id === dose.stockId);
  if (!stock) {
    problems.add([...path, 'stockId'], `The dose names a stock ("${dose.stockId}") that is not in this order.`);
    return;
  }
  for (const key of ['exactly', 'min', 'max'] as const) {
    problems.number([...path, key], dose[key], `Dose of ${stock.name}`, 0, dose.unit === 'tonnes' ? LARGEST : 1);
  }
  if (dose.unit === 'tonnes') checkDoseInTonnes(dose, path, stock.name, order, problems);
  problems.range(path, dose.min, dose.max, `Dose of ${stock.name}`);
  const share = doseShares(dose, order);
  const stated = share.exactly ?? share.min ?? 0;
  if (stated > 0 && stated < LEAST_DOSE) {
    problems.add(path, `Dose of ${stock.name}: less than 0.00001 % of the mix is no dose. Raise it, or remove it.`);
  }
  if (dose.exactly !== undefined && (dose.min !== undefined || dose.max !== undefined)) {
    problems.add([...path, 'exactly'], `Dose of ${stock.name}: give either an exact dose or a range.`);
  }
  if (dose.of === 'base oil' && dose.required === false && (dose.exactly ?? dose.min ?? 0) > 0) {
    problems.add(path, `Dose of ${stock.name}: "absent or at least" is counted on the mix, not on the base oil.`);
  }
  if (dose.of === 'base oil' && !order.stocks.some((candidate) => isBaseOil(candidate.family))) {
    problems.add(path, `Dose of ${stock.name}: there is no base oil among the stocks.`);
  }
}

function checkShare(rule: ShareRule, place: number, order: Order, problems: Problems): void {
  const path: Path = ['shares', place];
  const known = new Set(order.stocks.map((stock) => stock.id));
  const sets = 'set' in rule ? [rule.set, ...('to' in rule ? [rule.to] : [])] : [];
  for (const set of sets) {
    const strange = set.stockIds?.find((id) => !known.has(id));
    if (strange !== undefined) problems.add(path, `The rule names a stock ("${strange}") that is not in this order.`);
    const empty = !set.stockIds?.length && !set.families?.length && set.flag === undefined;
    if (empty) problems.add(path, 'The rule names no stocks. Pick stocks, families or a flag.');
  }
  if ((rule.kind === 'excludes' || rule.kind === 'needs') && !known.has(rule.stockId)) {
    problems.add(path, 'The rule names a stock that is not in this order.');
  }
  if (rule.kind === 'excludes' || rule.kind === 'needs' || rule.kind === 'flag') return;
  const top = rule.kind === 'share' || rule.kind === 'one of' ? 1 : LARGEST;
  problems.number([...path, 'min'], rule.min, 'The least of the rule', 0, top);
  problems.number([...path, 'max'], rule.max, 'The most of the rule', 0, top);
  problems.range(path, rule.min, rule.max, 'The rule');
  if (rule.kind === 'ratio' && order.stocks.some((stock) => isInSet(stock, rule.set) && isInSet(stock, rule.to))) {
    problems.add(path, 'A ratio needs two sets with no stock in common.');
  }
}

function checkBatch(order: Order, problems: Problems): void {
  const { batchTonnes } = order;
  if (typeof batchTonnes === 'object') {
    for (const end of ['min', 'max'] as const) {
      const label = end === 'min' ? 'Smallest batch' : 'Largest batch';
      if (batchTonnes[end] === undefined) problems.add(['batchTonnes', end], `${label} is missing. Enter it.`);
      problems.number(['batchTonnes', end], batchTonnes[end], label, 1e-6);
    }
    problems.range(['batchTonnes'], batchTonnes.min, batchTonnes.max, 'Batch size');
  } else problems.number(['batchTonnes'], batchTonnes, 'Batch size', 1e-6);
  if (order.mostStocks !== undefined && !(Number.isInteger(order.mostStocks) && order.mostStocks >= 1)) {
    problems.add(['mostStocks'], 'The most stocks in the mix must be a whole number of at least 1.');
  }
  problems.number(['greatestDoseAsTheRest'], order.greatestDoseAsTheRest, 'Greatest dose "as the rest"', 0, 1);
}

/** Everything that makes the order no valid question; empty where it can be solved. Never throws. */
export function validateOrder(order: Order): OrderProblem[] {
  const shape = checkShape(order);
  if (shape.length > 0) return shape;
  const problems = new Problems();
  checkStocks(order, problems);
  order.limits.forEach((limit, place) => void checkLimit(limit, place, order, problems));
  order.doses?.forEach((dose, place) => void checkDose(dose, place, order, problems));
  order.shares?.forEach((rule, place) => void checkShare(rule, place, order, problems));
  checkBatch(order, problems);
  return problems.found;
}
