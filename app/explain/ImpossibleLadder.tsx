import { memo } from 'react';
import { type BlendOutcome, demandInWords, type Ladder, type Order } from '../../src';
import { Conflict } from '../answer/Conflict';
import { List } from '../answer/LeftOutList';
import { Button } from '../parts/Button';
import { useExplained } from '../state/explainStore';
import { useWorkbook } from '../state/workbookStore';
import { costPer } from './costWords';
import styles from './Explain.module.css';
import { reachInWords, relaxationInWords, unfinishedInWords } from './ladderWords';
import { Told } from './Told';
import { tryRelaxation } from './tryRelaxation';

/** Why an order is impossible, what is within reach, and ways out; until that is told, what the proof leans on. */
export const ImpossibleLadder = memo(function ImpossibleLadder({
  orderId,
  order,
  outcome,
}: {
  orderId: string;
  order: Order;
  outcome: BlendOutcome;
}) {
  const { part, stale } = useExplained(orderId, 'impossible');
  const { proof } = outcome;
  if (proof.kind !== 'impossible' && proof.kind !== 'impossible with known figures') return null;
  return (
    <>
      {!part?.told && <Conflict order={order} outcome={outcome} />}
      <Told part={part} stale={stale} waiting="Working out what is within reach …">
        {(ladder, { order: explained }) => <Steps orderId={orderId} ladder={ladder} order={explained} stale={stale} />}
      </Told>
    </>
  );
});

interface StepsProps {
  orderId: string;
  ladder: Ladder;
  order: Order;
  stale: boolean;
}

function Steps({ orderId, ladder, order, stale }: StepsProps) {
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  const { conflict, conflictProven, noConflict, reach, relaxations } = ladder;
  const within = reach.map((one) => reachInWords(one, order, currency)).filter((words) => words !== undefined);
  const unfinished = unfinishedInWords(ladder);
  return (
    <>
      {noConflict && <List messages={noConflict.messages} />}
      {conflict.length > 0 && (
        <div>
          <h3>These cannot hold together</h3>
          <List messages={conflict.map((demand) => demandInWords(demand, order))} />
          <p className={styles.soft}>
            {conflictProven
              ? 'Without any one of them the others can: proven.'
              : 'Fewer of them may do: which ones is not proven.'}
          </p>
        </div>
      )}
      {conflict.length > 0 && (
        <div>
          <h3>Within reach, one at a time</h3>
          {within.length > 0 ? (
            <List messages={within} />
          ) : (
            <p>{unfinished ? 'Nothing found in the time.' : 'Moving one limit alone is not enough.'}</p>
          )}
        </div>
      )}
      {relaxations.length > 0 && <WaysOut orderId={orderId} ladder={ladder} order={order} stale={stale} />}
      {unfinished && <p className={styles.soft}>{unfinished}</p>}
    </>
  );
}

function WaysOut({ orderId, ladder, order, stale }: StepsProps) {
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  return (
    <div>
      <h3>Ways out, the smallest change first</h3>
      <ol className={styles.choices}>
        {ladder.relaxations.map((relaxation) => {
          const words = relaxationInWords(relaxation, order);
          return (
            <li key={words} className={styles.choice}>
              <p>
                {words}: <b>{costPer(relaxation.costPerTonne, currency)}</b>
                {!relaxation.proven && ' (not proven the smallest change)'}
              </p>
              <Button
                disabled={stale}
                aria-label={`Try it in a copy: ${words}`}
                onClick={() => tryRelaxation(orderId, order, relaxation, words)}
              >
                Try it in a copy
              </Button>
            </li>
          );
        })}
      </ol>
      <p className={styles.soft}>Changes are counted in the units their methods report in.</p>
    </div>
  );
}
