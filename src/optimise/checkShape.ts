import { OWN_RULES } from '../property/ownProperty';
import { VISCOSITY_RULES } from '../property/viscosityRule';
import { FAMILIES } from '../stock/family';
import { FIGURE_ORIGINS } from '../stock/figure';
import type { Order } from './order';
import type { OrderProblem } from './outcome';

/** Whether untrusted data has the shape of an order at all: lists where lists belong, known words where words are chosen. */

type Data = Record<string, unknown>;

const SHARE_KINDS = ['share', 'ratio', 'count', 'one of', 'excludes', 'needs', 'flag'];
const COST_BASES = ['tonne', 'cubic metre'];
const DOSE_UNITS = ['share', 'tonnes'];
const SHARE_BASES = ['mix', 'base oil'];

function isObject(value: unknown): value is Data {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

class Shape {
  readonly problems: OrderProblem[] = [];

  fail(path: (string | number)[], message: string): void {
    this.problems.push({ path, message });
  }

  /** A list of objects; complains and returns none where it is something else. */
  list(path: (string | number)[], value: unknown, required: boolean): Data[] {
    if (value === undefined && !required) return [];
    if (Array.isArray(value) && value.every(isObject)) return value;
    this.fail(path, `"${path.join('.')}" must be a list.`);
    return [];
  }

  word(path: (string | number)[], value: unknown, words: readonly string[], required = false): void {
    if (value === undefined && !required) return;
    if (typeof value === 'string' && words.includes(value)) return;
    this.fail(
      path,
      `"${path.join('.')}" is ${JSON.stringify(value) ?? 'missing'}; it must be one of: ${words.join(', ')}.`,
    );
  }

  text(path: (string | number)[], value: unknown): void {
    if (typeof value !== 'string' || value === '') this.fail(path, `"${path.join('.')}" must be a text.`);
  }
}

function checkStockShape(shape: Shape, stock: Data, place: number): void {
  const at = (key: string) => ['stocks', typeof stock.id === 'string' ? stock.id : place, key];
  shape.text(at('id'), stock.id);
  shape.text(at('name'), stock.name);
  shape.word(at('family'), stock.family, FAMILIES, true);
  const { flags } = stock;
  if (flags !== undefined && !(Array.isArray(flags) && flags.every((flag) => typeof flag === 'string'))) {
    shape.fail(at('flags'), '"flags" must be a list of texts.');
  }
  shape.list(at('priceSteps'), stock.priceSteps, false);
  shape.word(at('priceStepsFor'), stock.priceStepsFor, ['all tonnes', 'the excess']);
  for (const figure of shape.list(at('figures'), stock.figures, true)) {
    shape.text(at('figures'), figure.property);
    shape.word(at('figures'), figure.origin, FIGURE_ORIGINS, true);
  }
}

function checkOwnShape(shape: Shape, own: Data, place: number): void {
  const at = (key: string) => ['ownProperties', place, key];
  shape.text(at('id'), own.id);
  shape.text(at('label'), own.label);
  shape.word(at('rule'), own.rule, OWN_RULES, true);
  const digits = Number(own.digits);
  if (!(Number.isInteger(own.digits) && digits >= 0 && digits <= 9)) {
    shape.fail(at('digits'), 'The decimals of an own property must be a whole number from 0 to 9.');
  }
}

function checkSetShape(shape: Shape, path: (string | number)[], set: unknown): void {
  if (!isObject(set)) shape.fail(path, 'The rule names no stocks. Pick stocks, families or a flag.');
  else {
    for (const key of ['stockIds', 'families']) {
      if (set[key] !== undefined && !Array.isArray(set[key])) shape.fail([...path, key], `"${key}" must be a list.`);
    }
  }
}

function checkShareShape(shape: Shape, rule: Data, place: number): void {
  shape.word(['shares', place, 'kind'], rule.kind, SHARE_KINDS, true);
  shape.word(['shares', place, 'of'], rule.of, SHARE_BASES);
  if (rule.kind === 'flag') shape.text(['shares', place, 'flag'], rule.flag);
  else if (SHARE_KINDS.includes(String(rule.kind))) checkSetShape(shape, ['shares', place, 'set'], rule.set);
  if (rule.kind === 'ratio') checkSetShape(shape, ['shares', place, 'to'], rule.to);
}

/** What keeps data from being an order; empty where everything else may be checked. */
export function checkShape(order: Order): OrderProblem[] {
  const shape = new Shape();
  const data: unknown = order;
  if (!isObject(data)) return [{ path: [], message: 'The order is not an object.' }];
  shape.list(['stocks'], data.stocks, true).forEach((stock, place) => void checkStockShape(shape, stock, place));
  shape
    .list(['limits'], data.limits, true)
    .forEach((limit, place) => void shape.text(['limits', place, 'property'], limit.property));
  shape.list(['doses'], data.doses, false).forEach((dose, place) => {
    shape.text(['doses', place, 'stockId'], dose.stockId);
    shape.word(['doses', place, 'of'], dose.of, SHARE_BASES);
    shape.word(['doses', place, 'unit'], dose.unit, DOSE_UNITS);
  });
  shape.list(['shares'], data.shares, false).forEach((rule, place) => void checkShareShape(shape, rule, place));
  shape
    .list(['ownProperties'], data.ownProperties, false)
    .forEach((own, place) => void checkOwnShape(shape, own, place));
  shape.word(['viscosityRule'], data.viscosityRule, VISCOSITY_RULES);
  shape.word(['costBasis'], data.costBasis, COST_BASES);
  if (data.batchTonnes === null)
    shape.fail(['batchTonnes'], 'Batch size must be a number, or a smallest and a largest one.');
  return shape.problems;
}
