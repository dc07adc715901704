import { useWorkbook } from '../state/workbookStore';
import styles from './Header.module.css';

export const PURPOSE =
  "Finds the cheapest blend of your base stocks that meets an order's limits, and proves it. Nothing leaves this computer.";

/** What the program is for, where nobody has put own figures in yet. */
export function Purpose() {
  const isNew = useWorkbook(({ workbook }) => workbook.products.length === 0 || workbook.invented);
  return isNew ? <p className={styles.purpose}>{PURPOSE}</p> : null;
}
