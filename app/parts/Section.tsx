import { type ReactNode, useId } from 'react';
import { classNames } from './classNames';
import styles from './Section.module.css';

export interface SectionProps {
  title: string;
  /** Heading level: 2 for a place on the page, 3 within one. */
  level?: 2 | 3;
  /** Buttons and short remarks to the right of the heading. */
  actions?: ReactNode;
  id?: string;
  className?: string;
  children: ReactNode;
}

/** A titled part of the sheet. */
export function Section({ title, level = 2, actions, id, className, children }: SectionProps) {
  const headingId = useId();
  const Heading = level === 2 ? 'h2' : 'h3';
  return (
    <section id={id} aria-labelledby={headingId} className={classNames(styles.section, className)}>
      <div className={styles.head}>
        <Heading id={headingId} className={styles.title}>
          {title}
        </Heading>
        {actions && <div className={styles.actions}>{actions}</div>}
      </div>
      {children}
    </section>
  );
}
