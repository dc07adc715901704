import type { Family, Figure, Lot, Product } from '../../src';

/**
 * Invented stocks of an invented plant: plausible figures, nobody's. Suppliers, tanks and lots are made up too.
 *
 * Columns: price [€/t], density at 15 °C [kg/m³], KV40 and KV100 [mm²/s], Noack [% m/m], pour point neat and with
 * depressant [°C], flash point [°C], sulphur [mg/kg]. 'rest' stands for "takes the value of the rest of the mix":
 * nobody measures the volatility or the pour point of a package, and at these doses it hardly matters.
 */
type Cell = number | 'rest' | undefined;
type Row = [
  price: number,
  density: number,
  kv40: number,
  kv100: number,
  noack: Cell,
  pour: Cell,
  depressed: Cell,
  flash: Cell,
  sulphur: number,
];

interface Described {
  id: string;
  name: string;
  family: Family;
  supplier: string;
  row: Row;
  lot: { name: string; tank: string; tonnes: number; date: string; drift: number };
  flags?: string[];
  note?: string;
  /** What one drum holds [t], what opening it costs a batch [€], and the least share it is worth opening for. */
  drums?: { tonnes: number; flush: number; leastDose: number };
}

const DATA_SHEET = '2026-01-05';
const SYNTHETIC = ['synthetic'];

function figure(property: string, cell: Cell, origin: Figure['origin'], celsius?: number): Figure[] {
  if (cell === undefined) return [];
  const at = celsius === undefined ? {} : { celsius };
  if (cell === 'rest') return [{ property, ...at, origin: 'as the rest' }];
  return [{ property, ...at, value: cell, origin, date: DATA_SHEET }];
}

/** Packages and thickeners carry values worked back from a trial mix; base oils the typical ones of a data sheet. */
function figuresOf(family: Family, row: Row): Figure[] {
  const [, density, kv40, kv100, noack, pour, depressed, flash, sulphur] = row;
  const additive = family === 'thickener' || family === 'package' || family === 'depressant';
  const origin = additive ? 'in-blend' : 'typical';
  return [
    ...figure('kv', kv40, origin, 40),
    ...figure('kv', kv100, origin, 100),
    ...figure('density', density, 'typical', 15),
    ...figure('noack', noack, origin),
    ...figure('pourPoint', pour, origin),
    ...figure('pourPointDepressed', depressed, origin),
    ...figure('flashPoint', flash, origin),
    ...figure('sulphur', sulphur, origin),
  ];
}

/** The lot's certificate: viscosities a little off the typical ones, as deliveries are. */
function lotOf({ id, family, row, lot }: Described): Lot {
  const additive = family === 'thickener' || family === 'package' || family === 'depressant';
  const certified = (value: number) => Number((value * (1 + lot.drift)).toPrecision(4));
  const measured = (celsius: number, value: number): Figure => ({
    property: 'kv',
    celsius,
    value: certified(value),
    origin: 'measured',
    date: lot.date,
  });
  return {
    id: `${id}-lot`,
    name: lot.name,
    tank: lot.tank,
    certificateDate: lot.date,
    availableTonnes: lot.tonnes,
    // A neat package's certificate says nothing of its in-blend viscosity.
    figures: additive ? [] : [measured(40, row[2]), measured(100, row[3])],
  };
}

