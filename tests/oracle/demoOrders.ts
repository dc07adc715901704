import type { Limit, Order, Stock } from '../../src/index';
import { BASE_OILS, DEMO_STOCKS } from './demoStocks';

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
