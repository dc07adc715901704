import { create } from 'zustand';
import type { ShareRule } from '../../src';
import { isEmptySet } from './StockSetField';

/**
 * Rules that do not say enough yet to mean anything. They wait here, beside their order, and enter the workbook the
 * moment they are whole: half a rule can neither be solved nor saved.
 */
export const useUnfinishedRules = create<{ byOrder: Readonly<Record<string, readonly UnfinishedRule[]>> }>(() => ({
  byOrder: {},
}));

export interface UnfinishedRule {
  key: number;
  rule: ShareRule;
}

let lastKey = 0;

export function addUnfinished(orderId: string, rule: ShareRule): void {
  lastKey += 1;
  const added = { key: lastKey, rule };
  change(orderId, (rules) => [...rules, added]);
}

export function changeUnfinished(orderId: string, key: number, rule: ShareRule): void {
  change(orderId, (rules) => rules.map((entry) => (entry.key === key ? { key, rule } : entry)));
}

export function removeUnfinished(orderId: string, key: number): void {
  change(orderId, (rules) => rules.filter((entry) => entry.key !== key));
}

function change(orderId: string, make: (rules: readonly UnfinishedRule[]) => readonly UnfinishedRule[]): void {
  useUnfinishedRules.setState(({ byOrder }) => ({ byOrder: { ...byOrder, [orderId]: make(byOrder[orderId] ?? []) } }));
}

/** What a rule still lacks, in words; undefined where it is whole. */
export function whatIsMissing(rule: ShareRule): string | undefined {
  if (rule.kind === 'flag') return rule.flag ? undefined : 'Choose the flag; until then the rule asks for nothing.';
  if (rule.kind === 'excludes' && !rule.stockId) return 'Choose the stock; until then the rule asks for nothing.';
  if (isEmptySet(rule.set) || (rule.kind === 'ratio' && isEmptySet(rule.to))) {
    return 'Choose the stocks; until then the rule asks for nothing.';
  }
  if (rule.kind !== 'excludes' && rule.min === undefined && rule.max === undefined) {
    return 'Give a least or a most; until then the rule asks for nothing.';
  }
  return undefined;
}
