import { OWN_RULES, type OwnProperty } from '../property/ownProperty';
import { propertyDefinition } from '../property/propertyTable';
import { flag, identity, listOf, number, oneOf, type Place, ReadFailure, record, text } from './readers';
import { readOrder } from './readOrder';
import { readProduct } from './readProduct';
import { WORKBOOK_FORMAT, WORKBOOK_VERSION, type Workbook, type WorkbookSettings } from './workbook';

const readOwnProperty = record<OwnProperty>({
  id: identity,
  label: text,
  unit: text,
  rule: oneOf(...OWN_RULES),
  digits: number,
});

const readShape = record<Workbook>({
  format: oneOf(WORKBOOK_FORMAT),
  version: oneOf(WORKBOOK_VERSION),
  id: identity,
  name: text,
  invented: flag,
  products: listOf(readProduct),
  orders: listOf(readOrder),
  ownProperties: listOf(readOwnProperty),
  settings: record<WorkbookSettings>({ currency: text }),
});

function refuseDuplicates(what: string, ids: readonly string[]): void {
  const seen = new Set<string>();
  for (const id of ids) {
    if (seen.has(id)) throw new ReadFailure(`Two ${what} have the id ${JSON.stringify(id)}; each needs its own.`);
    seen.add(id);
  }
}

/** Lots stand beside products as stocks of the engine, so their ids are unique over the whole workbook. */
function refuseClashes({ products, orders, ownProperties }: Workbook): void {
  refuseDuplicates(
    'products',
    products.map(({ id }) => id),
  );
  refuseDuplicates(
    'lots',
    products.flatMap(({ lots }) => lots.map(({ id }) => id)),
  );
  refuseDuplicates(
    'orders',
    orders.map(({ id }) => id),
  );
  refuseDuplicates(
    'own properties',
    ownProperties.map(({ id }) => id),
  );
  for (const [at, { id, digits }] of ownProperties.entries()) {
    if (propertyDefinition(id))
      throw new ReadFailure(`ownProperties[${at}].id ${JSON.stringify(id)} is a built-in property.`);
    if (!Number.isInteger(digits) || digits < 0 || digits > 10) {
      throw new ReadFailure(`ownProperties[${at}].digits must be a whole number from 0 to 10; it is ${digits}.`);
    }
  }
}

/** A workbook of the current version from untrusted data. Throws `ReadFailure`. */
export function readWorkbook(value: unknown, notes: string[]): Workbook {
  const place: Place = { path: '', notes };
  const workbook = readShape(value, place);
  refuseClashes(workbook);
  return workbook;
}
