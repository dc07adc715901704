import { emptyOrder, type WorkbookOrder } from '../../src';

/**
 * Invented orders of invented customers, each with a conflict worth looking at. The costs named in the notes are
 * checked in tests/engine/demoOrders.test.ts.
 */
const NO_ADDITIVES = ['ocp-concentrate', 'hydraulic-package', 'gear-package', 'depressant'];
/** Bought for small batches only. */
const DRUMMED = ['pao-6-drums', 'polyol-ester-drums'];

const without = (...kept: string[]) => [...NO_ADDITIVES, ...DRUMMED].filter((id) => !kept.includes(id));

function order(id: string, name: string, fields: Partial<WorkbookOrder>): WorkbookOrder {
  return { ...emptyOrder(id, name), batchTonnes: 10, ...fields };
}

/** What a supplier recommends for mineral oils. */
const DEPRESSANT_DOSE = { stockId: 'depressant', exactly: 0.002 };
const GEAR_PACKAGE_DOSE = { stockId: 'gear-package', exactly: 0.018 };

const hydraulicOil = order('vg-46-hydraulic', 'VG 46 hydraulic oil, Kvornhaag Presses', {
  note: 'Raise VI to 105 to see the price of ten points: the mix moves into Group II and III.',
  excludedProductIds: without('hydraulic-package', 'depressant'),
  limits: [
    { property: 'kv', celsius: 40, min: 44.6, max: 47.4 },
    { property: 'vi', min: 95 },
    { property: 'pourPoint', max: -24 },
  ],
  doses: [{ stockId: 'hydraulic-package', exactly: 0.0085 }, DEPRESSANT_DOSE],
  depressant: true,
  laboratoryOnly: [
    'Foam, ASTM D892',
    'Demulsibility, ASTM D1401',
    'Copper strip, ASTM D130',
    'Air release, ASTM D3427',
  ],
});

const drivelineBase = order('driveline-6', '6 mm²/s base for a driveline oil, Dunvarke Drivetrains', {
  note: 'With depressant Group III wins down to a pour point of -36 °C; colder, PAO comes in. Without it, -30 °C needs half PAO.',
  excludedProductIds: without(),
  limits: [
    { property: 'kv', celsius: 100, min: 5.8, max: 6.2 },
    { property: 'vi', min: 130 },
    { property: 'noack', max: 8 },
    { property: 'pourPoint', max: -36 },
  ],
  // The finished oil's package brings the depressant, so the base reads the figures with it and carries no dose.
  depressant: true,
  laboratoryOnly: ['Brookfield viscosity at -40 °C, ASTM D2983', 'Copper strip, ASTM D130'],
});

const multigradeBase = order('multigrade-base', 'Multigrade engine oil base, Orvenholt Fleet Oils', {
  note: 'The concentrate sits at its cap. Approved engine oils lock their base-oil slate: this is a study, not a formula.',
  excludedProductIds: without('ocp-concentrate', 'depressant'),
  limits: [
    { property: 'kv', celsius: 100, min: 10.2, max: 11.8 },
    { property: 'vi', min: 155 },
    { property: 'noack', max: 13 },
  ],
  doses: [{ stockId: 'ocp-concentrate', max: 0.12 }, DEPRESSANT_DOSE],
  shares: [{ kind: 'share', set: { families: ['Group I'] }, max: 0 }],
  depressant: true,
  // The concentrate takes the Noack volatility of the rest up to its cap; its oil is of the same kind.
  greatestDoseAsTheRest: 0.12,
  laboratoryOnly: ['CCS, ASTM D5293', 'HTHS, ASTM D4683', 'MRV, ASTM D4684', 'KV100 after shear, ASTM D6278'],
});

