import { memo } from 'react';
import { classNames } from '../parts/classNames';
import { formatMoney } from '../parts/money';
import { Notice } from '../parts/Notice';
import { Section } from '../parts/Section';
import { type Answer, useAnswer, useDelay500 } from '../state/answerStore';
import { useWorkbook } from '../state/workbookStore';
import styles from './AnswerPanel.module.css';
import { Conflict } from './Conflict';
import { LeftOutList, List } from './LeftOutList';
import { Progress } from './Progress';
import { type ProofWords, proofInWords } from './proofInWords';
import { Recipe } from './Recipe';
import { useSettledAnnouncement } from './useSettledAnnouncement';

/** The answer to an order: what is proven, the recipe, its properties, and what was left out. */
export function AnswerPanel({ orderId }: { orderId: string }) {
  const answer = useAnswer(orderId);
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  const laboratoryOnly = useWorkbook(
    ({ workbook }) => workbook.orders.find(({ id }) => id === orderId)?.laboratoryOnly,
  );
  const slow = useDelay500(answer);
  const proof = answer.outcome && proofInWords(answer.outcome, answer.order);
  useSettledAnnouncement(answer, settledWords(answer, proof, currency));
  const solving = answer.phase === 'solving';
  const measure = answer.order?.costBasis === 'cubic metre' ? 'per m³' : 'per tonne';
  return (
    <Section
      title="Answer"
      actions={
        answer.stale &&
        answer.outcome && <span className={styles.again}>{solving ? 'recomputing …' : 'out of date'}</span>
      }
    >
      {slow && <Progress progress={answer.progress} currency={currency} measure={measure} />}
      {answer.phase === 'failed' && (
        <Notice tone="bad" live>
          {answer.message ?? 'The search failed.'}
        </Notice>
      )}
      {answer.phase !== 'failed' && answer.message && <Notice>{answer.message}</Notice>}
      {!answer.outcome && answer.phase !== 'failed' && (
        <p className={styles.soft}>{solving ? 'Working out the cheapest mix …' : 'Not worked out yet.'}</p>
      )}
      {proof && (
        <div className={classNames(styles.body, answer.stale && styles.stale)} aria-busy={solving || undefined}>
          <Body answer={answer} proof={proof} currency={currency} laboratoryOnly={laboratoryOnly ?? NONE} />
        </div>
      )}
    </Section>
  );
}

const NONE: readonly string[] = [];

const Body = memo(function Body({
  answer,
  proof,
  currency,
  laboratoryOnly,
}: {
  answer: Answer;
  proof: ProofWords;
  currency: string;
  laboratoryOnly: readonly string[];
}) {
  const { outcome, order } = answer;
  if (!outcome || !order) return null;
  const { recipe } = outcome;
  return (
    <>
      <p className={classNames(styles.proof, styles[proof.tone])}>
        {proof.text}
        {recipe && <span className={styles.soft}> Passing is for the laboratory.</span>}
      </p>
      {outcome.problems.length > 0 && <List messages={outcome.problems.map(({ message }) => message)} />}
      <Conflict order={order} outcome={outcome} />
      {recipe && (
        <Recipe order={order} outcome={{ ...outcome, recipe }} laboratoryOnly={laboratoryOnly} currency={currency} />
      )}
      <LeftOutList
        leftOut={outcome.leftOut}
        omitted={answer.omitted}
        unread={answer.unread}
        notes={answer.notes}
        open={!recipe}
      />
    </>
  );
});

/** The answer in a sentence, for those who hear it. */
function settledWords({ outcome }: Answer, proof: ProofWords | undefined, currency: string): string | undefined {
  if (!outcome || !proof) return undefined;
  if (!outcome.recipe || outcome.costPerTonne === undefined) return proof.text;
  return `New recipe: ${formatMoney(outcome.costPerTonne, currency)} per tonne. ${proof.text}`;
}
