import { IconButton } from '../parts/IconButton';
import { Notice } from '../parts/Notice';
import type { Imported } from '../state/workbookFile';
import styles from './Header.module.css';

/** How an import went: refused with the reason, or what had to be put right on the way. */
export function ImportNotice({
  result,
  onHide,
}: {
  result: (Imported & { fileName: string }) | undefined;
  onHide(): void;
}) {
  if (!result) return null;
  return (
    <Notice tone={result.ok ? 'good' : 'bad'} live className={styles.notice}>
      <span>
        {result.ok
          ? `${result.fileName} imported. ${result.notes.join(' ')} Undo brings the former workbook back.`
          : `${result.fileName} was not imported; the workbook on the page is as it was. ${result.message}`}
      </span>
      <IconButton icon="remove" label="Hide this message" onClick={onHide} />
    </Notice>
  );
}
