import type { WorkbookOrder } from '../../src';
import { Button } from '../parts/Button';
import { classNames } from '../parts/classNames';
import { IconButton } from '../parts/IconButton';
import { Section } from '../parts/Section';
import { Select } from '../parts/Select';
import { useLasting } from '../parts/useLasting';
import { useAnswer } from '../state/answerStore';
import { type Command, useCommands } from '../state/commands';
import { selectOrder } from '../state/viewStore';
import { useWorkbook } from '../state/workbookStore';
import { answerInWords } from './answerInWords';
import styles from './OrderList.module.css';

/** The orders of the workbook with their state; a select where the page is narrow. */
export function OrderList({ orderId }: { orderId: string | undefined }) {
  const orders = useWorkbook(({ workbook }) => workbook.orders);
  const commands = useCommands();
  return (
    <Section
      id="orders"
      title="Orders"
      className={styles.section}
      actions={
        <>
          <Button icon="add" disabled={!commands.newOrder.enabled()} onClick={() => commands.newOrder.run()}>
            New
          </Button>
          <CommandIcon icon="copy" command={commands.duplicateOrder} />
          <CommandIcon icon="bin" command={commands.deleteOrder} />
        </>
      }
    >
      {orders.length === 0 && <p className={styles.none}>No orders yet. “New” starts one.</p>}
      <ul className={styles.list}>
        {orders.map((order) => (
          <OrderItem key={order.id} order={order} selected={order.id === orderId} />
        ))}
      </ul>
      {orders.length > 0 && (
        <div className={styles.select}>
          <Select
            label="Order on the page"
            hideLabel
            value={orderId ?? ''}
            options={orders.map(({ id, name }) => ({ value: id, label: name }))}
            onChange={selectOrder}
          />
        </div>
      )}
    </Section>
  );
}

function CommandIcon({ icon, command }: { icon: 'copy' | 'bin'; command: Command }) {
  return <IconButton icon={icon} label={command.label} disabled={!command.enabled()} onClick={() => command.run()} />;
}

function OrderItem({ order, selected }: { order: WorkbookOrder; selected: boolean }) {
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  const answer = useAnswer(order.id);
  const short = answerInWords(answer, order, currency);
  const faded = useLasting(answer.stale);
  return (
    <li>
      <button
        type="button"
        className={classNames(styles.item, selected && styles.selected)}
        aria-current={selected ? 'true' : undefined}
        onClick={() => selectOrder(order.id)}
      >
        <span className={styles.name}>{order.name}</span>
        <span className={classNames(styles.answer, styles[short.tone], faded && styles.stale)}>
          {short.text}
          {short.remark && <span className={styles.remark}> {short.remark}</span>}
        </span>
      </button>
    </li>
  );
}
