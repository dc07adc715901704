import type { Stock } from '../stock/stock';
import type { Dose, ShareRule, StockSet } from './order';

/** A share as a percentage, "8 %". */
export function percent(share: number): string {
  return `${Number((100 * share).toPrecision(6))} %`;
}

function nameOf(stocks: readonly Stock[], id: string): string {
  return stocks.find((stock) => stock.id === id)?.name ?? id;
}

function setInWords({ stockIds = [], families = [], flag }: StockSet, stocks: readonly Stock[]): string {
  const parts = [
    ...stockIds.map((id) => nameOf(stocks, id)),
    ...families,
    ...(flag === undefined ? [] : [`"${flag}"`]),
  ];
  return parts.join(', ');
}

function rangeInWords(min: number | undefined, max: number | undefined, write: (value: number) => string): string {
  if (min !== undefined && max !== undefined) return min === max ? write(min) : `${write(min)} to ${write(max)}`;
  if (min !== undefined) return `at least ${write(min)}`;
  return max === undefined ? 'any' : `at most ${write(max)}`;
}

/** A dose in words, "Gear package 1.8 % of the mix". */
export function doseInWords({ stockId, exactly, min, max, of, unit }: Dose, stocks: readonly Stock[]): string {
  const write = unit === 'tonnes' ? (tonnes: number) => `${tonnes} t` : percent;
  const range = exactly === undefined ? rangeInWords(min, max, write) : write(exactly);
  return `${nameOf(stocks, stockId)} ${range}${unit === 'tonnes' ? '' : ` of the ${of ?? 'mix'}`}`;
}

/** A share rule in words, "ester at most 15 % of the mix". */
export function ruleInWords(rule: ShareRule, stocks: readonly Stock[]): string {
  switch (rule.kind) {
    case 'share':
      return `${setInWords(rule.set, stocks)} ${rangeInWords(rule.min, rule.max, percent)} of the ${rule.of ?? 'mix'}`;
    case 'ratio': {
      const range = rangeInWords(rule.min, rule.max, (value) => String(value));
      return `${setInWords(rule.set, stocks)} to ${setInWords(rule.to, stocks)} in a ratio of ${range}`;
    }
    case 'count':
      return `${rangeInWords(rule.min, rule.max, String)} of ${setInWords(rule.set, stocks)}`;
    case 'one of':
      return `one of ${setInWords(rule.set, stocks)}, ${rangeInWords(rule.min, rule.max, percent)} of the mix`;
    case 'excludes':
      return `${nameOf(stocks, rule.stockId)} not together with ${setInWords(rule.set, stocks)}`;
    case 'needs':
      return `${nameOf(stocks, rule.stockId)} only together with ${setInWords(rule.set, stocks)}`;
    case 'flag':
      return `every stock carries "${rule.flag}"`;
  }
}
