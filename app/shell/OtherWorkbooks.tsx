import { useEffect, useState } from 'react';
import { Button } from '../parts/Button';
import { Dialog } from '../parts/Dialog';
import { Notice } from '../parts/Notice';
import { bringBack, type EarlierState, earlierStates, openStored, storedWorkbooks } from '../state/shelf';
import { useWorkbook } from '../state/workbookStore';
import styles from './OtherWorkbooks.module.css';

const DATE = new Intl.DateTimeFormat(undefined, { dateStyle: 'medium', timeStyle: 'medium' });

/** A date as the user writes it; a damaged one as it stands. */
const dateInWords = (iso: string) => (Number.isNaN(Date.parse(iso)) ? iso : DATE.format(new Date(iso)));

interface Kept {
  workbooks: Awaited<ReturnType<typeof storedWorkbooks>>;
  states: EarlierState[];
}

const UNREADABLE = 'What is kept in this browser could not be read. Nothing was changed; reload the page to try again.';

/** The way back to every workbook and every state that this browser keeps. */
export function OtherWorkbooks({ open, onClose }: { open: boolean; onClose(): void }) {
  return (
    <Dialog title="Other workbooks and earlier states" open={open} onClose={onClose}>
      {open && <Shelf onClose={onClose} />}
    </Dialog>
  );
}

function Shelf({ onClose }: { onClose(): void }) {
  const { id, name } = useWorkbook(({ workbook }) => workbook);
  const [kept, setKept] = useState<Kept>();
  const [problem, setProblem] = useState<string>();

  useEffect(() => {
    let shown = true;
    Promise.all([storedWorkbooks(), earlierStates()]).then(
      ([workbooks, states]) => shown && setKept({ workbooks, states }),
      () => shown && setProblem(UNREADABLE),
    );
    return () => {
      shown = false;
    };
  }, []);

  async function put(what: string, act: () => string | undefined | Promise<string | undefined>) {
    const wrong = await Promise.resolve(act()).catch(() => UNREADABLE);
    if (wrong === undefined) onClose();
    else setProblem(`${what} cannot be opened; the workbook on the page is as it was. ${wrong}`);
  }

  return (
    <>
      {problem && (
        <Notice tone="bad" live>
          {problem}
        </Notice>
      )}
      <h3>Workbooks in this browser</h3>
      {kept?.workbooks.length === 0 && <p className={styles.none}>None is kept here.</p>}
      <ul className={styles.list}>
        {kept?.workbooks.map((entry) => (
          <Entry
            key={entry.id}
            name={entry.name}
            date={`saved ${dateInWords(entry.savedAt)}`}
            act="Open"
            onAct={entry.id === id ? undefined : () => put(entry.name, () => openStored(entry))}
          />
        ))}
      </ul>
      <h3>Earlier states of {name}</h3>
      {kept?.states.length === 0 && <p className={styles.none}>None that differs from what is on the page.</p>}
      <ul className={styles.list}>
        {kept?.states.map((state) => (
          <Entry
            key={state.savedAt}
            date={dateInWords(state.savedAt)}
            act="Bring back"
            onAct={() => put('That state', () => bringBack(state))}
          />
        ))}
      </ul>
    </>
  );
}

/** One thing that is kept; without `onAct` it is the one on the page. */
function Entry({ name, date, act, onAct }: { name?: string; date: string; act: string; onAct?(): void }) {
  const whole = name === undefined ? `the state of ${date}` : `${name}, ${date}`;
  return (
    <li className={styles.item}>
      <span>
        {name !== undefined && <span className={styles.name}>{name}</span>}
        <span className={styles.date}>{date}</span>
      </span>
      {onAct ? (
        <Button aria-label={`${act}: ${whole}`} onClick={onAct}>
          {act}
        </Button>
      ) : (
        <span className={styles.date}>on the page</span>
      )}
    </li>
  );
}
