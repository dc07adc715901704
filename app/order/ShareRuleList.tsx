import type { ShareRule, WorkbookOrder } from '../../src';
import { Section } from '../parts/Section';
import { Select } from '../parts/Select';
import { useAnswer } from '../state/answerStore';
import { shareProblems } from './problemsAt';
import styles from './rules.module.css';
import { ShareRuleRow } from './ShareRuleRow';
import {
  addUnfinished,
  changeUnfinished,
  removeUnfinished,
  type UnfinishedRule,
  useUnfinishedRules,
  whatIsMissing,
} from './unfinishedRules';
import { editOrder, useProducts } from './useOrder';

const NEW_RULES: Record<ShareRule['kind'], { label: string; rule: ShareRule }> = {
  share: { label: 'share of some stocks', rule: { kind: 'share', set: {} } },
  ratio: { label: 'ratio of some stocks to others', rule: { kind: 'ratio', set: {}, to: {} } },
  count: { label: 'number of stocks used', rule: { kind: 'count', set: {} } },
  excludes: { label: 'this stock not with those', rule: { kind: 'excludes', stockId: '', set: {} } },
  flag: { label: 'flag that every stock carries', rule: { kind: 'flag', flag: '' } },
};

const NONE: readonly UnfinishedRule[] = [];

/** Rules of the mix beyond its properties. */
export function ShareRuleList({ order }: { order: WorkbookOrder }) {
  const products = useProducts();
  const answer = useAnswer(order.id);
  const unfinished = useUnfinishedRules(({ byOrder }) => byOrder[order.id] ?? NONE);
  return (
    <Section title="Shares and other rules" level={3}>
      {order.shares.length + unfinished.length === 0 && (
        <p className={styles.empty}>No rules: any stocks in any shares.</p>
      )}
      <ul className={styles.list}>
        {order.shares.map((rule, index) => (
          <ShareRuleRow
            // biome-ignore lint/suspicious/noArrayIndexKey: rules have no id, keep their order, and the count is in the key
            key={`${rule.kind} ${index} of ${order.shares.length}`}
            rule={rule}
            products={products}
            problems={shareProblems(answer, index, rule.kind)}
            onChange={(next) => changeRule(order.id, index, next)}
            onRemove={() => takeOut(order.id, index)}
          />
        ))}
        {unfinished.map(({ key, rule }) => (
          <ShareRuleRow
            key={`unfinished ${key}`}
            rule={rule}
            products={products}
            problems={[whatIsMissing(rule) ?? '']}
            onChange={(next) => changeWaiting(order.id, key, next)}
            onRemove={() => removeUnfinished(order.id, key)}
          />
        ))}
      </ul>
      <div className={styles.add}>
        <Select
          label="Add a rule"
          hideLabel
          value=""
          placeholder="Add a rule on …"
          // The keys of the table above are the kinds of rule.
          options={Object.entries(NEW_RULES).map(([kind, { label }]) => ({ value: kind as ShareRule['kind'], label }))}
          onChange={(kind) => addUnfinished(order.id, NEW_RULES[kind].rule)}
        />
      </div>
    </Section>
  );
}

function takeOut(orderId: string, index: number): void {
  editOrder(orderId, 'remove a rule', ({ shares }) => shares.splice(index, 1));
}

/** Changes a rule of the order; one that no longer says enough waits outside it. */
function changeRule(orderId: string, index: number, next: ShareRule): void {
  if (whatIsMissing(next)) {
    takeOut(orderId, index);
    addUnfinished(orderId, next);
    return;
  }
  editOrder(orderId, 'change a rule', ({ shares }) => {
    shares[index] = next;
  });
}

/** Changes a waiting rule; a whole one enters the order. */
function changeWaiting(orderId: string, key: number, next: ShareRule): void {
  if (whatIsMissing(next)) {
    changeUnfinished(orderId, key, next);
    return;
  }
  removeUnfinished(orderId, key);
  editOrder(orderId, 'add a rule', ({ shares }) => shares.push(next));
}
