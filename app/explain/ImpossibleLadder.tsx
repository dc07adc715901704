import { memo } from 'react';
import { type BlendOutcome, demandInWords, type Ladder, type Order, type Relaxation } from '../../src';
import { Conflict } from '../answer/Conflict';
import { List } from '../answer/LeftOutList';
import { Button } from '../parts/Button';
import { useExplained } from '../state/explainStore';
import { useWorkbook } from '../state/workbookStore';
import { costPer } from './costWords';
import styles from './Explain.module.css';
import { relaxationInWords, unfinishedInWords } from './ladderWords';
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
  const { part, stale, due } = useExplained(orderId, 'impossible');
  const { proof } = outcome;
  if (proof.kind !== 'impossible' && proof.kind !== 'impossible with known figures') return null;
  return (
    <>
      {!part?.told && <Conflict order={order} outcome={outcome} />}
      <Told part={part} stale={stale} due={due} waiting="Working out what is within reach …">
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
  const { conflict, conflictProven, noConflict, relaxations } = ladder;
  const unfinished = unfinishedInWords(ladder);
  const alone = relaxations.filter(({ changes }) => changes.length === 1);
  const together = relaxations.filter(({ changes }) => changes.length > 1);
  const shared = { orderId, order, stale };
  return (
    <>
      {noConflict && <List messages={noConflict.messages} />}
      {conflict.length > 0 && (
        <div>
          <h3>These cannot hold together</h3>
          <List messages={conflict.map((demand) => demandInWords(demand, order))} />
          <p className={styles.soft}>
            {conflictProven
              ? 'Any one of them dropped ends this conflict: proven. Another may remain.'
              : 'Fewer of them may do: which ones is not proven.'}
          </p>
        </div>
      )}
      {conflict.length > 0 && (
        <div>
          <h3>Within reach, one at a time</h3>
          {alone.length > 0 ? (
            <Relaxations {...shared} list={alone} />
          ) : (
            <p>{unfinished ? 'Nothing found in the time.' : 'Moving one limit alone is not enough.'}</p>
          )}
        </div>
      )}
      {together.length > 0 && (
        <div>
          <h3>Several moved together</h3>
          <Relaxations {...shared} list={together} />
        </div>
      )}
      {relaxations.length > 1 && (
        <p className={styles.soft}>The smallest change first, counted in the units the methods report in.</p>
      )}
      {unfinished && <p className={styles.soft}>{unfinished}</p>}
    </>
  );
}

/** Ways out, each with its cost and a button that tries it. */
function Relaxations({ orderId, list, order, stale }: Omit<StepsProps, 'ladder'> & { list: readonly Relaxation[] }) {
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  return (
    <ol className={styles.choices}>
      {list.map((relaxation) => {
        const words = relaxationInWords(relaxation, order);
        return (
          <li key={words} className={styles.choice}>
            <p>
              {words}, at <b>{costPer(relaxation.costPerTonne, currency)}</b>
              {!relaxation.proven && ', not proven'}
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
  );
}
