import type { Family, Figure, Limit, Order, Stock } from '../../src/index';

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

const SHEETS: Sheet[] = [
  {
    id: 'SN 150',
    family: 'Group I',
    price: 880,
    density: 868,
    kv40: 30.4,
    kv100: 5.15,
    noack: 17,
    pour: -12,
    depressed: -30,
    flash: 218,
    sulphur: 3800,
  },
  {
    id: 'SN 500',
    family: 'Group I',
    price: 905,
    density: 882,
    kv40: 96,
    kv100: 10.8,
    noack: 5.5,
    pour: -9,
    depressed: -24,
    flash: 248,
    sulphur: 5200,
  },
  {
    id: 'bright stock',
    family: 'Group I',
    price: 1240,
    density: 901,
    kv40: 478,
    kv100: 31.8,
    noack: 0.8,
    pour: -9,
    depressed: -18,
    flash: 298,
    sulphur: 7000,
  },
  {
    id: 'Group II 150',
    family: 'Group II',
    price: 940,
    density: 860,
    kv40: 30.2,
    kv100: 5.25,
    noack: 14.5,
    pour: -15,
    depressed: -33,
    flash: 222,
    sulphur: 10,
  },
  {
    id: 'Group II 500',
    family: 'Group II',
    price: 985,
    density: 870,
    kv40: 95.5,
    kv100: 11.0,
    noack: 4,
    pour: -15,
    depressed: -30,
    flash: 256,
    sulphur: 15,
  },
  {
    id: 'Group III 4',
    family: 'Group III',
    price: 1160,
    density: 834,
    kv40: 19.3,
    kv100: 4.22,
    noack: 14.2,
    pour: -18,
    depressed: -39,
    flash: 222,
    sulphur: 5,
  },
  {
    id: 'Group III 6',
    family: 'Group III',
    price: 1190,
    density: 843,
    kv40: 36.5,
    kv100: 6.5,
    noack: 7.2,
    pour: -15,
    depressed: -36,
    flash: 240,
    sulphur: 5,
  },
  {
    id: 'PAO 4',
    family: 'PAO',
    price: 2180,
    density: 820,
    kv40: 17.4,
    kv100: 3.95,
    noack: 13,
    pour: -66,
    flash: 220,
    sulphur: 0,
  },
  {
    id: 'PAO 6',
    family: 'PAO',
    price: 2240,
    density: 827,
    kv40: 30.9,
    kv100: 5.88,
    noack: 6.6,
    pour: -57,
    flash: 246,
    sulphur: 0,
  },
  {
    id: 'PAO 40',
    family: 'PAO',
    price: 3350,
    density: 850,
    kv40: 398,
    kv100: 39.6,
    noack: 1.2,
    pour: -36,
    flash: 280,
    sulphur: 0,
  },
  {
    id: 'mPAO 100',
    family: 'mPAO',
    price: 4150,
    density: 855,
    kv40: 1150,
    kv100: 103,
    noack: 0.6,
    pour: -36,
    flash: 284,
    sulphur: 0,
  },
  {
    id: 'polyol ester',
    family: 'ester',
    price: 2980,
    density: 946,
    kv40: 19.8,
    kv100: 4.38,
    noack: 3.2,
    pour: -51,
    flash: 250,
    sulphur: 0,
  },
  {
    id: 'concentrate',
    family: 'thickener',
    price: 2100,
    density: 868,
    kv40: 9500,
    kv100: 820,
    noack: 'rest',
    pour: 'rest',
    flash: 'rest',
    sulphur: 0,
  },
  {
    id: 'hydraulic package',
    family: 'package',
    price: 3400,
    density: 960,
    kv40: 85,
    kv100: 9,
    noack: 'rest',
    pour: 'rest',
    flash: 'rest',
  },
  {
    id: 'gear package',
    family: 'package',
    price: 3900,
    density: 1010,
    kv40: 62,
    kv100: 8,
    noack: 'rest',
    pour: 'rest',
    flash: 'rest',
  },
  {
    id: 'depressant',
    family: 'depressant',
    price: 2600,
    density: 900,
    kv40: 350,
    kv100: 40,
    noack: 'rest',
    pour: 'rest',
    flash: 'rest',
    sulphur: 0,
  },
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

/** A demo order with the least cost its scenario quotes, found by an earlier slice search (whole currency units). */
export interface DemoOrder {
  name: string;
  quoted?: number;
  order: Order;
}

const stocks = (...ids: string[]): Stock[] => DEMO_STOCKS.filter((stock) => ids.includes(stock.id));
const kv = (celsius: number, min: number, max: number): Limit => ({ property: 'kv', celsius, min, max });
const vi = (min: number): Limit => ({ property: 'vi', min });
const noack = (max: number): Limit => ({ property: 'noack', max });
const pour = (max: number): Limit => ({ property: 'pourPoint', max });

function hydraulic(least: number): Order {
  return {
    stocks: [...BASE_OILS, ...stocks('hydraulic package', 'depressant')],
    limits: [kv(40, 44.6, 47.4), vi(least), pour(-24)],
    doses: [
      { stockId: 'hydraulic package', exactly: 0.0085 },
      { stockId: 'depressant', exactly: 0.002 },
    ],
    depressant: true,
  };
}

function driveline(coldest: number, depressant: boolean): Order {
  return { stocks: BASE_OILS, limits: [kv(100, 5.8, 6.2), vi(130), noack(8), pour(coldest)], depressant };
}

function impossible(volatility: number): Order {
  return {
    stocks: BASE_OILS,
    limits: [kv(100, 3.9, 4.3), vi(120), noack(volatility), pour(-45)],
    shares: [{ kind: 'share', set: { families: ['ester'] }, max: 0.15 }],
  };
}

function mineralGear(mostBright: number): Order {
  return {
    stocks: [...BASE_OILS, ...stocks('gear package', 'depressant')],
    limits: [kv(40, 209, 231), vi(90)],
    doses: [
      { stockId: 'bright stock', max: mostBright },
      { stockId: 'gear package', exactly: 0.018 },
      { stockId: 'depressant', exactly: 0.002 },
    ],
  };
}

export const DEMO_ORDERS: DemoOrder[] = [
  { name: 'VG 46', quoted: 913, order: hydraulic(95) },
  { name: 'VG 46, VI 105', quoted: 968, order: hydraulic(105) },
  { name: 'driveline -36', quoted: 1182, order: driveline(-36, true) },
  { name: 'driveline -39', quoted: 1374, order: driveline(-39, true) },
  { name: 'driveline -42', quoted: 1562, order: driveline(-42, true) },
  { name: 'driveline -45', quoted: 1734, order: driveline(-45, true) },
  { name: 'driveline -30 neat', quoted: 1724, order: driveline(-30, false) },
  {
    name: 'multigrade base',
    quoted: 1461,
    order: {
      stocks: [...BASE_OILS.filter((stock) => stock.family !== 'Group I'), ...stocks('concentrate', 'depressant')],
      limits: [kv(100, 10.2, 11.8), vi(155), noack(13)],
      doses: [
        { stockId: 'concentrate', max: 0.12 },
        { stockId: 'depressant', exactly: 0.002 },
      ],
      greatestDoseAsTheRest: 0.12,
    },
  },
  {
    name: 'VG 320 synthetic',
    quoted: 3378,
    order: {
      stocks: stocks('PAO 4', 'PAO 6', 'PAO 40', 'mPAO 100', 'polyol ester', 'gear package'),
      limits: [kv(40, 304, 336), vi(150), pour(-36)],
      doses: [{ stockId: 'gear package', exactly: 0.018 }],
      shares: [{ kind: 'share', set: { families: ['ester'] }, min: 0.08, max: 0.15 }],
    },
  },
  { name: 'impossible at 10', order: impossible(10) },
  { name: 'impossible at 11', quoted: 2116, order: impossible(11) },
  { name: 'impossible at 12', quoted: 2009, order: impossible(12) },
  { name: 'VG 220 mineral', quoted: 1132, order: mineralGear(1) },
  {
    name: 'VG 220, bright stock short',
    quoted: 1417,
    order: mineralGear(0.3),
  },
];
