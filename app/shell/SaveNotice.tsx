import { Button } from '../parts/Button';
import { Notice } from '../parts/Notice';
import { useCommands } from '../state/commands';
import { useSave } from '../state/saveStore';
import styles from './Header.module.css';

/** Said in full where the workbook is not safe, with the way out beside it. */
export function SaveNotice() {
  const { state, message, setAside } = useSave();
  const { exportWorkbook, exportSetAside } = useCommands();
  return (
    <>
      {message && (
        <Notice tone={state === 'saved' || state === 'saving' ? 'info' : 'bad'} live className={styles.notice}>
          <span>{message}</span>
          {state !== 'saved' && <Button onClick={() => exportWorkbook.run()}>{exportWorkbook.label}</Button>}
        </Notice>
      )}
      {setAside?.message && (
        <Notice tone="warn" live className={styles.notice}>
          <span>{setAside.message}</span>
          <Button onClick={() => exportSetAside.run()}>{exportSetAside.label}</Button>
        </Notice>
      )}
    </>
  );
}
