import { classNames } from '../parts/classNames';
import { useLasting } from '../parts/useLasting';
import { useAnswer } from '../state/answerStore';
import { useWorkbook } from '../state/workbookStore';
import styles from './AnswerBar.module.css';
import { answerInWords } from './answerInWords';

/** The answer in a few words at the foot of a phone, so that it stays in sight while the order is edited. */
export function AnswerBar({ orderId }: { orderId: string | undefined }) {
  const order = useWorkbook(({ workbook }) => workbook.orders.find(({ id }) => id === orderId));
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  const answer = useAnswer(orderId);
  const faded = useLasting(answer.stale);
  if (!order) return null;
  const short = answerInWords(answer, order, currency);
  return (
    <a href="#answer" className={classNames(styles.bar, faded && styles.stale)}>
      <span className="visually-hidden">To the answer:</span>
      <span className={classNames(styles.text, styles[short.tone])}>{short.text}</span>
      <span className={styles.remarks}>
        <span className={styles.remark} aria-hidden={short.stale}>
          {short.remark}
        </span>
        {faded && <span>being worked out again</span>}
      </span>
    </a>
  );
}
