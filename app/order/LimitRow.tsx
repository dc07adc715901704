import { useEffect, useId, useRef, useState } from 'react';
import { type Limit, propertyDefinition } from '../../src';
import { LimitPriceLine } from '../explain/LimitPriceLine';
import { IconButton } from '../parts/IconButton';
import { type End, setEnd, upperEnd } from '../parts/limitEnds';
import { contradiction, limitName, shortLimitName, unitOf } from '../parts/limitWords';
import { NumberField } from '../parts/NumberField';
import { useLasting } from '../parts/useLasting';
import type { Answer } from '../state/answerStore';
import { endEdit, useWorkbook } from '../state/workbookStore';
import { LimitDetails } from './LimitDetails';
import styles from './LimitList.module.css';
import { LimitName } from './LimitName';
import { checkOf, marksOf, mixValue } from './limitAnswer';
import { problemsAt } from './problemsAt';
import { Rail } from './Rail';
import { editOrder } from './useOrder';

export interface LimitRowProps {
  orderId: string;
  limit: Limit;
  index: number;
  answer: Answer;
  /** Just added: the first field takes the focus. */
  isNew: boolean;
}

/** One limit: its name and room, its ends as fields, and the rail between them. */
export function LimitRow({ orderId, limit, index, answer, isNew }: LimitRowProps) {
  const id = useId();
  const row = useRef<HTMLLIElement>(null);
  const [open, setOpen] = useState(false);
  const [untaken, setUntaken] = useState<Partial<Record<End, string>>>({});
  const faded = useLasting(answer.stale);
  const ownProperties = useWorkbook(({ workbook }) => workbook.ownProperties);
  const definition = propertyDefinition(limit.property, ownProperties);
  const name = limitName(limit, ownProperties);
  const short = shortLimitName(limit, ownProperties);

  useEffect(() => {
    if (isNew) row.current?.querySelector('input')?.focus();
  }, [isNew]);

  function edit(label: string, change: (limit: Limit) => void, join?: string) {
    editOrder(orderId, label, ({ limits }) => limits[index] && change(limits[index]), { join });
  }

  function remove() {
    editOrder(orderId, `remove the limit on ${short}`, ({ limits }) => limits.splice(index, 1));
  }

  if (!definition) {
    return (
      <li className={styles.row}>
        <p className={styles.problem}>
          The property “{limit.property}” is not known here. Add it as a property of your own, or remove this limit.
        </p>
        <IconButton icon="remove" label={`Remove the limit on ${name}`} onClick={remove} />
      </li>
    );
  }

  const moveEnd = (end: End, value: number | undefined) =>
    edit(`change the limit on ${short}`, (draft) => setEnd(draft, end, value), `limit ${orderId} ${index} ${end}`);
  const commitEnd = (end: End, value: number | undefined) => {
    moveEnd(end, value);
    endEdit();
  };
  const upper = upperEnd(limit);
  const wrong = contradiction(limit, definition);
  const unread = [untaken.min, untaken.max].filter((message) => message !== undefined);
  const problems = [...unread, ...(wrong ? [wrong] : problemsAt(answer, 'limits', index))];
  const check = checkOf(answer, index, limit);
  const problemId = problems.length ? `${id}-problem` : undefined;
  const ends = {
    context: name,
    unit: unitOf(definition),
    hideUnit: true,
    digits: definition.digits,
    step: definition.reportingUnit,
    sense: definition.sense,
  };
  // What cannot be read belongs to one field; all else to the limit as a whole.
  const problemOf = (end: End) => (unread.length === 0 || untaken[end] ? problemId : undefined);

  return (
    <li className={styles.row} ref={row}>
      <div className={styles.line}>
        <LimitName
          name={name}
          definition={definition}
          check={check}
          stale={faded}
          open={open}
          onToggle={() => setOpen(!open)}
          detailsId={`${id}-more`}
        />
        <NumberField
          {...ends}
          className={styles.min}
          label="least"
          problemId={problemOf('min')}
          onProblem={(message) => setUntaken((before) => ({ ...before, min: message }))}
          value={limit.min}
          onDraft={(value) => moveEnd('min', value)}
          onCommit={(value) => commitEnd('min', value)}
        />
        <div className={styles.rail}>
          <Rail
            limit={limit}
            definition={definition}
            mix={check?.value ?? mixValue(answer, limit)}
            passes={check?.passes}
            stale={faded}
            marks={marksOf(answer, limit)}
            onMove={moveEnd}
            onEnd={endEdit}
          />
        </div>
        <NumberField
          {...ends}
          className={styles.max}
          label={upper.strict ? 'below' : 'most'}
          problemId={problemOf('max')}
          onProblem={(message) => setUntaken((before) => ({ ...before, max: message }))}
          value={upper.value}
          onDraft={(value) => moveEnd('max', value)}
          onCommit={(value) => commitEnd('max', value)}
        />
        <LimitPriceLine
          className={styles.price}
          orderId={orderId}
          index={index}
          property={limit.property}
          celsius={limit.celsius}
        />
        <IconButton className={styles.remove} icon="remove" label={`Remove the limit on ${name}`} onClick={remove} />
      </div>
      {problemId && (
        <p id={problemId} className={styles.problem} role="status">
          {problems.join(' ')}
        </p>
      )}
      <div id={`${id}-more`} hidden={!open}>
        {open && (
          <LimitDetails
            orderId={orderId}
            index={index}
            limit={limit}
            definition={definition}
            name={name}
            answer={answer}
            stale={faded}
            onEdit={edit}
          />
        )}
      </div>
    </li>
  );
}
