import { classNames } from '../parts/classNames';
import { Notice } from '../parts/Notice';
import { Section } from '../parts/Section';
import { useLasting } from '../parts/useLasting';
import { type Answer, useAnswer, useDelay500 } from '../state/answerStore';
import { useWorkbook } from '../state/workbookStore';
import { AnswerBody } from './AnswerBody';
import styles from './AnswerPanel.module.css';
import { costInWords } from './costInWords';
import { Progress } from './Progress';
import { type ProofWords, proofInWords } from './proofInWords';
import { useSettledAnnouncement } from './useSettledAnnouncement';

/** The answer to an order: what is proven, the recipe, its properties, and what was left out. */
export function AnswerPanel({ orderId }: { orderId: string }) {
  const answer = useAnswer(orderId);
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  const workbookOrder = useWorkbook(({ workbook }) => workbook.orders.find(({ id }) => id === orderId));
  const slow = useDelay500(answer);
  const faded = useLasting(answer.stale);
  const { outcome, order } = answer;
  const proof = outcome && order && proofInWords(outcome, order, answer);
  useSettledAnnouncement(answer, settledWords(answer, proof, currency));
  if (!workbookOrder) return null;
  const solving = answer.phase === 'solving';
  const outdated = faded && answer.outcome;
  return (
    <div aria-busy={solving || undefined}>
      <Section
        title="Answer"
        actions={outdated && <span className={styles.again}>{solving ? 'recomputing …' : 'out of date'}</span>}
      >
        {slow && <Progress progress={answer.progress} currency={currency} order={workbookOrder} />}
        <Message answer={answer} />
        {proof && (
          <div className={classNames(styles.body, faded && styles.stale)}>
            <AnswerBody answer={answer} proof={proof} workbookOrder={workbookOrder} currency={currency} />
          </div>
        )}
      </Section>
    </div>
  );
}

/** What the solver says beside its outcome, or in place of one. */
function Message({ answer: { phase, outcome, message } }: { answer: Answer }) {
  if (phase === 'failed') {
    return (
      <Notice tone="bad" live>
        {message ?? 'The search failed.'}
      </Notice>
    );
  }
  if (message) return <Notice>{message}</Notice>;
  if (outcome) return null;
  return (
    <p className={styles.soft}>{phase === 'solving' ? 'Working out the cheapest mix …' : 'Not worked out yet.'}</p>
  );
}

/** The answer in a sentence, for those who hear it. */
function settledWords({ outcome, order }: Answer, proof: ProofWords | undefined, currency: string): string | undefined {
  if (!outcome || !order || !proof) return undefined;
  const cost = outcome.recipe && costInWords(outcome, order, currency);
  return cost ? `New recipe: ${cost.main} ${cost.mainUnit}. ${proof.text}` : proof.text;
}
