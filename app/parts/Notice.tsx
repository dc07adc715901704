import type { ReactNode } from 'react';
import { classNames } from './classNames';
import { Icon, type IconName } from './Icon';
import styles from './Notice.module.css';

const ICONS: Record<NoticeTone, IconName> = { info: 'info', good: 'check', warn: 'warning', bad: 'error' };

export type NoticeTone = 'info' | 'good' | 'warn' | 'bad';

/** A message beside the thing it speaks of. `bad` is announced at once, the others politely if `live`. */
export function Notice({
  tone = 'info',
  live,
  id,
  className,
  children,
}: {
  tone?: NoticeTone;
  live?: boolean;
  id?: string;
  className?: string;
  children: ReactNode;
}) {
  const role = live ? (tone === 'bad' ? 'alert' : 'status') : undefined;
  return (
    <div id={id} role={role} className={classNames(styles.notice, styles[tone], className)}>
      <Icon name={ICONS[tone]} />
      <div className={styles.text}>{children}</div>
    </div>
  );
}
