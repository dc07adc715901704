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
  const perTonne = { amount: formatMoney(costPerTonne, currency), unit: 'per tonne' };
  const perCubicMetre = costPerCubicMetre !== undefined && {
    amount: formatMoney(costPerCubicMetre, currency),
    unit: 'per m³ at 15 °C',
  };
  const byVolume = order.costBasis === 'cubic metre' && perCubicMetre;
  const main = byVolume || perTonne;
  const second = byVolume ? perTonne : perCubicMetre;
  return (
    <div className={styles.cost}>
      <p className={styles.mainCost}>
        {main.amount} <span className={styles.costUnit}>{main.unit}</span>
      </p>
      <p className={styles.soft}>
        {second ? `${second.amount} ${second.unit}` : 'per m³ unknown: a density is missing'}
        {batch.given && ` · ${formatMoney((costPerTonne * batch.kilograms) / 1000, currency, 0)} ${batch.words}`}
      </p>
    </div>
  );
}
