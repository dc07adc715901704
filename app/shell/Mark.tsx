import styles from './Header.module.css';

/** The mark of the program: two streams that become one oil, standing on a level. */
export function Mark() {
  return (
    <svg className={styles.mark} viewBox="0 0 32 32" aria-hidden="true" focusable="false">
      <path className={styles.markStream} d="M6 3c0 8 8 7 8 14v12h4V17c0-7 8-6 8-14h-5c0 5-3 6-5 9-2-3-5-4-5-9z" />
      <path className={styles.markLevel} d="M3 29h26" />
    </svg>
  );
}
