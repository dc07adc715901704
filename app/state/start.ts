import type { Workbook } from '../../src';
import { demoWorkbook } from '../demo/demoWorkbook';
import { NoAnswer } from '../storage/database';
import { createSaver } from '../storage/saver';
import { loadView, loadWorkbookId, saveView, saveWorkbookId } from '../storage/viewStorage';
import { openWorkbookStorage, type WorkbookStorage } from '../storage/workbookStorage';
import { unguarded, webLock } from '../storage/writerLock';
import { createWorker } from '../worker/createWorker';
import { createSolverClient, type SolverClient } from '../worker/solverClient';
import { environment } from './environment';
import { startExplaining } from './explaining';
import { setSave, setSetAside, useSave } from './saveStore';
import { setShelf } from './shelf';
import { startSolving } from './solving';
import { selectOrder, tell, useView } from './viewStore';
import { isExported } from './workbookFile';
import { openWorkbook, useWorkbook, type WorkbookState } from './workbookStore';

export const NO_STORAGE =
  'This browser keeps nothing for this page (storage refused or not there). Export the workbook before you leave.';

export const UNREAD =
  'Your workbook could not be read from this browser; it is still there, untouched. The demo is open, and nothing is ' +
  'saved now: reload the page to try again, export the workbook to keep what you do here.';

export const NO_ANSWER =
  "The browser's storage does not answer, so a workbook kept there is not on the page, and nothing is saved now. Close " +
  'other tabs of this page and reload it to try again; export the workbook to keep what you do here.';

/** The browser's storage; where it cannot be had, what to say of that. */
async function openStorage(): Promise<{ storage?: WorkbookStorage; trouble: string }> {
  const { indexedDB, today } = environment();
  try {
    return { storage: indexedDB && (await openWorkbookStorage(indexedDB, today)), trouble: NO_STORAGE };
  } catch (error) {
    return { trouble: error instanceof NoAnswer ? NO_ANSWER : NO_STORAGE };
  }
}

const freshDemo = () => demoWorkbook(environment().newId());

/** A workbook set aside at an earlier start is still to be had from the menu, which is no news. */
async function offerSetAside(storage: WorkbookStorage): Promise<void> {
  const earlier = (await storage.setAside().catch(() => [])).at(-1);
  if (earlier) setSetAside({ text: earlier.text });
}

/** The workbook the page was left with; the demo where there is none, or where its text is damaged. */
async function lastWorkbook(storage: WorkbookStorage): Promise<Workbook> {
  const loaded = await storage.loadCurrent(loadWorkbookId(environment().sessionStorage));
  if (loaded.kind === 'set aside') {
    const { text, message } = loaded.setAside;
    const news = `The workbook kept in this browser could not be read. It is set aside as it was (menu: export it); the demo is open. ${message}`;
    setSetAside({ text, message: news });
    return freshDemo();
  }
  await offerSetAside(storage);
  if (loaded.kind === 'nothing') return freshDemo();
  if (loaded.notes.length > 0) tell(loaded.notes.join(' '), { stays: true });
  return loaded.workbook;
}

/** Shows the order that was on screen, or the first; and a neighbour where the one on screen goes away. */
function keepOrderInSight(): void {
  const { orders } = useWorkbook.getState().workbook;
  const { orderId } = useView.getState();
  if (!orders.some(({ id }) => id === orderId)) selectOrder(orders[0]?.id);
}

/** True where the last step, forward or back, put one workbook in place of another. */
function wasReplaced({ past, future }: WorkbookState): boolean {
  return [past.at(-1), future.at(-1)].some((step) => step?.forward.some(({ path }) => path.length === 0));
}

/** True where leaving the page would lose work: a save failed, or nothing is saved and something was changed. */
function wouldLoseWork(): boolean {
  const { state } = useSave.getState();
  return !isExported() && (state === 'failed' || (state === 'unavailable' && useWorkbook.getState().canUndo));
}

/** Saves every change from now on. Returns the function that ends it. */
function keepSaved(storage: WorkbookStorage): () => void {
  const { locks, onLeaving, sessionStorage } = environment();
  const lock = locks ? webLock(locks) : unguarded();
  useSave.setState({ unguarded: !locks });
  const saver = createSaver({ storage, lock, report: setSave });
  const end = useWorkbook.subscribe((state, before) => {
    const { workbook } = state;
    if (workbook === before.workbook) return;
    saver.schedule(workbook, wasReplaced(state));
    saveWorkbookId(sessionStorage, workbook.id);
  });
  setShelf({ storage, settle: saver.flush });
  onLeaving(() => void saver.flush());
  const { workbook } = useWorkbook.getState();
  saver.schedule(workbook);
  saveWorkbookId(sessionStorage, workbook.id);
  // Asked for early: a save that must wait for the lock may come too late on a page that is being left.
  void lock.hold(workbook.id).catch(() => {});
  return () => {
    end();
    void saver.stop().finally(() => {
      lock.release();
      storage.close();
    });
  };
}

function sayNotSaved(message: string): () => void {
  setSave({ state: 'unavailable', message });
  return () => {};
}

/** Solves once something is on screen. Returns the function that ends it. */
function keepSolved(createSolver: () => SolverClient): () => void {
  let end = () => {};
  let ended = false;
  environment().afterFirstPaint(() => {
    if (ended) return;
    const solver = createSolver();
    const ends = [startExplaining(solver), startSolving(solver)];
    end = () => {
      for (const endOne of ends) endOne();
    };
  });
  return () => {
    ended = true;
    end();
  };
}

const solveInWorkers = (): SolverClient => createSolverClient({ createWorker });

/** Puts the last workbook (or the demo) on the page. Returns what keeps it saved from now on. */
async function openLast({ storage, trouble }: Awaited<ReturnType<typeof openStorage>>): Promise<() => () => void> {
  if (!storage) {
    openWorkbook(freshDemo());
    return () => sayNotSaved(trouble);
  }
  try {
    openWorkbook(await lastWorkbook(storage));
    return () => keepSaved(storage);
  } catch {
    // What is kept could not be had: a save would put the demo in its place.
    openWorkbook(freshDemo());
    return () => sayNotSaved(UNREAD);
  }
}

/**
 * Opens storage, puts the last workbook (or the demo) on the page, and keeps it saved and solved from then on.
 * Resolves to the function that ends all of it.
 */
export async function startApp(createSolver: () => SolverClient = solveInWorkers): Promise<() => void> {
  const { localStorage } = environment();
  useView.setState(loadView(localStorage));
  const opened = await openStorage();
  const { storage } = opened;
  setShelf(storage && { storage, settle: async () => {} });
  const save = await openLast(opened);
  keepOrderInSight();
  environment().askBeforeLeaving(wouldLoseWork);
  const ends = [
    useWorkbook.subscribe(keepOrderInSight),
    useView.subscribe((view) => saveView(localStorage, view)),
    save(),
    keepSolved(createSolver),
  ];
  return () => {
    for (const end of ends) end();
  };
}
