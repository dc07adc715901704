/** Numbers as people write them. The decimal sign may be a comma or a point; what could be read two ways is refused. */

/** What a text says: a number, nothing at all, or why it cannot be read (with what to do). */
export type ParsedNumber = { value: number } | { problem: string } | { empty: true };

const SPACES = /[\s\u00a0\u202f'’]/g;
const GROUPED_BY_SPACE = /^[+-]?\d{1,3}([\s\u00a0\u202f'’]\d{3})+([.,]\d*)?$/;

/** Reads a number. Never guesses: "1,234" may be a thousand or little more than one, so it is refused. */
export function parseNumber(text: string): ParsedNumber {
  const trimmed = text.trim().replace(/[\u2212\u2013]/g, '-');
  if (trimmed === '') return { empty: true };
  const hasSpaces = /[\s\u00a0\u202f'’]/.test(trimmed);
  if (hasSpaces && !GROUPED_BY_SPACE.test(trimmed)) return { problem: `“${text.trim()}” is not one number.` };
  const packed = trimmed.replace(SPACES, '');

  if (/^[+-]?(\d+[.,]?\d*|[.,]\d+)(e[+-]?\d{1,3})?$/i.test(packed)) return readPlain(packed, hasSpaces);
  if (/^[+-]?\d{1,3}(,\d{3})+\.\d*$/.test(packed)) return { value: Number(packed.replaceAll(',', '')) };
  if (/^[+-]?\d{1,3}(\.\d{3})+,\d*$/.test(packed)) {
    return { value: Number(packed.replaceAll('.', '').replace(',', '.')) };
  }
  if (/^[+-]?\d{1,3}(,\d{3}){2,}$/.test(packed)) return { value: Number(packed.replaceAll(',', '')) };
  if (/^[+-]?\d{1,3}(\.\d{3}){2,}$/.test(packed)) return { value: Number(packed.replaceAll('.', '')) };
  if (/^[+-]?[\d.,]+$/.test(packed)) {
    return { problem: `“${text.trim()}” can be read in more than one way. Write it with one decimal sign only.` };
  }
  return { problem: `“${text.trim()}” is not a number.` };
}

function readPlain(packed: string, grouped: boolean): ParsedNumber {
  if (!grouped && /^[+-]?[1-9]\d{0,2},\d{3}$/.test(packed)) {
    const whole = packed.replace(',', '');
    const decimal = packed.replace(',', '.');
    return { problem: `“${packed}” can be read in two ways. Write ${whole} or ${decimal}.` };
  }
  const value = Number(packed.replace(',', '.'));
  return Number.isFinite(value) ? { value } : { problem: `“${packed}” is too large.` };
}

const formats = new Map<string, Intl.NumberFormat>();

function numberFormat(least: number, most: number): Intl.NumberFormat {
  const key = `${least}/${most}`;
  let format = formats.get(key);
  if (!format) {
    format = new Intl.NumberFormat(undefined, {
      minimumFractionDigits: least,
      maximumFractionDigits: most,
      useGrouping: false,
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
export function formatForEditing(value: number | undefined, digits: number): string {
  if (value === undefined || !Number.isFinite(value)) return '';
  return numberFormat(digits, digits + 4).format(value);
}
