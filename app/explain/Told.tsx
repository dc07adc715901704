import type { ReactNode } from 'react';
import { classNames } from '../parts/classNames';
import { useLasting } from '../parts/useLasting';
import type { Part } from '../state/explainStore';
import styles from './Explain.module.css';

/** What was told of an answer: greyed while the answer is another one, with a word where there is nothing to show. */
export function Told<Value>({
  part,
  stale,
  due,
  waiting,
  children,
}: {
  part: Part<Value> | undefined;
  stale: boolean;
  due: boolean;
  /** Said until something is told. */
  waiting: string;
  children(value: Value, part: Part<Value>): ReactNode;
}) {
  const faded = useLasting(stale);
  return (
    <div aria-busy={due || undefined} className={classNames(styles.told, faded && styles.stale)}>
      {!part && <p className={styles.soft}>{waiting}</p>}
      {part?.message && <p className={styles.soft}>{part.message}</p>}
      {part?.told && children(part.told.value, part)}
    </div>
  );
}
