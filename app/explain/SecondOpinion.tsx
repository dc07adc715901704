import { memo } from 'react';
import { Button } from '../parts/Button';
import { classNames } from '../parts/classNames';
import { askSecondOpinion } from '../state/explaining';
import { useExplained } from '../state/explainStore';
import { useWorkbook } from '../state/workbookStore';
import styles from './Explain.module.css';
import { opinionInWords } from './opinionWords';

/** A command that has the order solved by the second engine too, and what that engine says. */
export const SecondOpinion = memo(function SecondOpinion({ orderId }: { orderId: string }) {
  const { part, stale } = useExplained(orderId, 'opinion');
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  const asking = part !== undefined && !part.told && !stale;
  const told = part?.told && !stale ? opinionInWords(part.told.value, part.outcome, part.order, currency) : undefined;
  return (
    <div className={styles.row}>
      <Button disabled={asking} onClick={askSecondOpinion}>
        Second opinion
      </Button>
      <span role="status" className={classNames(styles.opinion, told && styles[told.tone])}>
        {asking ? 'The second engine is solving it …' : told?.text}
      </span>
    </div>
  );
});
