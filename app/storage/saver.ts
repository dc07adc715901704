import type { Workbook } from '../../src';
import type { SaveState } from '../state/saveStore';
import type { WorkbookStorage } from './workbookStorage';
import type { WriterLock } from './writerLock';

export interface SaverOptions {
  storage: Pick<WorkbookStorage, 'save'>;
  lock: WriterLock;
  report(save: SaveState): void;
  /** Wait after the last change [ms]. */
  delayMs?: number;
}

export interface Saver {
  /** Saves the workbook a moment after the last change. */
  schedule(workbook: Workbook): void;
  /** Saves what is waiting now; for a page that is being left. */
  flush(): Promise<void>;
}

const DELAY_MS = 400;
const EXPORT = 'Export the workbook to a file to keep it.';

export const OTHER_TAB =
  'This workbook is open in another tab, which saves it. Changes here are not saved: go on in that tab, or close it and ' +
  'reload this one. Export the workbook to keep what you changed here.';

/** What a failed save means for the user. */
export function saveProblem(error: unknown): string {
  const name = error instanceof Error || error instanceof DOMException ? error.name : '';
  if (name === 'QuotaExceededError') return `The browser's storage is full, so the last change is not saved. ${EXPORT}`;
  const reason = error instanceof Error && error.message ? ` (${error.message})` : '';
  return `The last change could not be saved${reason}. ${EXPORT}`;
}

/** Saves the workbook after each change, one save at a time, and says how that goes. */
export function createSaver({ storage, lock, report, delayMs = DELAY_MS }: SaverOptions): Saver {
  let waiting: Workbook | undefined;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let writing = false;

  async function write(workbook: Workbook): Promise<void> {
    try {
      // Where the lock is held there is no wait before the write: a page being left gets no second turn.
      const mayWrite = lock.held() === workbook.id || (await lock.hold(workbook.id));
      if (!mayWrite) return report({ state: 'unavailable', message: OTHER_TAB });
      await storage.save(workbook);
      if (!waiting) report({ state: 'saved' });
    } catch (error) {
      report({ state: 'failed', message: saveProblem(error) });
    }
  }

  async function flush(): Promise<void> {
    clearTimeout(timer);
    if (writing || !waiting) return;
    writing = true;
    while (waiting) {
      const workbook: Workbook = waiting;
      waiting = undefined;
      await write(workbook);
    }
    writing = false;
  }

  return {
    schedule(workbook) {
      waiting = workbook;
      report({ state: 'saving' });
      clearTimeout(timer);
      timer = setTimeout(() => void flush(), delayMs);
    },
    flush,
  };
}
