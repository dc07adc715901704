import { type OwnProperty, ownPropertyDefinition } from './ownProperty';
import type { PropertyDefinition } from './propertyDefinition';

/**
 * The property table: one entry a property. Limits, columns, rails, charts and help derive from it; to add a
 * property, add an entry and its test (DEVELOPERS.md). Test methods by ASTM number; the blending rules are those of
 * DEVELOPERS.md, "How properties blend". Reproducibilities are editable defaults, editions differ.
 */

type TraceElement = { id: string; label: string; short: string; method: string };

const LINEAR_BY_MASS = 'Averages by mass.';
const COMMON_PRACTICE = 'Common practice, no source.';

function traceElement({ id, label, short, method }: TraceElement): PropertyDefinition {
  return {
    id,
    label,
    short,
    unit: 'mg/kg',
    method,
    index: 'linear',
    basis: 'mass',
    digits: 0,
    reportingUnit: 1,
    sense: { min: 0, max: 1e6 },
    direction: 'range',
    blending: LINEAR_BY_MASS,
    source: COMMON_PRACTICE,
  };
}

export const PROPERTY_TABLE: readonly PropertyDefinition[] = [
  {
    id: 'kv',
    label: 'Kinematic viscosity',
    short: 'KV',
    unit: 'mm²/s',
    method: 'ASTM D445 / ISO 3104',
    temperatures: [40, 100],
    anyTemperature: true,
    index: 'viscosity',
    basis: 'volume',
    digits: 2,
    reportingUnit: 0.01,
    sense: { min: 0.3, max: 1e6 },
    // ASTM D445, base oils, at 40 °C and at 100 °C (from memory; editions differ).
    reproducibility: { relative: 0.0136 },
    reproducibilityAt: { 100: { relative: 0.019 } },
    direction: 'range',
    blending: 'Blends by the viscosity rule of the order; the Wright method of ASTM D7152 unless another is chosen.',
    source: 'ASTM D7152, ASTM D341.',
  },
  {
    id: 'density',
    label: 'Density',
    short: 'Density',
    unit: 'kg/m³',
    method: 'ASTM D4052 / ISO 12185',
    temperatures: [15],
    index: 'linear',
    basis: 'volume',
    digits: 1,
    reportingUnit: 0.1,
    sense: { min: 500, max: 2000 },
    reproducibility: { absolute: 0.5 },
    direction: 'range',
    blending: 'Volumes add.',
    source: 'Common practice, no source. Reproducibility from memory.',
  },
  {
    id: 'noack',
    label: 'Noack volatility',
    short: 'Noack',
    unit: '% m/m',
    method: 'ASTM D5800 / CEC L-40',
    index: 'linear',
    basis: 'mass',
    digits: 1,
    reportingUnit: 0.1,
    sense: { min: 0, max: 100 },
    reproducibility: { relative: 0.18 },
    direction: 'lower',
    blending: 'Averages by mass. Reads low for a thin and a heavy stock together.',
    source: 'Common practice, no source. Reproducibility: procedure B, older editions, from memory.',
  },
  {
    id: 'pourPoint',
    label: 'Pour point',
    short: 'Pour',
    unit: '°C',
    method: 'ASTM D97 / ISO 3016',
    index: 'hu-burns pour point',
    basis: 'volume',
    digits: 0,
    reportingUnit: 1,
    sense: { min: -120, max: 80 },
    reproducibility: { absolute: 6 },
    direction: 'lower',
    blending:
      'Averages I = 3 262 000 (T/1000)^12.5 (T in °R) by volume. A weak method, meant for neat stocks. With a ' +
      'depressant, the measured pour points with depressant are averaged instead.',
    source: 'Hu and Burns (1970); Riazi, ASTM MNL50 (2005). Reproducibility: ISO 3016.',
  },
  {
    id: 'pourPointDepressed',
    label: 'Pour point with depressant',
    short: 'Pour, depr.',
    unit: '°C',
    method: 'ASTM D97 / ISO 3016, at a stated dose of depressant',
    index: 'hu-burns pour point',
    basis: 'volume',
    digits: 0,
    reportingUnit: 1,
    sense: { min: -120, max: 80 },
    reproducibility: { absolute: 6 },
    direction: 'lower',
    blending: 'The figure an order with depressant reads in place of the neat pour point; measured, never calculated.',
    source: 'Hu and Burns (1970); Riazi, ASTM MNL50 (2005).',
  },
  {
    id: 'flashPoint',
    label: 'Flash point, open cup',
    short: 'Flash',
    unit: '°C',
    method: 'ASTM D92 / ISO 2592',
    index: 'wickey-chittenden flash point',
    basis: 'volume',
    digits: 0,
    reportingUnit: 1,
    sense: { min: 20, max: 400 },
    reproducibility: { absolute: 18 },
    direction: 'higher',
    blending:
      'Averages log10 I = -6.1188 + 2414/(T - 42.6) (T in K) by volume. Built on closed-cup distillates, ' +
      'extrapolated to lubricants: an estimate.',
    source: 'Wickey and Chittenden (1963); Riazi, ASTM MNL50 (2005). Reproducibility from memory.',
  },
  {
    id: 'sulphur',
    label: 'Sulphur',
    short: 'Sulphur',
    unit: 'mg/kg',
    method: 'ASTM D5453, D2622',
    index: 'linear',
    basis: 'mass',
    digits: 0,
    reportingUnit: 1,
    sense: { min: 0, max: 200_000 },
    direction: 'lower',
    blending: LINEAR_BY_MASS,
    source: COMMON_PRACTICE,
  },
  {
    id: 'saturates',
    label: 'Saturates',
    short: 'Saturates',
    unit: '% m/m',
    method: 'ASTM D2007 / D7419',
    index: 'linear',
    basis: 'mass',
    digits: 1,
    reportingUnit: 0.1,
    sense: { min: 0, max: 100 },
    direction: 'higher',
    blending: LINEAR_BY_MASS,
    source: COMMON_PRACTICE,
  },
  {
    id: 'anilinePoint',
    label: 'Aniline point',
    short: 'Aniline',
    unit: '°C',
    method: 'ASTM D611',
    index: 'riazi aniline point',
    basis: 'volume',
    digits: 1,
    reportingUnit: 0.1,
    sense: { min: -30, max: 200 },
    direction: 'range',
    blending: 'Averages I = 1.124 exp(0.00657 t) (t in °C) by volume.',
    source: 'Riazi, ASTM MNL50 (2005), from memory.',
  },
  {
    id: 'ccs',
    label: 'Cold-cranking viscosity',
    short: 'CCS',
    unit: 'mPa·s',
    method: 'ASTM D5293',
    temperatures: [-35, -30, -25, -20, -15, -10],
    index: 'logarithmic',
    basis: 'mass',
    digits: 0,
    reportingUnit: 10,
    sense: { min: 100, max: 100_000 },
    reproducibility: { relative: 0.07 },
    direction: 'lower',
    blending:
      'Averages ln η by mass at one temperature. Good for base oils; polymers shear-thin, so a mix with one needs ' +
      'in-blend values.',
    source: 'Common practice, no source. Reproducibility from memory.',
  },
  {
    id: 'hths',
    label: 'High-shear viscosity at 150 °C',
    short: 'HTHS',
    unit: 'mPa·s',
    method: 'ASTM D4683',
    index: 'logarithmic',
    basis: 'mass',
    digits: 2,
    reportingUnit: 0.01,
    sense: { min: 0.3, max: 1000 },
    direction: 'higher',
    blending: 'Averages ln η by mass. A mix with a polymer needs in-blend values.',
    source: COMMON_PRACTICE,
  },
  traceElement({ id: 'phosphorus', label: 'Phosphorus', short: 'P', method: 'ASTM D4951' }),
  traceElement({ id: 'zinc', label: 'Zinc', short: 'Zn', method: 'ASTM D4951' }),
  traceElement({ id: 'calcium', label: 'Calcium', short: 'Ca', method: 'ASTM D4951' }),
  traceElement({ id: 'magnesium', label: 'Magnesium', short: 'Mg', method: 'ASTM D4951' }),
  traceElement({ id: 'nitrogen', label: 'Nitrogen', short: 'N', method: 'ASTM D5762' }),
  {
    id: 'sulphatedAsh',
    label: 'Sulphated ash',
    short: 'Ash',
    unit: '% m/m',
    method: 'ASTM D874',
    index: 'linear',
    basis: 'mass',
    digits: 2,
    reportingUnit: 0.01,
    sense: { min: 0, max: 100 },
    direction: 'lower',
    blending: LINEAR_BY_MASS,
    source: COMMON_PRACTICE,
  },
  {
    id: 'baseNumber',
    label: 'Base number',
    short: 'BN',
    unit: 'mg KOH/g',
    method: 'ASTM D2896',
    index: 'linear',
    basis: 'mass',
    digits: 1,
    reportingUnit: 0.1,
    sense: { min: 0, max: 1000 },
    direction: 'range',
    blending: LINEAR_BY_MASS,
    source: COMMON_PRACTICE,
  },
  {
    id: 'acidNumber',
    label: 'Acid number',
    short: 'AN',
    unit: 'mg KOH/g',
    method: 'ASTM D664',
    index: 'linear',
    basis: 'mass',
    digits: 2,
    reportingUnit: 0.01,
    sense: { min: 0, max: 500 },
    direction: 'range',
    blending: LINEAR_BY_MASS,
    source: COMMON_PRACTICE,
  },
];

/**
 * The viscosity index: calculated from KV40 and KV100 of the mix, never averaged, so it stands beside the table.
 * As a figure of a stock ('vi') it serves only to work KV40 back from KV100.
 */
export const VI_DEFINITION: PropertyDefinition = {
  id: 'vi',
  label: 'Viscosity index',
  short: 'VI',
  unit: '-',
  method: 'ASTM D2270 / ISO 2909',
  index: 'linear',
  basis: 'mass',
  digits: 0,
  reportingUnit: 1,
  sense: { min: -200, max: 500 },
  direction: 'higher',
  blending: 'Calculated from the predicted KV40 and KV100; an average of indices means nothing.',
  source: 'ASTM D2270, Table 1.',
};

const BY_ID = new Map([...PROPERTY_TABLE, VI_DEFINITION].map((entry) => [entry.id, entry]));

/** The entry of a property of the table, of 'vi', or of an own property; undefined for an unknown id. */
export function propertyDefinition(
  id: string,
  ownProperties: readonly OwnProperty[] = [],
): PropertyDefinition | undefined {
  const known = BY_ID.get(id);
  if (known) return known;
  const own = ownProperties.find((property) => property.id === id);
  return own && ownPropertyDefinition(own);
}
