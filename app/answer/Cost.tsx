import type { BlendOutcome, Order } from '../../src';
import { formatMoney } from '../parts/money';
import styles from './AnswerPanel.module.css';
import { costInWords } from './costInWords';
import type { Batch } from './recipeRows';

/** What the mix costs: per tonne, per m³, and the batch. The figure the order minimises comes first. */
export function Cost({
  outcome,
  order,
  batch,
  currency,
}: {
  outcome: BlendOutcome;
  order: Order;
  batch: Batch;
  currency: string;
}) {
  const words = costInWords(outcome, order, currency);
  if (!words) return null;
  const ofBatch = ((outcome.costPerTonne ?? 0) * batch.kilograms) / 1000;
  return (
    <div className={styles.cost}>
      <p className={styles.mainCost}>
        {words.main} <span className={styles.costUnit}>{words.mainUnit}</span>
      </p>
      <p className={styles.soft}>
        {words.second}
        {batch.given && ` · ${formatMoney(ofBatch, currency, 0)} ${batch.words}`}
      </p>
    </div>
  );
}
