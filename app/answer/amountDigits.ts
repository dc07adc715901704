import { formatNumber } from '../parts/numberText';

/** Significant figures that the smallest share must show: a dose of 2.5 kg in ten tonnes is not 3 kg. */
const SIGNIFICANT = 3;
const MOST_DIGITS = 6;

/** Decimals of kilograms and litres: what a scale of that batch can show. Smaller amounts get more. */
export function amountDigits(batchKilograms: number): number {
  if (batchKilograms >= 10_000) return 0;
  return batchKilograms >= 500 ? 1 : 2;
}

/** Decimals of an amount: `least`, or as many as its significant figures need. */
export function digitsOf(value: number | undefined, least: number): number {
  if (value === undefined || !(value > 0)) return least;
  const needed = SIGNIFICANT - 1 - Math.floor(Math.log10(value) + 1e-9);
  return Math.min(MOST_DIGITS, Math.max(least, needed));
}

/** Texts of a column, one for each part and one for their total; `unknown` where a value is not known. */
export function columnTexts(
  parts: readonly (number | undefined)[],
  total: number | undefined,
  least: number,
  unknown: string,
): { parts: string[]; total: string } {
  const text = (value: number | undefined) =>
    value === undefined ? unknown : formatNumber(value, digitsOf(value, least));
  return { parts: parts.map(text), total: text(total) };
}
