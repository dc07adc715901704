import type { ReactNode } from 'react';
import { IconButton } from '../parts/IconButton';
import styles from './rules.module.css';

/** One dose or rule: its fields on a line that may wrap, a way to take it out, and what is wrong with it. */
export function RuleRow({
  problems,
  removeLabel,
  onRemove,
  children,
}: {
  problems: readonly string[];
  removeLabel: string;
  onRemove(): void;
  children: ReactNode;
}) {
  return (
    <li className={styles.row}>
      <div className={styles.line}>{children}</div>
      <IconButton icon="remove" label={removeLabel} onClick={onRemove} />
      {problems.length > 0 && (
        <p className={styles.problem} role="status">
          {problems.join(' ')}
        </p>
      )}
    </li>
  );
}
