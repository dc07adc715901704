import type { LeftOut, OmittedProduct, UnreadCell } from '../../src';
import styles from './AnswerPanel.module.css';
import { Disclosure } from './Disclosure';

/** Stocks the search could not use, each with its reason and what to do; and cells that could not be read. */
export function LeftOutList({
  leftOut,
  omitted,
  unread,
  notes,
  open,
}: {
  leftOut: readonly LeftOut[];
  omitted: readonly OmittedProduct[];
  unread: readonly UnreadCell[];
  notes: readonly string[];
  open?: boolean;
}) {
  const messages = [...omitted.map(({ message }) => message), ...leftOut.map(({ message }) => message)];
  const names = new Set([...omitted.map(({ name }) => name), ...leftOut.map(({ name }) => name)]);
  return (
    <>
      {messages.length > 0 && (
        <Disclosure title={names.size === 1 ? 'One stock left out' : `${names.size} stocks left out`} open={open}>
          <List messages={messages} />
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
