/** Numbers as people write them. One decimal sign decides; what could be read two ways by the other sign is refused. */

/** What a text says: a number, nothing at all, or why it cannot be read (with what to do). */
export type ParsedNumber = { value: number } | { problem: string } | { empty: true };

export type DecimalSign = ',' | '.';

const SPACES = /[\s\u00a0\u202f'’]/g;
const GROUPED_BY_SPACE = /^[+-]?\d{1,3}([\s\u00a0\u202f'’]\d{3})+([.,]\d*)?$/;
const PLAIN = /^[+-]?(\d+[.,]?\d*|[.,]\d+)(e[+-]?\d{1,3})?$/i;
/** "1,182" and "1.182": a thousand and more, or little more than one. */
const TWO_WAYS = /^[+-]?[1-9]\d{0,2}[.,]\d{3}$/;
/** Grouped by one sign, so that the other is the decimal sign: "1.240,5", "1.240.000". */
const GROUPED: Record<DecimalSign, RegExp> = {
  '.': /^[+-]?\d{1,3}((,\d{3})+\.\d*|(,\d{3}){2,})$/,
  ',': /^[+-]?\d{1,3}((\.\d{3})+,\d*|(\.\d{3}){2,})$/,
};

/** The decimal sign of a language; without one, the user's own. */
export function decimalSignOf(locale?: string): DecimalSign {
  const parts = new Intl.NumberFormat(locale, { numberingSystem: 'latn' }).formatToParts(1.5);
  return parts.some(({ type, value }) => type === 'decimal' && value === ',') ? ',' : '.';
}

const OWN_SIGN = decimalSignOf();

/** Without the marks of direction that right-to-left languages put before a sign. */
const trimmed = (text: string) =>
  text
    .replace(/[\u200e\u200f\u061c]/g, '')
    .trim()
    .replace(/[\u2212\u2013]/g, '-');

/**
 * Reads a number. Three digits after a single separator are decimals only after the decimal sign; after the other
 * sign they may be thousands, and the text is refused. Where nothing can be mistaken ("12,5", "0,123"), both signs do.
 */
export function parseNumber(text: string, sign: DecimalSign = OWN_SIGN): ParsedNumber {
  const typed = trimmed(text);
  if (typed === '') return { empty: true };
  const packed = typed.replace(SPACES, '');
  const hasSpaces = packed !== typed;
  if (hasSpaces && !GROUPED_BY_SPACE.test(typed)) return { problem: `“${text.trim()}” is not one number.` };
  if (PLAIN.test(packed)) {
    return !hasSpaces && TWO_WAYS.test(packed) && !packed.includes(sign)
      ? { problem: twoWays(packed, sign) }
      : finite(packed.replace(',', '.'), packed);
  }
  if (GROUPED['.'].test(packed)) return finite(packed.replaceAll(',', ''), packed);
  if (GROUPED[','].test(packed)) return finite(packed.replaceAll('.', '').replace(',', '.'), packed);
  if (/^[+-]?[\d.,]+$/.test(packed)) {
    return { problem: `“${text.trim()}” can be read in more than one way. Write it with one decimal sign only.` };
  }
  return { problem: `“${text.trim()}” is not a number.` };
}

function finite(plain: string, typed: string): ParsedNumber {
  const value = Number(plain);
  return Number.isFinite(value) ? { value } : { problem: `“${typed}” is too large.` };
}

function twoWays(packed: string, sign: DecimalSign): string {
  const [whole, decimal] = [packed.replace(/[.,]/, ''), packed.replace(/[.,]/, sign)];
  return `“${packed}” can be read in two ways. Write ${whole} or ${decimal}.`;
}

/** Why a text that stands unread was not taken, and what to write instead. */
export function unreadInWords(text: string, sign: DecimalSign = OWN_SIGN): string {
  // A block with another decimal sign may have brought it here: alone, it could be read.
  const packed = trimmed(text);
  if (TWO_WAYS.test(packed)) return twoWays(packed, sign);
  const parsed = parseNumber(text, sign);
  return 'problem' in parsed ? parsed.problem : `“${text}” was not taken. Type it again.`;
}

/** The decimal sign that a text shows beyond doubt, or nothing. */
function shownSign(text: string): DecimalSign | undefined {
  const typed = trimmed(text);
  const packed = typed.replace(SPACES, '');
  if (packed !== typed && !GROUPED_BY_SPACE.test(typed)) return undefined;
  if (GROUPED['.'].test(packed)) return '.';
  if (GROUPED[','].test(packed)) return ',';
  if (!PLAIN.test(packed) || (packed === typed && TWO_WAYS.test(packed))) return undefined;
  return packed.includes(',') ? ',' : packed.includes('.') ? '.' : undefined;
}

/** The one decimal sign of numbers that belong together, where they show it and do not contradict each other. */
export function commonSign(texts: readonly string[]): DecimalSign | undefined {
  const signs = new Set(texts.map(shownSign).filter((sign) => sign !== undefined));
  const [sign] = signs;
  return signs.size === 1 ? sign : undefined;
}

const formats = new Map<string, Intl.NumberFormat>();

function numberFormat(least: number, most: number, locale?: string): Intl.NumberFormat {
  const key = `${least}/${most}/${locale ?? ''}`;
  let format = formats.get(key);
  if (!format) {
    format = new Intl.NumberFormat(locale, {
      minimumFractionDigits: least,
      maximumFractionDigits: most,
      useGrouping: false,
      // Other digits could not be read back.
      numberingSystem: 'latn',
    });
    formats.set(key, format);
  }
  return format;
}

/** A number with so many decimals, in the user's own decimal sign; "–" for anything that is not a number. */
export function formatNumber(value: number | undefined, digits: number): string {
  if (value === undefined || !Number.isFinite(value)) return '–';
  const rounded = numberFormat(digits, digits).format(value);
  // A tiny negative number rounds to "-0", which says nothing.
  return /^-0([.,]0*)?$/.test(rounded) ? rounded.slice(1) : rounded;
}

/** A number to be edited: at least so many decimals, and all those it has (up to four more), so that nothing is hidden. */
export function formatForEditing(value: number | undefined, digits: number, locale?: string): string {
  if (value === undefined || !Number.isFinite(value)) return '';
  return numberFormat(digits, digits + 4, locale).format(value);
}

/** A number with every digit it has, as `parseNumber` reads it back by the same sign. */
export function exactText(value: number, sign: DecimalSign = OWN_SIGN): string {
  return String(value).replace('.', sign);
}
