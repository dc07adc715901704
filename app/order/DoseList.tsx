import { memo } from 'react';
import type { Dose, WorkbookOrder } from '../../src';
import { Section } from '../parts/Section';
import { Select } from '../parts/Select';
import { useAnswer } from '../state/answerStore';
import { sameButForLimits } from './butForLimits';
import { DoseRow } from './DoseRow';
import { batchTonnesOf } from './doseUnit';
import { doseProblems } from './problemsAt';
import styles from './rules.module.css';
import { editOrder, useProducts } from './useOrder';

/** What is dosed by order, not by cost: packages at their treat rate, a depressant, a stock to be used up. */
export const DoseList = memo(function DoseList({ order }: { order: WorkbookOrder }) {
  const products = useProducts();
  const answer = useAnswer(order.id);
  const nameOf = (id: string) => products.find((product) => product.id === id)?.name ?? id;
  const free = products.filter(({ id }) => !order.doses.some(({ stockId }) => stockId === id));

  function add(stockId: string) {
    editOrder(order.id, `add a dose of ${nameOf(stockId)}`, ({ doses }) => doses.push({ stockId }));
  }

  return (
    <Section title="Doses" level={3}>
      {order.doses.length === 0 && (
        <p className={styles.empty}>Nothing is dosed: every stock is taken by cost alone.</p>
      )}
      <ul className={styles.list}>
        {order.doses.map((dose, index) => (
          <DoseRow
            key={dose.stockId}
            dose={dose}
            name={nameOf(dose.stockId)}
            batch={batchTonnesOf(order)}
            known={products.some(({ id }) => id === dose.stockId)}
            problems={doseProblems(answer, dose)}
            onChange={(next: Dose) =>
              editOrder(order.id, `change the dose of ${nameOf(dose.stockId)}`, ({ doses }) => {
                doses[index] = next;
              })
            }
            onRemove={() =>
              editOrder(order.id, `remove the dose of ${nameOf(dose.stockId)}`, ({ doses }) => doses.splice(index, 1))
            }
          />
        ))}
      </ul>
      {free.length > 0 && (
        <div className={styles.add}>
          <Select
            label="Add a dose"
            hideLabel
            value=""
            placeholder="Add a dose of …"
            options={free.map(({ id, name }) => ({ value: id, label: name }))}
            onChange={add}
          />
        </div>
      )}
    </Section>
  );
}, sameButForLimits);