const DESCRIBED: Described[] = [
  {
    id: 'sn-150',
    name: 'SN 150',
    family: 'Group I',
    supplier: 'Ostermarsk Base Oils',
    row: [880, 868, 30.4, 5.15, 17, -12, -30, 218, 3800],
    lot: { name: 'OM-4417', tank: 'T-01', tonnes: 64, date: '2026-02-11', drift: 0.012 },
  },
  {
    id: 'sn-500',
    name: 'SN 500',
    family: 'Group I',
    supplier: 'Ostermarsk Base Oils',
    row: [905, 882, 96, 10.8, 5.5, -9, -24, 248, 5200],
    lot: { name: 'OM-4402', tank: 'T-02', tonnes: 58, date: '2026-02-04', drift: -0.008 },
  },
  {
    id: 'bright-stock',
    name: 'Bright stock',
    family: 'Group I',
    supplier: 'Ostermarsk Base Oils',
    row: [1240, 901, 478, 31.8, 0.8, -9, -18, 298, 7000],
    lot: { name: 'OM-4388', tank: 'T-03', tonnes: 21, date: '2026-01-22', drift: 0.015 },
  },
  {
    id: 'group-ii-150',
    name: 'Group II 150',
    family: 'Group II',
    supplier: 'Vennhaarst Hydroprocessing',
    row: [940, 860, 30.2, 5.25, 14.5, -15, -33, 222, 10],
    lot: { name: 'VH-0931', tank: 'T-04', tonnes: 47, date: '2026-02-09', drift: 0.006 },
  },
  {
    id: 'group-ii-500',
    name: 'Group II 500',
    family: 'Group II',
    supplier: 'Vennhaarst Hydroprocessing',
    row: [985, 870, 95.5, 11, 4, -15, -30, 256, 15],
    lot: { name: 'VH-0927', tank: 'T-05', tonnes: 39, date: '2026-02-06', drift: -0.011 },
  },
  {
    id: 'group-iii-4',
    name: 'Group III 4',
    family: 'Group III',
    supplier: 'Vennhaarst Hydroprocessing',
    row: [1160, 834, 19.3, 4.22, 14.2, -18, -39, 222, 5],
    lot: { name: 'VH-1104', tank: 'T-06', tonnes: 52, date: '2026-02-13', drift: 0.009 },
  },
  {
    id: 'group-iii-6',
    name: 'Group III 6',
    family: 'Group III',
    supplier: 'Vennhaarst Hydroprocessing',
    row: [1190, 843, 36.5, 6.5, 7.2, -15, -36, 240, 5],
    lot: { name: 'VH-1098', tank: 'T-07', tonnes: 44, date: '2026-02-12', drift: -0.007 },
  },
  {
    id: 'pao-4',
    name: 'PAO 4',
    family: 'PAO',
    supplier: 'Tarnvarre Synthetics',
    row: [2180, 820, 17.4, 3.95, 13, -66, undefined, 220, 0],
    lot: { name: 'TV-207', tank: 'T-11', tonnes: 18, date: '2026-01-30', drift: 0.004 },
    flags: SYNTHETIC,
  },
  {
    id: 'pao-6',
    name: 'PAO 6',
    family: 'PAO',
    supplier: 'Tarnvarre Synthetics',
    row: [2240, 827, 30.9, 5.88, 6.6, -57, undefined, 246, 0],
    lot: { name: 'TV-211', tank: 'T-12', tonnes: 16, date: '2026-01-30', drift: -0.005 },
    flags: SYNTHETIC,
  },
  {
    id: 'pao-40',
    name: 'PAO 40',
    family: 'PAO',
    supplier: 'Tarnvarre Synthetics',
    row: [3350, 850, 398, 39.6, 1.2, -36, undefined, 280, 0],
    lot: { name: 'TV-198', tank: 'T-13', tonnes: 12, date: '2026-01-16', drift: 0.01 },
    flags: SYNTHETIC,
  },
  {
    id: 'mpao-100',
    name: 'mPAO 100',
    family: 'mPAO',
    supplier: 'Tarnvarre Synthetics',
    row: [4150, 855, 1150, 103, 0.6, -36, undefined, 284, 0],
    lot: { name: 'TV-M31', tank: 'Totes, bay 2', tonnes: 6, date: '2026-01-16', drift: -0.012 },
    flags: SYNTHETIC,
  },
  {
    id: 'polyol-ester',
    name: 'Polyol ester',
    family: 'ester',
    supplier: 'Lindemoor Esters',
    row: [2980, 946, 19.8, 4.38, 3.2, -51, undefined, 250, 0],
    lot: { name: 'LM-88', tank: 'Totes, bay 3', tonnes: 8, date: '2026-01-27', drift: 0.007 },
    flags: SYNTHETIC,
  },
  {
    id: 'pao-6-drums',
    name: 'PAO 6, drums',
    family: 'PAO',
    supplier: 'Tarnvarre Synthetics',
    row: [2390, 827, 30.9, 5.88, 6.6, -57, undefined, 246, 0],
    lot: { name: 'TV-D18', tank: 'Drums, bay 1', tonnes: 2, date: '2026-02-03', drift: 0 },
    flags: SYNTHETIC,
    drums: { tonnes: 0.165, flush: 60, leastDose: 0.05 },
  },
  {
    id: 'polyol-ester-drums',
    name: 'Polyol ester, drums',
    family: 'ester',
    supplier: 'Lindemoor Esters',
    row: [3120, 946, 19.8, 4.38, 3.2, -51, undefined, 250, 0],
    lot: { name: 'LM-D07', tank: 'Drums, bay 1', tonnes: 1.2, date: '2026-02-03', drift: 0 },
    flags: SYNTHETIC,
    drums: { tonnes: 0.19, flush: 90, leastDose: 0.03 },
  },
  {
    id: 'ocp-concentrate',
    name: 'Olefin copolymer concentrate',
    family: 'thickener',
    supplier: 'Brakkvater Additives',
    row: [2100, 868, 9500, 820, 'rest', 'rest', undefined, 'rest', 0],
    lot: { name: 'BV-C12', tank: 'Heated totes, bay 5', tonnes: 9, date: '2026-02-02', drift: 0 },
    note: 'Blending viscosities, worked back from a trial mix; the neat concentrate is thicker.',
  },
  {
    id: 'hydraulic-package',
    name: 'Hydraulic package',
    family: 'package',
    supplier: 'Brakkvater Additives',
    row: [3400, 960, 85, 9, 'rest', 'rest', undefined, 'rest', 21_000],
    lot: { name: 'BV-H40', tank: 'Drums, bay 6', tonnes: 4, date: '2026-02-02', drift: 0 },
    flags: SYNTHETIC,
  },
  {
    id: 'gear-package',
    name: 'Gear package',
    family: 'package',
    supplier: 'Brakkvater Additives',
    row: [3900, 1010, 62, 8, 'rest', 'rest', undefined, 'rest', 160_000],
    lot: { name: 'BV-G17', tank: 'Drums, bay 6', tonnes: 3, date: '2026-02-02', drift: 0 },
    flags: SYNTHETIC,
  },
  {
    id: 'depressant',
    name: 'Pour-point depressant',
    family: 'depressant',
    supplier: 'Brakkvater Additives',
    row: [2600, 900, 350, 40, 'rest', 'rest', undefined, 'rest', 0],
    lot: { name: 'BV-D03', tank: 'Drums, bay 6', tonnes: 2, date: '2026-02-02', drift: 0 },
  },
];

function productOf(described: Described): Product {
  const { id, name, family, supplier, row, flags, note, drums } = described;
  return {
    id,
    name,
    supplier,
    family,
    pricePerTonne: row[0],
    figures: figuresOf(family, row),
    ...(flags ? { flags } : {}),
    ...(drums ? { lotTonnes: drums.tonnes, flushCost: drums.flush, leastDoseIfUsed: drums.leastDose } : {}),
    lots: [lotOf(described)],
    ...(note ? { note } : {}),
  };
}

/** The demo's products, made afresh on every call. */
export function demoProducts(): Product[] {
  return DESCRIBED.map(productOf);
}
