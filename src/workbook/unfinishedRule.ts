import type { ShareRule, StockSet } from '../optimise/order';

function isEmptySet({ families, stockIds, flag }: StockSet): boolean {
  return !families?.length && !stockIds?.length && !flag;
}

/** What a rule still lacks, as a sentence for the user; undefined where it is whole. Till then it asks for nothing. */
export function missingInRule(rule: ShareRule): string | undefined {
  if (rule.kind === 'flag') return rule.flag ? undefined : 'Choose the flag; until then the rule asks for nothing.';
  const isPairing = rule.kind === 'excludes' || rule.kind === 'needs';
  if (isPairing && !rule.stockId) return 'Choose the stock; until then the rule asks for nothing.';
  if (isEmptySet(rule.set) || (rule.kind === 'ratio' && isEmptySet(rule.to))) {
    return 'Choose the stocks; until then the rule asks for nothing.';
  }
  if (!isPairing && rule.min === undefined && rule.max === undefined) {
    return 'Give a least or a most; until then the rule asks for nothing.';
  }
  return undefined;
}
