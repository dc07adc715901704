import type { ReactNode } from 'react';
import styles from './AnswerPanel.module.css';

/** Something to be unfolded: the browser's own, known to every keyboard and screen reader. */
export function Disclosure({ title, open, children }: { title: ReactNode; open?: boolean; children: ReactNode }) {
  return (
    <details className={styles.disclosure} open={open}>
      <summary>{title}</summary>
      <div className={styles.folded}>{children}</div>
    </details>
  );
}
