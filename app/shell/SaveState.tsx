import { Icon } from '../parts/Icon';
import { useSave } from '../state/saveStore';
import styles from './Header.module.css';

const WORDS = { saved: 'Saved on this computer', saving: 'Saving …', failed: 'Not saved', unavailable: 'Not saved' };

/** Whether the workbook is safe, in a few words; the reason and the way out stand in a notice below the header. */
export function SaveState() {
  const { state, unguarded } = useSave();
  const bad = state === 'failed' || state === 'unavailable';
  return (
    <span className={bad ? styles.saveBad : styles.save}>
      {bad && <Icon name="error" />}
      {WORDS[state]}
      {!bad && unguarded && '; keep it open in one tab only: two tabs are not guarded here'}
    </span>
  );
}
