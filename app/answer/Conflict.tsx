import { type BlendOutcome, type Order, propertyDefinition, VI_DEFINITION } from '../../src';
import { limitName, rangeInWords } from '../parts/limitWords';
import styles from './AnswerPanel.module.css';
import { List } from './LeftOutList';

/** The limits and rules that the proof of impossibility leans on. */
export function conflictInWords(order: Order, { conflict = [], conflictRules = [] }: BlendOutcome): string[] {
  const limits = conflict.flatMap((place) => {
    const limit = order.limits[place];
    if (!limit) return [];
    const definition =
      limit.property === 'vi' ? VI_DEFINITION : propertyDefinition(limit.property, order.ownProperties);
    return definition ? [`${limitName(limit, order.ownProperties)}: ${rangeInWords(limit, definition)}`] : [];
  });
  return [...limits, ...conflictRules];
}

export function Conflict({ order, outcome }: { order: Order; outcome: BlendOutcome }) {
  const words = conflictInWords(order, outcome);
  if (words.length === 0) return null;
  return (
    <div className={styles.conflict}>
      <h3>In the way, taken together</h3>
      <List messages={words} />
      <p className={styles.soft}>Ease one of these, or allow other stocks.</p>
    </div>
  );
}
