import type { Caution } from '../../src';
import { Notice } from '../parts/Notice';
import styles from './AnswerPanel.module.css';

/** What the reader of the recipe must know; a trial blend that is called for stands out. */
export function Cautions({ cautions }: { cautions: readonly Caution[] }) {
  const trial = cautions.filter(({ kind }) => kind === 'trial blend');
  const others = cautions.filter(({ kind }) => kind !== 'trial blend');
  return (
    <>
      {trial.map(({ message }) => (
        <Notice key={message} tone="warn">
          <b>{message}</b>
        </Notice>
      ))}
      {others.length > 0 && (
        <ul className={styles.cautions}>
          {others.map(({ kind, message }) => (
            <li key={`${kind} ${message}`}>{message}</li>
          ))}
        </ul>
      )}
    </>
  );
}
