/** What people write above a column, in lower case and without units: ids of columns of the stocks table. */
export const HEADING_NAMES: readonly [columnId: string, names: readonly string[]][] = [
  ['name', ['name', 'stock', 'product', 'base oil', 'base stock', 'material', 'component', 'grade']],
  ['supplier', ['supplier', 'vendor', 'manufacturer', 'producer', 'source']],
  ['family', ['family', 'group', 'api group', 'type', 'kind', 'class']],
  ['pricePerTonne', ['price', 'cost', 'unit price', 'unit cost']],
  ['density@15', ['density', 'density 15', 'density15', 'd15', 'rho']],
  ['kv@40', ['kv40', 'kv 40', 'v40', 'viscosity 40', 'visc 40', 'kinematic viscosity 40']],
  ['kv@100', ['kv100', 'kv 100', 'v100', 'viscosity 100', 'visc 100', 'kinematic viscosity 100']],
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
