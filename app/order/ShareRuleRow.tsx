import type { Product, ShareRule } from '../../src';
import { RuleRow } from './RuleRow';
import { CountRule, ExcludesRule, FlagRule, RatioRule, ShareOfSetRule } from './ruleFields';
import { isEmptySet } from './StockSetField';

export interface RuleFieldsProps<Kind extends ShareRule['kind']> {
  rule: Extract<ShareRule, { kind: Kind }>;
  products: readonly Product[];
  onChange(rule: ShareRule): void;
}

/** One rule of the mix, of whichever kind. */
export function ShareRuleRow({
  rule,
  products,
  problems,
  onChange,
  onRemove,
}: {
  rule: ShareRule;
  products: readonly Product[];
  problems: readonly string[];
  onChange(rule: ShareRule): void;
  onRemove(): void;
}) {
  const unfinished = whatIsMissing(rule);
  return (
    <RuleRow problems={unfinished ? [unfinished] : problems} removeLabel="Remove this rule" onRemove={onRemove}>
      {fieldsOf(rule, products, onChange)}
    </RuleRow>
  );
}

function fieldsOf(rule: ShareRule, products: readonly Product[], onChange: (rule: ShareRule) => void) {
  const shared = { products, onChange };
  switch (rule.kind) {
    case 'share':
      return <ShareOfSetRule rule={rule} {...shared} />;
    case 'ratio':
      return <RatioRule rule={rule} {...shared} />;
    case 'count':
      return <CountRule rule={rule} {...shared} />;
    case 'excludes':
      return <ExcludesRule rule={rule} {...shared} />;
    case 'flag':
      return <FlagRule rule={rule} {...shared} />;
  }
}

function whatIsMissing(rule: ShareRule): string | undefined {
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
