import { memo, useRef } from 'react';
import { missingInRule, type ShareRule, type WorkbookOrder } from '../../src';
import { Section } from '../parts/Section';
import { Select } from '../parts/Select';
import { useAnswer } from '../state/answerStore';
import { useWorkbook } from '../state/workbookStore';
import { sameButForLimits } from './butForLimits';
import { shareProblems } from './problemsAt';
import styles from './rules.module.css';
import { ShareRuleRow } from './ShareRuleRow';
import { editOrder } from './useOrder';

const NEW_RULES: Record<ShareRule['kind'], { label: string; rule: ShareRule }> = {
  share: { label: 'share of some stocks', rule: { kind: 'share', set: {} } },
  ratio: { label: 'ratio of some stocks to others', rule: { kind: 'ratio', set: {}, to: {} } },
  count: { label: 'number of stocks used', rule: { kind: 'count', set: {} } },
  'one of': { label: 'one of some stocks, at a share', rule: { kind: 'one of', set: {} } },
  excludes: { label: 'this stock not with those', rule: { kind: 'excludes', stockId: '', set: {} } },
  needs: { label: 'this stock only with those', rule: { kind: 'needs', stockId: '', set: {} } },
  flag: { label: 'flag that every stock carries', rule: { kind: 'flag', flag: '' } },
};

/** Rules of the mix beyond its properties. */
export const ShareRuleList = memo(function ShareRuleList({ order }: { order: WorkbookOrder }) {
  const workbook = useWorkbook((state) => state.workbook);
  const answer = useAnswer(order.id);
  const adding = useRef<HTMLDivElement>(null);

  function problemsOf(rule: ShareRule) {
    const missing = missingInRule(rule);
    return missing ? [missing] : shareProblems(answer, workbook, order, rule);
  }

  function remove(index: number) {
    // The button that was pressed goes with its rule: the focus must not fall off the page.
    adding.current?.querySelector('select')?.focus();
    editOrder(order.id, 'remove a rule', ({ shares }) => shares.splice(index, 1));
  }

  return (
    <Section title="Shares and other rules" level={3}>
      {order.shares.length === 0 && <p className={styles.empty}>No rules: any stocks in any shares.</p>}
      <ul className={styles.list}>
        {order.shares.map((rule, index) => (
          <ShareRuleRow
            // biome-ignore lint/suspicious/noArrayIndexKey: rules have no id, keep their order, and the count is in the key
            key={`${rule.kind} ${index} of ${order.shares.length}`}
            rule={rule}
            products={workbook.products}
            problems={problemsOf(rule)}
            onChange={(next) =>
              editOrder(order.id, 'change a rule', ({ shares }) => {
                shares[index] = next;
              })
            }
            onRemove={() => remove(index)}
          />
        ))}
      </ul>
      <div className={styles.add} ref={adding}>
        <Select
          label="Add a rule"
          hideLabel
          value=""
          placeholder="Add a rule on …"
          // The keys of the table above are the kinds of rule.
          options={Object.entries(NEW_RULES).map(([kind, { label }]) => ({ value: kind as ShareRule['kind'], label }))}
          onChange={(kind) => editOrder(order.id, 'add a rule', ({ shares }) => shares.push(NEW_RULES[kind].rule))}
        />
      </div>
    </Section>
  );
}, sameButForLimits);
