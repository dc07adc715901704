import type { EntryPrice, UsedStock } from '../../src';
import { formatMoney } from '../parts/money';
import { added, type CostUnit } from './costWords';

/** "€860.00 to €910.00", "up to €910.00", "from €860.00": prices per tonne at which the recipe stays the cheapest. */
export function standsInWords({ standsFrom, standsTo }: UsedStock, currency: string): string {
  const money = (amount: number) => formatMoney(amount, currency);
  if (standsFrom !== undefined && standsTo !== undefined) return `${money(standsFrom)} to ${money(standsTo)}`;
  if (standsTo !== undefined) return `up to ${money(standsTo)}`;
  if (standsFrom !== undefined) return `from ${money(standsFrom)} up`;
  return 'no end found';
}

/** "+€12.30/t", "impossible", "not proven": what it costs to do without the stock. */
export function lossInWords(
  { lossCosts, impossibleWithout, proven }: UsedStock,
  currency: string,
  unit: CostUnit,
): string {
  if (impossibleWithout) return 'no recipe';
  if (lossCosts === undefined) return 'not proven';
  return `${added(lossCosts, currency, unit)}${proven ? '' : ', not proven'}`;
}

/** "below €1,102.30", "not at any price above zero". */
export function entryInWords({ entersBelow, proven }: EntryPrice, currency: string): string {
  const words = entersBelow === undefined ? 'not even at zero' : `below ${formatMoney(entersBelow, currency)}`;
  return proven ? words : `${words}, not proven`;
}

/** Unused stocks by how far their price would have to fall, the nearest first. */
export function byNearness(entries: readonly EntryPrice[]): EntryPrice[] {
  const fall = ({ pricePerTonne, entersBelow }: EntryPrice) =>
    entersBelow === undefined ? Infinity : pricePerTonne - entersBelow;
  return entries.toSorted((a, b) => {
    const [one, other] = [fall(a), fall(b)];
    return one === other ? 0 : one - other;
  });
}
