import type { LeftOut, OmittedProduct, UnreadCell } from '../../src';
import styles from './AnswerPanel.module.css';
import { Disclosure } from './Disclosure';
import { leftOutCount } from './leftOut';

/** Stocks the search could not use, each with its reason and what to do; and cells that could not be read. */
export function LeftOutList({
  leftOut,
  omitted,
  unread,
  notes,
  open,
}: {
  leftOut: LeftOut[];
  omitted: OmittedProduct[];
  unread: UnreadCell[];
  notes: readonly string[];
  open?: boolean;
}) {
  const ruledOut = leftOut.filter(({ reason }) => reason === 'missing flag');
  const unknown = leftOut.filter(({ reason }) => reason !== 'missing flag');
  const count = leftOutCount({ leftOut }, { omitted, unread });
  return (
    <>
      {count > 0 && (
        <Disclosure title={count === 1 ? 'One stock left out' : `${count} stocks left out`} open={open}>
          <List messages={[...omitted, ...unknown].map(({ message }) => message)} />
        </Disclosure>
      )}
      {ruledOut.length > 0 && (
        <Disclosure title="Stocks that do not carry the flag asked for" open={open}>
          <List messages={ruledOut.map(({ message }) => message)} />
        </Disclosure>
      )}
      {unread.length > 0 && (
        <Disclosure
          title={
            unread.length === 1 ? 'One cell of the stocks not read' : `${unread.length} cells of the stocks not read`
          }
        >
          <List messages={unread.map(({ message }) => message)} />
        </Disclosure>
      )}
      {notes.length > 0 && (
        <Disclosure title="How the order was read">
          <List messages={notes} />
        </Disclosure>
      )}
    </>
  );
}

export function List({ messages }: { messages: readonly string[] }) {
  return (
    <ul className={styles.list}>
      {[...new Set(messages)].map((message) => (
        <li key={message}>{message}</li>
      ))}
    </ul>
  );
}
