import type { Dose, Limit, ShareBasis, ShareRule, StockSet } from '../optimise/order';
import { VISCOSITY_RULES } from '../property/viscosityRule';
import { FAMILIES } from '../stock/family';
import {
  fail,
  flag,
  identity,
  listOf,
  number,
  object,
  oneOf,
  optional,
  type Place,
  type Reader,
  record,
  text,
} from './readers';
import type { WorkbookOrder } from './workbook';

const readBelow: Reader<number | true> = (value, place) => (value === true ? true : number(value, place));

const readLimit = record<Limit>({
  property: identity,
  celsius: optional(number),
  min: optional(number),
  max: optional(number),
  below: optional(readBelow),
  insideBy: optional(number),
  aim: optional(number),
  aimWeight: optional(number),
});

const readBasis = optional(oneOf<ShareBasis>('mix', 'base oil'));

const readDose = record<Dose>({
  stockId: identity,
  exactly: optional(number),
  min: optional(number),
  max: optional(number),
  required: optional(flag),
  of: readBasis,
  unit: optional(oneOf<NonNullable<Dose['unit']>>('share', 'tonnes')),
});

const readSet = record<StockSet>({
  stockIds: optional(listOf(identity)),
  families: optional(listOf(oneOf(...FAMILIES))),
  flag: optional(text),
});

type RuleOf<Kind extends ShareRule['kind']> = Extract<ShareRule, { kind: Kind }>;

const ends = { min: optional(number), max: optional(number) };

const RULES: { readonly [Kind in ShareRule['kind']]: Reader<RuleOf<Kind>> } = {
  share: record<RuleOf<'share'>>({ kind: oneOf('share'), set: readSet, ...ends, of: readBasis }),
  ratio: record<RuleOf<'ratio'>>({ kind: oneOf('ratio'), set: readSet, to: readSet, ...ends }),
  count: record<RuleOf<'count'>>({ kind: oneOf('count'), set: readSet, ...ends }),
  'one of': record<RuleOf<'one of'>>({ kind: oneOf('one of'), set: readSet, ...ends }),
  // A rule may be unfinished: no stock chosen yet, no set, no ends.
  excludes: record<RuleOf<'excludes'>>({ kind: oneOf('excludes'), stockId: text, set: readSet }),
  needs: record<RuleOf<'needs'>>({ kind: oneOf('needs'), stockId: text, set: readSet }),
  flag: record<RuleOf<'flag'>>({ kind: oneOf('flag'), flag: text }),
};

const RULE_KINDS = ['share', 'ratio', 'count', 'one of', 'excludes', 'needs', 'flag'] as const;

function readShare(value: unknown, place: Place): ShareRule {
  const kind = oneOf(...RULE_KINDS)(object(value, place).get('kind'), { ...place, path: `${place.path}.kind` });
  return RULES[kind](value, place);
}

const readBatchRange = record<{ min: number; max: number }>({ min: number, max: number });

const readBatch: Reader<NonNullable<WorkbookOrder['batchTonnes']>> = (value, place) => {
  if (typeof value === 'number') return number(value, place);
  if (typeof value === 'object') return readBatchRange(value, place);
  return fail(place, 'a number, or a range with min and max', value);
};

/** An order of the workbook from untrusted data. Shapes only: whether the order makes sense, the engine says. */
export const readOrder = record<WorkbookOrder>({
  id: identity,
  name: text,
  note: optional(text),
  solveOn: oneOf('products', 'lots'),
  excludedProductIds: listOf(identity),
  limits: listOf(readLimit),
  doses: listOf(readDose),
  shares: listOf(readShare),
  batchTonnes: optional(readBatch),
  mostStocks: optional(number),
  depressant: flag,
  viscosityRule: oneOf(...VISCOSITY_RULES),
  costBasis: oneOf('tonne', 'cubic metre'),
  greatestDoseAsTheRest: optional(number),
  laboratoryOnly: listOf(text),
});
