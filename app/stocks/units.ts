/** From a unit to a column's: column = typed × factor + offset. */
export interface Conversion {
  factor: number;
  offset: number;
}

export const SAME: Conversion = { factor: 1, offset: 0 };

type Scale = Readonly<Record<string, number | Conversion>>;

const everySpelling = (spellings: readonly string[], factor: number): Scale =>
  Object.fromEntries(spellings.map((spelling) => [spelling, factor]));

const PER_CENT = ['%', '%m/m', '%w/w', '%wt', 'wt%', '%mass', 'mass%', 'm%', 'percent'];
const PER_MILLION = ['mg/kg', 'ppm', 'ppmw', 'ppmm/m', 'wppm', 'ug/g'];
const TONNES = ['t', 'mt', 'tonne', 'tonnes', 'metricton', 'metrictons', '1000kg'];
const TO_PER_CENT = { ...everySpelling(PER_CENT, 1), ...everySpelling(PER_MILLION, 1e-4) };

/**
 * By the unit of a column: the units that may stand in its place, spelt as `spelling` gives them, and what one of them
 * is. All are exact (BIPM, SI brochure; NIST SP 811, appendix B.8 for °F, cP and cSt). "ton" alone is no unit here: it
 * may be short, long or metric.
 */
const SCALES: Readonly<Record<string, Scale>> = {
  'mm2/s': { 'mm2/s': 1, 'mm2/sec': 1, cst: 1, centistokes: 1 },
  'kg/m3': {
    ...everySpelling(['kg/m3', 'g/l'], 1),
    ...everySpelling(['g/cm3', 'g/ml', 'g/cc', 'kg/l', 'kg/dm3', 't/m3'], 1000),
  },
  'mg/kg': { ...everySpelling(PER_MILLION, 1), ...everySpelling(PER_CENT, 1e4) },
  '%m/m': TO_PER_CENT,
  '%': TO_PER_CENT,
  '°c': {
    ...everySpelling(['°c', 'c', 'celsius'], 1),
    ...Object.fromEntries(['°f', 'f', 'fahrenheit'].map((f) => [f, { factor: 1 / 1.8, offset: -32 / 1.8 }])),
    k: { factor: 1, offset: -273.15 },
  },
  mpas: { mpas: 1, cp: 1, centipoise: 1 },
  t: { ...everySpelling(TONNES, 1), kg: 0.001 },
};

const PER_TONNE: Scale = { '': 1, ...everySpelling(TONNES, 1), '100kg': 10, kg: 1000, '1kg': 1000 };

/** One spelling of a unit however it is written: "mm²/s", "mm^2 / s" → "mm2/s"; "wt. %" → "wt%"; "deg F" → "°f". */
export function spelling(unit: string): string {
  return unit
    .toLowerCase()
    .replace(/²/g, '2')
    .replace(/³/g, '3')
    .replace(/[µμ]/g, 'u')
    .replace(/[º˚]|\bdeg(rees?)?\b/g, '°')
    .replace(/\bper\b(?!\s*cent)/g, '/')
    .replace(/[\s^.·⋅*()]/g, '')
    .replace(/^(-|percent)$/, (text) => (text === '-' ? '' : '%'));
}

/** How to turn a unit into that of a column; undefined: it cannot be done here. No unit at all is the column's. */
export function conversionOf(unit: string, columnUnit: string | undefined): Conversion | undefined {
  const from = spelling(unit);
  const to = spelling(columnUnit ?? '');
  if (from === '' || from === to) return SAME;
  const currency = /^([a-z]{3})\/t$/.exec(to)?.[1];
  const scale = SCALES[to];
  const found = currency ? perTonne(from, currency) : scale && Object.hasOwn(scale, from) ? scale[from] : undefined;
  return typeof found === 'number' ? { factor: found, offset: 0 } : found;
}

/** What one of a price's unit is per tonne: "€/kg" → 1000. Another currency is another price. */
function perTonne(unit: string, currency: string): number | Conversion | undefined {
  const symbols = (['symbol', 'narrowSymbol', 'code'] as const).map((currencyDisplay) =>
    new Intl.NumberFormat(undefined, { style: 'currency', currency, currencyDisplay })
      .formatToParts(1)
      .find(({ type }) => type === 'currency')
      ?.value.toLowerCase(),
  );
  const own = symbols.find((symbol) => symbol !== undefined && unit.startsWith(symbol)) ?? '';
  const per = unit.slice(own.length).replace(/^\//, '');
  return Object.hasOwn(PER_TONNE, per) ? PER_TONNE[per] : undefined;
}

/** True for what changes nothing: only the unit's name differs. */
export const isSame = ({ factor, offset }: Conversion): boolean => factor === 1 && offset === 0;

/** A number in the column's unit, without the noise of the arithmetic. */
export function converted(value: number, { factor, offset }: Conversion): number {
  return Number((value * factor + offset).toPrecision(12));
}
