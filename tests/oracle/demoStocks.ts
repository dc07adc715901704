import type { Family, Figure, Stock } from '../../src/index';

/** The invented demo scenario, for the checks. All figures are invented; a dash is an unknown. */
interface Sheet {
  id: string;
  family: Family;
  price: number;
  density: number;
  kv40: number;
  kv100: number;
  noack?: number | 'rest';
  pour?: number | 'rest';
  depressed?: number;
  flash?: number | 'rest';
  sulphur?: number;
}

// biome-ignore format: a table reads better in columns
const SHEETS: Sheet[] = [
  { id: 'SN 150', family: 'Group I', price: 880, density: 868, kv40: 30.4, kv100: 5.15, noack: 17, pour: -12, depressed: -30, flash: 218, sulphur: 3800 },
  { id: 'SN 500', family: 'Group I', price: 905, density: 882, kv40: 96, kv100: 10.8, noack: 5.5, pour: -9, depressed: -24, flash: 248, sulphur: 5200 },
  { id: 'bright stock', family: 'Group I', price: 1240, density: 901, kv40: 478, kv100: 31.8, noack: 0.8, pour: -9, depressed: -18, flash: 298, sulphur: 7000 },
  { id: 'Group II 150', family: 'Group II', price: 940, density: 860, kv40: 30.2, kv100: 5.25, noack: 14.5, pour: -15, depressed: -33, flash: 222, sulphur: 10 },
  { id: 'Group II 500', family: 'Group II', price: 985, density: 870, kv40: 95.5, kv100: 11.0, noack: 4, pour: -15, depressed: -30, flash: 256, sulphur: 15 },
  { id: 'Group III 4', family: 'Group III', price: 1160, density: 834, kv40: 19.3, kv100: 4.22, noack: 14.2, pour: -18, depressed: -39, flash: 222, sulphur: 5 },
  { id: 'Group III 6', family: 'Group III', price: 1190, density: 843, kv40: 36.5, kv100: 6.5, noack: 7.2, pour: -15, depressed: -36, flash: 240, sulphur: 5 },
  { id: 'PAO 4', family: 'PAO', price: 2180, density: 820, kv40: 17.4, kv100: 3.95, noack: 13, pour: -66, flash: 220, sulphur: 0 },
  { id: 'PAO 6', family: 'PAO', price: 2240, density: 827, kv40: 30.9, kv100: 5.88, noack: 6.6, pour: -57, flash: 246, sulphur: 0 },
  { id: 'PAO 40', family: 'PAO', price: 3350, density: 850, kv40: 398, kv100: 39.6, noack: 1.2, pour: -36, flash: 280, sulphur: 0 },
  { id: 'mPAO 100', family: 'mPAO', price: 4150, density: 855, kv40: 1150, kv100: 103, noack: 0.6, pour: -36, flash: 284, sulphur: 0 },
  { id: 'polyol ester', family: 'ester', price: 2980, density: 946, kv40: 19.8, kv100: 4.38, noack: 3.2, pour: -51, flash: 250, sulphur: 0 },
  { id: 'concentrate', family: 'thickener', price: 2100, density: 868, kv40: 9500, kv100: 820, noack: 'rest', pour: 'rest', flash: 'rest', sulphur: 0 },
  { id: 'hydraulic package', family: 'package', price: 3400, density: 960, kv40: 85, kv100: 9, noack: 'rest', pour: 'rest', flash: 'rest' },
  { id: 'gear package', family: 'package', price: 3900, density: 1010, kv40: 62, kv100: 8, noack: 'rest', pour: 'rest', flash: 'rest' },
  { id: 'depressant', family: 'depressant', price: 2600, density: 900, kv40: 350, kv100: 40, noack: 'rest', pour: 'rest', flash: 'rest', sulphur: 0 },
];

function stockOf(sheet: Sheet): Stock {
  const figures: Figure[] = [
    { property: 'density', celsius: 15, value: sheet.density, origin: 'measured' },
    { property: 'kv', celsius: 40, value: sheet.kv40, origin: 'measured' },
    { property: 'kv', celsius: 100, value: sheet.kv100, origin: 'measured' },
  ];
  const add = (property: string, value: number | 'rest' | undefined) => {
    if (value === 'rest') figures.push({ property, origin: 'as the rest' });
    else if (value !== undefined) figures.push({ property, value, origin: 'measured' });
  };
  add('noack', sheet.noack);
  add('pourPoint', sheet.pour);
  add('pourPointDepressed', sheet.depressed);
  add('flashPoint', sheet.flash);
  add('sulphur', sheet.sulphur);
  return { id: sheet.id, name: sheet.id, family: sheet.family, pricePerTonne: sheet.price, figures };
}

export const DEMO_STOCKS: Stock[] = SHEETS.map(stockOf);
export const BASE_OILS: Stock[] = DEMO_STOCKS.slice(0, 12);
