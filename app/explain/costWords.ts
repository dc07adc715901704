import type { Order } from '../../src';
import { formatMoney } from '../parts/money';

/** What a difference of cost is counted on. */
export type CostUnit = 't' | 'm³';

/** What the order counts its cost on. */
export function costUnit({ costBasis }: Pick<Order, 'costBasis'>): CostUnit {
  return costBasis === 'cubic metre' ? 'm³' : 't';
}

/** Amounts that round to nothing but are not nothing. */
const LEAST_SHOWN = 0.005;
/** Below this an amount is the arithmetic's own noise. */
const NOTHING = 1e-6;

export function isNothing(amount: number): boolean {
  return Math.abs(amount) < NOTHING;
}

/** "€1.20/t", "under €0.01/t", "nothing": a difference of cost without its sign. */
export function difference(amount: number, currency: string, unit: CostUnit = 't'): string {
  const size = Math.abs(amount);
  if (isNothing(size)) return 'nothing';
  return size < LEAST_SHOWN ? `under ${costPer(0.01, currency, unit)}` : costPer(size, currency, unit);
}

/** "€913.00/t". */
export function costPer(amount: number, currency: string, unit: CostUnit = 't'): string {
  return `${formatMoney(amount, currency)}/${unit}`;
}

/** "+€1.20/t", "no dearer". */
export function added(amount: number, currency: string, unit: CostUnit = 't'): string {
  if (isNothing(amount)) return 'no dearer';
  const words = difference(amount, currency, unit);
  const sign = amount < 0 ? '−' : '+';
  return words.startsWith('under') ? `${sign} ${words}` : `${sign}${words}`;
}
