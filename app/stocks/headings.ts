import { parseNumber } from '../parts/numberText';
import type { Column } from './column';

/** What people write above a column, in lower case and without units: ids of columns of the stocks table. */
const NAMES: readonly [columnId: string, names: readonly string[]][] = [
  ['name', ['name', 'stock', 'product', 'base oil', 'base stock', 'material', 'component', 'grade']],
  ['supplier', ['supplier', 'vendor', 'manufacturer', 'producer', 'source']],
  ['family', ['family', 'group', 'api group', 'type', 'kind', 'class']],
  ['pricePerTonne', ['price', 'price per tonne', 'cost', 'cost per tonne', 'price t', 'price/t']],
  ['density@15', ['density', 'density 15', 'density15', 'd15', 'density at 15', 'rho', 'density at 15 c']],
  [
    'kv@40',
    ['kv40', 'kv 40', 'v40', 'viscosity 40', 'kv at 40', 'viscosity at 40', 'visc 40', 'kinematic viscosity at 40'],
  ],
  [
    'kv@100',
    [
      'kv100',
      'kv 100',
      'v100',
      'viscosity 100',
      'kv at 100',
      'viscosity at 100',
      'visc 100',
      'kinematic viscosity at 100',
    ],
  ],
  ['vi', ['vi', 'viscosity index']],
  ['noack', ['noack', 'noack volatility', 'volatility', 'evaporation loss', 'noack loss']],
  ['pourPoint', ['pour', 'pour point', 'pp', 'pour neat', 'pour point neat']],
  [
    'pourPointDepressed',
    ['pour with depressant', 'pour point with depressant', 'pour depr', 'pour depressed', 'depressed pour point'],
  ],
  ['flashPoint', ['flash', 'flash point', 'fp', 'flash coc', 'flash point coc', 'coc', 'flash point open cup']],
  ['sulphur', ['sulphur', 'sulfur', 's']],
  ['availableTonnes', ['on hand', 'quantity', 'stock t', 'tonnes', 'available', 'quantity on hand']],
  ['leastDoseIfUsed', ['least if used', 'least dose', 'min dose', 'minimum dose', 'least dose if used']],
  ['greatestDose', ['greatest', 'greatest dose', 'max dose', 'maximum dose']],
  ['flags', ['flags', 'tags']],
];

/** "KV @ 40 °C [mm²/s]" → "kv at 40": units, brackets and signs do not count. */
function plainHeading(text: string): string {
  return text
    .toLowerCase()
    .replace(/[([{].*?[)\]}]/g, ' ')
    .replace(/@/g, ' at ')
    .replace(/°\s*c?\b|(?<=\d)\s*c\b/g, ' ')
    .replace(
      /mm²?\/?s|mm2\/s|\bcst\b|kg\/m³?3?|mg\/kg|\bppm\b|%( ?m\/m)?|(€|\$|£|\beur\b|\busd\b|\bgbp\b)(\/ ?t\b)?/g,
      ' ',
    )
    .replace(/[.,:;_/-]/g, ' ')
    .replace(/\s+/g, ' ')
    .trim();
}

/** The column a heading means, or undefined. */
export function columnOfHeading(heading: string, columns: readonly Column[]): Column | undefined {
  const plain = plainHeading(heading);
  if (plain === '') return undefined;
  const known = NAMES.find(([, names]) => names.includes(plain))?.[0];
  return columns.find(
    ({ id, label, kind }) => kind !== 'use' && kind !== 'share' && (id === known || plainHeading(label) === plain),
  );
}

/** A first row that reads like headings: no numbers in it, and at least two (or all) of its cells are known columns. */
export function isHeadingRow(row: readonly string[], columns: readonly Column[]): boolean {
  const cells = row.filter((cell) => cell !== '');
  if (cells.length === 0 || cells.some((cell) => 'value' in parseNumber(cell))) return false;
  const known = cells.filter((cell) => columnOfHeading(cell, columns)).length;
  return known >= 2 || known === cells.length;
}
