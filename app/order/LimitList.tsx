import { useState } from 'react';
import type { WorkbookOrder } from '../../src';
import { Section } from '../parts/Section';
import { useAnswer } from '../state/answerStore';
import { AddLimit } from './AddLimit';
import { GradePreset } from './GradePreset';
import styles from './LimitList.module.css';
import { LimitRow } from './LimitRow';
import { useLimitKeys } from './useLimitKeys';

/** The limits of an order, one rail each. */
export function LimitList({ order }: { order: WorkbookOrder }) {
  const answer = useAnswer(order.id);
  const [added, setAdded] = useState<number>();
  const keys = useLimitKeys(order.limits);
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
            isNew={added === index}
          />
        ))}
      </ul>
      <AddLimit order={order} onAdded={() => setAdded(order.limits.length)} />
    </Section>
  );
}
