import { useState } from 'react';
import type { Limit, WorkbookOrder } from '../../src';
import { Section } from '../parts/Section';
import { useAnswer } from '../state/answerStore';
import { AddLimit } from './AddLimit';
import { GradePreset } from './GradePreset';
import styles from './LimitList.module.css';
import { LimitRow } from './LimitRow';

/** The limits of an order, one rail each. */
export function LimitList({ order }: { order: WorkbookOrder }) {
  const answer = useAnswer(order.id);
  const [added, setAdded] = useState<string>();
  const keys = rowKeys(order.limits);
  return (
    <Section title="Limits" level={3} actions={<GradePreset order={order} />}>
      {order.limits.length === 0 && (
        <p className={styles.empty}>No limits yet: cost alone decides. Add a limit, or set them from a grade.</p>
      )}
      <ul className={styles.list}>
        {order.limits.map((limit, index) => (
          <LimitRow
            key={keys[index]}
            orderId={order.id}
            limit={limit}
            index={index}
            answer={answer}
            isNew={added === keys[index]}
          />
        ))}
      </ul>
      <AddLimit order={order} onAdded={(limit) => setAdded(rowKeys([...order.limits, limit]).at(-1))} />
    </Section>
  );
}

/** A limit has no id of its own: its property and temperature, counted where they come twice. */
function rowKeys(limits: readonly Limit[]): string[] {
  const seen = new Map<string, number>();
  return limits.map(({ property, celsius }) => {
    const name = `${property}@${celsius ?? ''}`;
    const count = seen.get(name) ?? 0;
    seen.set(name, count + 1);
    return `${name}#${count}`;
  });
}
