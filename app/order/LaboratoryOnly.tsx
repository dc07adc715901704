import { memo } from 'react';
import type { WorkbookOrder } from '../../src';
import { IconButton } from '../parts/IconButton';
import { Section } from '../parts/Section';
import { sameButForLimits } from './butForLimits';
import { NewEntry } from './NewEntry';
import styles from './rules.module.css';
import { editOrder } from './useOrder';

/** Tests that no calculation stands for; they belong to the acceptance of the batch. */
export const LaboratoryOnly = memo(function LaboratoryOnly({ order }: { order: WorkbookOrder }) {
  function add(test: string) {
    editOrder(order.id, 'add a laboratory test', ({ laboratoryOnly }) => laboratoryOnly.push(test));
  }
  return (
    <Section title="Laboratory only" level={3}>
      <p className={styles.empty}>Not predicted here, so no limit is set on them: the laboratory decides.</p>
      <div className={styles.set}>
        {order.laboratoryOnly.map((test) => (
          <span key={test} className={styles.chip}>
            {test}
            <IconButton
              icon="remove"
              label={`Remove ${test}`}
              onClick={() =>
                editOrder(order.id, 'remove a laboratory test', (draft) => {
                  draft.laboratoryOnly = draft.laboratoryOnly.filter((name) => name !== test);
                })
              }
            />
          </span>
        ))}
        <NewEntry label="Add a laboratory test" placeholder="add a test …" taken={order.laboratoryOnly} onAdd={add} />
      </div>
    </Section>
  );
}, sameButForLimits);
