import type { Product } from '../../src';
import { fromPercent, toPercent } from '../order/percent';
import { type DecimalSign, formatForEditing, parseNumber, unreadInWords } from '../parts/numberText';
import { environment } from '../state/environment';
import { type CellView, type Column, dropUnread, keepUnread } from './column';

interface Amount {
  id: 'pricePerTonne' | 'leastDoseIfUsed' | 'greatestDose' | 'availableTonnes' | 'lotTonnes' | 'flushCost';
  label: string;
  unit: string;
  title: string;
  digits: number;
  /** What an empty cell means. */
  empty: string;
  /** Kept as a share [0..1], shown and typed in per cent. */
  inPercent?: true;
  get(product: Product): number | undefined;
  set(product: Product, value: number | undefined): void;
  problem?(value: number, product: Product): string | undefined;
  caution?(value: number): string | undefined;
  locked?(product: Product): string | undefined;
}

function amountColumn({ inPercent, ...amount }: Amount): Column {
  const { id, label, unit, title } = amount;
  const shown = (value: number) => (inPercent ? toPercent(value) : value);
  function read(product: Product): CellView {
    const unread = product.unread?.[id];
    if (unread !== undefined) return { text: unread, edit: unread, problem: `${unreadInWords(unread)} ${LEFT_OUT}` };
    const value = amount.get(product);
    const isPrice = id === 'pricePerTonne';
    if (value === undefined) {
      return { text: '–', edit: '', state: 'unknown', title: amount.empty, ...(isPrice && { caution: amount.empty }) };
    }
    const problem = amount.problem?.(value, product);
    const caution = amount.caution?.(value);
    return {
      text: formatForEditing(shown(value), amount.digits),
      edit: formatForEditing(shown(value), 0),
      ...(problem && { problem }),
      ...(caution && { caution }),
    };
  }
  function write(product: Product, text: string, sign?: DecimalSign): void {
    dropUnread(product, id);
    const parsed = parseNumber(inPercent ? text.replace(/%\s*$/, '') : text, sign);
    if ('problem' in parsed) {
      amount.set(product, undefined);
      keepUnread(product, id, text);
    } else if ('empty' in parsed) amount.set(product, undefined);
    else amount.set(product, inPercent ? fromPercent(parsed.value) : parsed.value);
  }
  return { id, label, unit, title, kind: 'number', read, write, locked: amount.locked };
}

/** A bound that cannot be read, or cannot be right, is not "no bound": the stock then stays out, as without a price. */
const LEFT_OUT = 'Until then the stock is left out.';

const outsideShare = (value: number) =>
  value < 0 || value > 1 ? `A share lies between 0 and 100 %. ${LEFT_OUT}` : undefined;

export function priceColumn(currency: string): Column {
  return amountColumn({
    id: 'pricePerTonne',
    label: 'Price',
    unit: `${currency}/t`,
    title: `Price per tonne [${currency}/t]`,
    digits: 0,
    empty: 'no price: the stock is left out of every order until it has one',
    get: ({ pricePerTonne }) => pricePerTonne,
    set(product, value) {
      if (value === undefined) delete product.pricePerTonne;
      else product.pricePerTonne = value;
    },
    caution: (value) => (value < 0 ? 'Below zero: using this stock saves money. Is that meant?' : undefined),
  });
}

export const ON_HAND_COLUMN = amountColumn({
  id: 'availableTonnes',
  label: 'On hand',
  unit: 't',
  title: 'On hand, all lots together [t]; empty: not limited',
  digits: 1,
  empty: 'not limited',
  get: ({ lots }) => sumOfLots(lots.map(({ availableTonnes }) => availableTonnes)),
  set(product, value) {
    const [lot, second] = product.lots;
    if (second) return;
    if (!lot) {
      if (value !== undefined) product.lots.push(newLot(value));
    } else if (value === undefined) delete lot.availableTonnes;
    else lot.availableTonnes = value;
  },
  problem: (value) => (value < 0 ? `A quantity cannot be below zero. ${LEFT_OUT}` : undefined),
  // A text from elsewhere that stands unread keeps the stock out, and must be there to clear.
  locked: ({ lots, unread }) =>
    lots.length > 1 && unread?.availableTonnes === undefined ? `The sum of ${lots.length} lots.` : undefined,
});

function newLot(availableTonnes: number) {
  return { id: environment().newId(), name: 'on hand', availableTonnes, figures: [] };
}

/** The sum where every lot's quantity is known: unknown is not zero. */
function sumOfLots(tonnes: readonly (number | undefined)[]): number | undefined {
  if (tonnes.length === 0) return undefined;
  return tonnes.reduce<number | undefined>((sum, t) => (sum === undefined || t === undefined ? undefined : sum + t), 0);
}

export const LEAST_DOSE_COLUMN = amountColumn({
  id: 'leastDoseIfUsed',
  label: 'Least dose',
  unit: '%',
  title: 'Least share the plant can meter: absent, or at least so much of the mix [% m/m]',
  digits: 2,
  inPercent: true,
  empty: 'none',
  get: ({ leastDoseIfUsed }) => leastDoseIfUsed,
  set(product, value) {
    if (value === undefined) delete product.leastDoseIfUsed;
    else product.leastDoseIfUsed = value;
  },
  problem: (value, { greatestDose }) =>
    outsideShare(value) ??
    (greatestDose !== undefined && value > greatestDose
      ? 'This is above the greatest share. Change one of them.'
      : undefined),
});

export const GREATEST_DOSE_COLUMN = amountColumn({
  id: 'greatestDose',
  label: 'Greatest dose',
  unit: '%',
  title: 'Greatest share in a mix [% m/m]',
  digits: 2,
  inPercent: true,
  empty: 'none',
  get: ({ greatestDose }) => greatestDose,
  set(product, value) {
    if (value === undefined) delete product.greatestDose;
    else product.greatestDose = value;
  },
  problem: outsideShare,
});

export const DRUM_COLUMN = amountColumn({
  id: 'lotTonnes',
  label: 'Drum',
  unit: 't',
  title:
    'What one drum or tote holds [t]: in a batch of fixed size the stock is charged in whole ones; empty: by weight',
  digits: 3,
  empty: 'charged by weight',
  get: ({ lotTonnes }) => lotTonnes,
  set(product, value) {
    if (value === undefined) delete product.lotTonnes;
    else product.lotTonnes = value;
  },
  problem: (value) => (value <= 0 ? `A drum holds more than nothing. ${LEFT_OUT}` : undefined),
});

export function flushColumn(currency: string): Column {
  return amountColumn({
    id: 'flushCost',
    label: 'Flush',
    unit: currency,
    title: `What using the stock costs a batch whatever its share: flushing a line, opening a tank [${currency}]`,
    digits: 0,
    empty: 'none',
    get: ({ flushCost }) => flushCost,
    set(product, value) {
      if (value === undefined) delete product.flushCost;
      else product.flushCost = value;
    },
    problem: (value) => (value < 0 ? `A flush cannot cost less than nothing. ${LEFT_OUT}` : undefined),
  });
}
