import { IconButton } from '../parts/IconButton';
import { Notice } from '../parts/Notice';
import { tell, useView } from '../state/viewStore';
import styles from './MessageLine.module.css';

/** What was told in passing ("Workbook exported …"), until the next message or until it is put away. */
export function MessageLine() {
  const message = useView((view) => view.message);
  // The place is there before its text: only then do screen readers read the text out.
  return (
    <div role="status" className={styles.line}>
      {message !== '' && (
        <Notice>
          <span>{message}</span>
          <IconButton icon="remove" label="Hide this message" onClick={() => tell('')} />
        </Notice>
      )}
    </div>
  );
}
