import type { WorkbookOrder } from '../../src';
import { ImpossibleLadder } from '../explain/ImpossibleLadder';
import { SecondOpinion } from '../explain/SecondOpinion';
import { classNames } from '../parts/classNames';
import type { Answer } from '../state/answerStore';
import styles from './AnswerPanel.module.css';
import { LeftOutList, List } from './LeftOutList';
import type { ProofWords } from './proofInWords';
import { Recipe } from './Recipe';

/** An outcome: what is proven first, then the recipe or what stands in its way, then what was left out. */
export function AnswerBody({
  answer,
  proof,
  workbookOrder,
  currency,
}: {
  answer: Answer;
  proof: ProofWords;
  workbookOrder: WorkbookOrder;
  currency: string;
}) {
  const { outcome, order, omitted, unread, notes } = answer;
  if (!outcome || !order) return null;
  const { recipe, problems, leftOut } = outcome;
  return (
    <>
      <p className={classNames(styles.proof, styles[proof.tone])}>
        {proof.text}
        {recipe && <span className={styles.soft}> Passing is for the laboratory.</span>}
      </p>
      {problems.length > 0 && <List messages={problems.map(({ message }) => message)} />}
      {problems.length === 0 && <SecondOpinion orderId={workbookOrder.id} />}
      <ImpossibleLadder orderId={workbookOrder.id} order={order} outcome={outcome} />
      <Recipe
        orderId={workbookOrder.id}
        title={workbookOrder.name}
        proof={proof.text}
        order={order}
        outcome={outcome}
        omitted={omitted}
        laboratoryOnly={workbookOrder.laboratoryOnly}
        currency={currency}
      />
      <LeftOutList leftOut={leftOut} omitted={omitted} unread={unread} notes={notes} open={!recipe} />
    </>
  );
}
