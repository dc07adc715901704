import { DoseList } from './DoseList';
import { KeptOut } from './KeptOut';
import { LaboratoryOnly } from './LaboratoryOnly';
import { LimitList } from './LimitList';
import styles from './OrderEditor.module.css';
import { OrderHeading } from './OrderHeading';
import { OrderSettings } from './OrderSettings';
import { ShareRuleList } from './ShareRuleList';
import { useOrder } from './useOrder';

/** The order on the sheet: what is asked for. */
export function OrderEditor({ orderId }: { orderId: string }) {
  const order = useOrder(orderId);
  if (!order) return null;
  return (
    <div className={styles.editor}>
      <OrderHeading order={order} />
      <OrderSettings order={order} />
      <LimitList order={order} />
      <DoseList order={order} />
      <ShareRuleList order={order} />
      <KeptOut order={order} />
      <LaboratoryOnly order={order} />
    </div>
  );
}
