import fc from 'fast-check';
import {
  FAMILIES,
  FIGURE_ORIGINS,
  type Figure,
  type Lot,
  OWN_RULES,
  type Product,
  type ShareRule,
  type StockSet,
  VISCOSITY_RULES,
  WORKBOOK_FORMAT,
  WORKBOOK_VERSION,
  type Workbook,
  type WorkbookOrder,
} from '../../src';

/** JSON has no negative zero, so none is asked to survive. */
const number = fc.double({ noNaN: true, noDefaultInfinity: true }).map((value) => (value === 0 ? 0 : value));
const text = fc.string({ unit: 'binary', maxLength: 12 });
const id = fc.uuid();
const HARMFUL = ['__proto__', 'constructor', 'prototype'];

/** A record in which some of the fields are always there and the others sometimes. */
function partly<T extends object>(
  fields: { [K in keyof T]-?: fc.Arbitrary<Exclude<T[K], undefined>> },
  ...required: (keyof T)[]
) {
  return fc.record(fields, { requiredKeys: required }) as fc.Arbitrary<T>;
}

const figure = partly<Figure>(
  {
    property: fc.constantFrom('kv', 'density', 'noack', 'own'),
    celsius: number,
    value: number,
    origin: fc.constantFrom(...FIGURE_ORIGINS),
    standardDeviation: number,
    method: text,
    date: text,
  },
  'property',
  'origin',
);

const figures = fc.array(figure, { maxLength: 4 });

const lot = partly<Lot>(
  { id, name: text, tank: text, certificateDate: text, availableTonnes: number, pricePerTonne: number, figures },
  'id',
  'name',
  'figures',
);

const unread = fc.dictionary(
  text.filter((key) => !HARMFUL.includes(key)),
  text,
  { noNullPrototype: true },
);

const product = partly<Product>(
  {
    id,
    name: text,
    supplier: text,
    family: fc.constantFrom(...FAMILIES),
    pricePerTonne: number,
    figures,
    blendWeight: number,
    leastDoseIfUsed: number,
    greatestDose: number,
    lotTonnes: number,
    flushCost: number,
    priceSteps: fc.array(fc.record({ fromTonnes: number, pricePerTonne: number }), { maxLength: 3 }),
    priceStepsFor: fc.constantFrom('all tonnes', 'the excess'),
    flags: fc.array(text, { maxLength: 3 }),
    lots: fc.uniqueArray(lot, { maxLength: 3, selector: (entry) => entry.id }),
    note: text,
    unread,
  },
  'id',
  'name',
  'family',
  'figures',
  'lots',
);

const set = partly<StockSet>({
  stockIds: fc.array(id, { maxLength: 3 }),
  families: fc.array(fc.constantFrom(...FAMILIES), { maxLength: 3 }),
  flag: text,
});

const basis = fc.constantFrom('mix' as const, 'base oil' as const);

const share: fc.Arbitrary<ShareRule> = fc.oneof(
  partly<Extract<ShareRule, { kind: 'share' }>>(
    { kind: fc.constant('share'), set, min: number, max: number, of: basis },
    'kind',
    'set',
  ),
  partly<Extract<ShareRule, { kind: 'ratio' }>>(
    { kind: fc.constant('ratio'), set, to: set, min: number, max: number },
    'kind',
    'set',
    'to',
  ),
  partly<Extract<ShareRule, { kind: 'count' }>>(
    { kind: fc.constant('count'), set, min: number, max: number },
    'kind',
    'set',
  ),
  partly<Extract<ShareRule, { kind: 'one of' }>>(
    { kind: fc.constant('one of'), set, min: number, max: number },
    'kind',
    'set',
  ),
  partly<Extract<ShareRule, { kind: 'excludes' }>>(
    { kind: fc.constant('excludes'), stockId: id, set },
    'kind',
    'stockId',
    'set',
  ),
  partly<Extract<ShareRule, { kind: 'needs' }>>(
    { kind: fc.constant('needs'), stockId: id, set },
    'kind',
    'stockId',
    'set',
  ),
  partly<Extract<ShareRule, { kind: 'flag' }>>({ kind: fc.constant('flag'), flag: text }, 'kind', 'flag'),
);

const limit = partly<WorkbookOrder['limits'][number]>(
  {
    property: fc.constantFrom('kv', 'vi', 'noack'),
    celsius: number,
    min: number,
    max: number,
    below: fc.oneof(number, fc.constant(true as const)),
    insideBy: number,
    aim: number,
    aimWeight: number,
  },
  'property',
);

const dose = partly<WorkbookOrder['doses'][number]>(
  {
    stockId: id,
    exactly: number,
    min: number,
    max: number,
    required: fc.boolean(),
    of: basis,
    unit: fc.constantFrom('share', 'tonnes'),
  },
  'stockId',
);

const order = partly<WorkbookOrder>(
  {
    id,
    name: text,
    note: text,
    solveOn: fc.constantFrom('products', 'lots'),
    excludedProductIds: fc.array(id, { maxLength: 3 }),
    limits: fc.array(limit, { maxLength: 4 }),
    doses: fc.array(dose, { maxLength: 3 }),
    shares: fc.array(share, { maxLength: 4 }),
    batchTonnes: fc.oneof(number, fc.record({ min: number, max: number })),
    mostStocks: number,
    depressant: fc.boolean(),
    viscosityRule: fc.constantFrom(...VISCOSITY_RULES),
    costBasis: fc.constantFrom('tonne', 'cubic metre'),
    greatestDoseAsTheRest: number,
    laboratoryOnly: fc.array(text, { maxLength: 3 }),
  },
  'id',
  'name',
  'solveOn',
  'excludedProductIds',
  'limits',
  'doses',
  'shares',
  'depressant',
  'viscosityRule',
  'costBasis',
  'laboratoryOnly',
);

/** Any workbook that the app could hold: whether its orders make sense does not matter here. */
export const anyWorkbook: fc.Arbitrary<Workbook> = fc.record(
  {
    format: fc.constant(WORKBOOK_FORMAT),
    version: fc.constant(WORKBOOK_VERSION),
    id,
    name: text,
    invented: fc.boolean(),
    products: fc.uniqueArray(product, { maxLength: 4, selector: (entry) => entry.id }),
    orders: fc.uniqueArray(order, { maxLength: 3, selector: (entry) => entry.id }),
    ownProperties: fc.uniqueArray(
      fc.record({ id, label: text, unit: text, rule: fc.constantFrom(...OWN_RULES), digits: fc.nat(10) }),
      { maxLength: 2, selector: (entry) => entry.id },
    ),
    settings: fc.record({ currency: text }),
  },
  { noNullPrototype: true },
);
