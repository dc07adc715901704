import type { Product, ShareRule } from '../../src';
import { RuleRow } from './RuleRow';
import { CountRule, ExcludesRule, FlagRule, NeedsRule, OneOfRule, RatioRule, ShareOfSetRule } from './ruleFields';

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
  return (
    <RuleRow problems={problems} removeLabel="Remove this rule" onRemove={onRemove}>
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
    case 'one of':
      return <OneOfRule rule={rule} {...shared} />;
    case 'excludes':
      return <ExcludesRule rule={rule} {...shared} />;
    case 'needs':
      return <NeedsRule rule={rule} {...shared} />;
    case 'flag':
      return <FlagRule rule={rule} {...shared} />;
  }
}
