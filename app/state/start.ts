import type { Workbook } from '../../src';
import { demoWorkbook } from '../demo/demoWorkbook';
import { createSaver, type Saver } from '../storage/saver';
import { loadView, saveView } from '../storage/viewStorage';
import { openWorkbookStorage, type WorkbookStorage } from '../storage/workbookStorage';
import { unguarded, webLock } from '../storage/writerLock';
import { createWorker } from '../worker/createWorker';
import { createSolverClient, type SolverClient } from '../worker/solverClient';
import { environment } from './environment';
import { setSave, setSetAside } from './saveStore';
import { startSolving } from './solving';
import { announce, selectOrder, useView } from './viewStore';
import { openWorkbook, useWorkbook } from './workbookStore';

export const NO_STORAGE =
  'This browser keeps nothing for this page (storage refused or not there). Export the workbook before you leave.';

async function openStorage(): Promise<WorkbookStorage | undefined> {
  const { indexedDB, today } = environment();
  try {
    return indexedDB && (await openWorkbookStorage(indexedDB, today));
  } catch {
    return undefined;
  }
}

const freshDemo = () => demoWorkbook(environment().newId());

/** The workbook the page was left with; the demo where there is none, or where it cannot be read. */
async function lastWorkbook(storage: WorkbookStorage | undefined): Promise<Workbook> {
  const loaded = await storage?.loadCurrent();
  if (loaded?.kind === 'workbook') {
    if (loaded.notes.length > 0) announce(loaded.notes.join(' '));
  }
  if (loaded?.kind === 'set aside') {
    const { text, message } = loaded.setAside;
    const news = `The workbook kept in this browser could not be read. It is set aside as it was (menu: export it); the demo is open. ${message}`;
    setSetAside({ text, message: news });
    announce(news);
  } else {
    const earlier = (await storage?.setAside())?.at(-1);
    if (earlier) setSetAside({ text: earlier.text });
  }
  return loaded?.kind === 'workbook' ? loaded.workbook : freshDemo();
}

/** Shows the order that was on screen, or the first; and a neighbour where the one on screen goes away. */
function keepOrderInSight(): void {
  const { orders } = useWorkbook.getState().workbook;
  const { orderId } = useView.getState();
  if (!orders.some(({ id }) => id === orderId)) selectOrder(orders[0]?.id);
}

function keepSaved(storage: WorkbookStorage): Saver {
  const { locks, onLeaving } = environment();
  const saver = createSaver({ storage, lock: locks ? webLock(locks) : unguarded(), report: setSave });
  useWorkbook.subscribe(({ workbook }, before) => {
    if (workbook !== before.workbook) saver.schedule(workbook);
  });
  onLeaving(() => void saver.flush());
  return saver;
}

function solveInWorkers(): SolverClient {
  return createSolverClient({ createWorker });
}

/** Opens storage, puts the last workbook (or the demo) on the page, and wires saving and solving. */
export async function startApp(createSolver: () => SolverClient = solveInWorkers): Promise<void> {
  const { localStorage, afterFirstPaint } = environment();
  useView.setState(loadView(localStorage));
  const storage = await openStorage();
  let workbook: Workbook;
  try {
    workbook = await lastWorkbook(storage);
  } catch {
    workbook = freshDemo();
    announce('The workbook kept in this browser could not be reached; the demo is open. Reload the page to try again.');
  }
  openWorkbook(workbook);
  keepOrderInSight();
  useWorkbook.subscribe(keepOrderInSight);
  useView.subscribe((view) => saveView(localStorage, view));
  if (storage) keepSaved(storage).schedule(workbook);
  else setSave({ state: 'unavailable', message: NO_STORAGE });
  afterFirstPaint(() => void startSolving(createSolver()));
}
