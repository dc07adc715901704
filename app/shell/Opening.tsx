import styles from './Header.module.css';
import { Mark } from './Mark';

/** The head of the page while the browser's storage is being opened. */
export function Opening() {
  return (
    <header className={styles.header}>
      <h1 className={styles.brand}>
        <Mark />
        Basewright
      </h1>
      <span role="status" className={styles.save}>
        Opening the workbook …
      </span>
    </header>
  );
}
