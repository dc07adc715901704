import type { ReactNode } from 'react';
import { ScrollRegion } from '../parts/ScrollRegion';
import styles from './AnswerPanel.module.css';

/** Something to be unfolded: the browser's own, known to every keyboard and screen reader. */
export function Disclosure({ title, open, children }: { title: string; open?: boolean; children: ReactNode }) {
  return (
    <details className={styles.disclosure} open={open}>
      <summary>{title}</summary>
      <ScrollRegion className={styles.folded} name={title}>
        {children}
      </ScrollRegion>
    </details>
  );
}