const syntheticGearOil = order('vg-320-synthetic', 'VG 320 synthetic gear oil, Stavrenge Gearworks', {
  note: 'The blending rules disagree on the grade of so unlike a mix: make a trial blend first.',
  excludedProductIds: without('gear-package'),
  limits: [
    { property: 'kv', celsius: 40, min: 304, max: 336 },
    { property: 'vi', min: 150 },
    { property: 'pourPoint', max: -36 },
  ],
  doses: [GEAR_PACKAGE_DOSE],
  shares: [
    { kind: 'flag', flag: 'synthetic' },
    { kind: 'share', set: { families: ['ester'] }, min: 0.08, max: 0.15 },
  ],
  laboratoryOnly: [
    'Foam, ASTM D892',
    'Demulsibility, ASTM D2711',
    'Copper strip, ASTM D130',
    'FZG scuffing, ISO 14635-1',
  ],
});

const impossibleBase = order('impossible-base', 'Thin base with little volatility, Moorkappel Compressors', {
  note: 'Impossible as asked. Nothing is within reach up to a Noack volatility of 10 %; 11 % can be made.',
  excludedProductIds: without(),
  limits: [
    { property: 'kv', celsius: 100, min: 3.9, max: 4.3 },
    { property: 'vi', min: 120 },
    { property: 'noack', max: 8 },
    { property: 'pourPoint', max: -45 },
  ],
  shares: [{ kind: 'share', set: { families: ['ester'] }, max: 0.15 }],
  laboratoryOnly: ['Oxidation stability, ASTM D2272', 'Demulsibility, ASTM D1401'],
});

const gearOilLimits: WorkbookOrder['limits'] = [
  { property: 'kv', celsius: 40, min: 209, max: 231 },
  { property: 'vi', min: 90 },
];

const mineralGearOil = order('vg-220-mineral', 'VG 220 mineral gear oil, Pellwyck Cement Mills', {
  note: 'Half bright stock. The next order shows what it costs when bright stock is short.',
  excludedProductIds: without('gear-package', 'depressant'),
  limits: gearOilLimits,
  doses: [GEAR_PACKAGE_DOSE, DEPRESSANT_DOSE],
  depressant: true,
  laboratoryOnly: ['Foam, ASTM D892', 'Demulsibility, ASTM D2711', 'Copper strip, ASTM D130'],
});

const shortOfBrightStock: WorkbookOrder = {
  ...mineralGearOil,
  id: 'vg-220-short',
  name: 'VG 220 mineral gear oil, bright stock short',
  note: 'At most 30 % bright stock: the price of a shortage.',
  shares: [{ kind: 'share', set: { stockIds: ['bright-stock'] }, max: 0.3 }],
};

const compressorOil = order('vg-32-compressor', 'VG 32 compressor oil from drums, Hallmoor Air', {
  note: 'Three tonnes: ester and PAO come in whole drums, opening one costs a flush, and five stocks are the most.',
  batchTonnes: 3,
  excludedProductIds: [...without('hydraulic-package', ...DRUMMED), 'pao-4', 'pao-6', 'polyol-ester'],
  limits: [
    { property: 'kv', celsius: 40, min: 28.8, max: 35.2 },
    { property: 'vi', min: 125 },
    { property: 'noack', max: 9 },
    { property: 'pourPoint', max: -24 },
  ],
  doses: [{ stockId: 'hydraulic-package', exactly: 0.0085 }],
  // A seal swell that the customer asks for.
  shares: [{ kind: 'share', set: { families: ['ester'] }, min: 0.05, max: 0.15 }],
  mostStocks: 5,
  laboratoryOnly: ['Foam, ASTM D892', 'Demulsibility, ASTM D1401', 'Copper strip, ASTM D130'],
});

/** The demo's orders, made afresh on every call. */
export function demoOrders(): WorkbookOrder[] {
  return structuredClone([
    hydraulicOil,
    drivelineBase,
    multigradeBase,
    syntheticGearOil,
    impossibleBase,
    mineralGearOil,
    shortOfBrightStock,
    compressorOil,
  ]);
}
