import { Button } from '../parts/Button';
import { Section } from '../parts/Section';
import { useCommands } from '../state/commands';
import styles from './App.module.css';

/** What stands in the answer's place while there is no order to answer, and how to come by one. */
export function NoOrder() {
  const { newOrder, openDemo } = useCommands();
  return (
    <Section title="Answer">
      <p className={styles.nothing}>No order yet: the cheapest blend for an order stands here.</p>
      <p className={styles.ways}>
        <Button icon="add" onClick={() => newOrder.run()}>
          {newOrder.label}
        </Button>
        <Button icon="book" onClick={() => openDemo.run()}>
          {openDemo.label}
        </Button>
      </p>
    </Section>
  );
}
