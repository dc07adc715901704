import type { BlendOutcome, Order } from '../../src';
import { formatMoney } from '../parts/money';
import styles from './AnswerPanel.module.css';
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
  const { costPerTonne, costPerCubicMetre } = outcome;
  if (costPerTonne === undefined) return null;
  const perTonne = `${formatMoney(costPerTonne, currency)} per tonne`;
  const perCubicMetre =
    costPerCubicMetre === undefined
      ? 'per m³ unknown: a density is missing'
      : `${formatMoney(costPerCubicMetre, currency)} per m³ at 15 °C`;
  const byVolume = order.costBasis === 'cubic metre' && costPerCubicMetre !== undefined;
  const [main, second] = byVolume ? [perCubicMetre, perTonne] : [perTonne, perCubicMetre];
  const [amount, ...unit] = main.split(' per ');
  return (
    <div className={styles.cost}>
      <p className={styles.mainCost}>
        {amount} <span className={styles.costUnit}>per {unit.join(' per ')}</span>
      </p>
      <p className={styles.soft}>
        {second}
        {batch.given && ` · ${formatMoney((costPerTonne * batch.kilograms) / 1000, currency, 0)} ${batch.words}`}
      </p>
    </div>
  );
}
