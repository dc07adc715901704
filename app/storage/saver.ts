import type { Workbook } from '../../src';
import type { SaveState } from '../state/saveStore';
import { saveProblem } from './storageTrouble';
import type { WorkbookStorage } from './workbookStorage';
import type { WriterLock } from './writerLock';

export interface SaverOptions {
  storage: Pick<WorkbookStorage, 'save'>;
  lock: WriterLock;
  report(save: SaveState): void;
  /** Wait after the last change [ms]. */
  delayMs?: number;
  /** Wait after a save that failed, before it is tried again [ms]. */
  retryMs?: number;
}

export interface Saver {
  /** Saves the workbook a moment after the last change. `apart`: it takes the place of another, which is kept too. */
  schedule(workbook: Workbook, apart?: boolean): void;
  /** Saves what is waiting now; for a page that is being left. */
  flush(): Promise<void>;
  /** Saves what is waiting now for the last time. */
  stop(): Promise<void>;
}

const DELAY_MS = 400;
const RETRY_MS = 5_000;

export const OTHER_TAB =
  'This workbook is open in another tab, which saves it. Changes here are not saved: go on in that tab, or close it and ' +
  'reload this one. Export the workbook to keep what you changed here.';

/**
 * Saves the workbook after each change, and says how that goes. Saves keep their order: the database takes them one
 * after another, and none waits for anything of ours where the lock is held.
 */
export function createSaver({ storage, lock, report, delayMs = DELAY_MS, retryMs = RETRY_MS }: SaverOptions): Saver {
  let waiting: { workbook: Workbook; apart: boolean } | undefined;
  let stopped = false;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let writing = 0;
  /** Workbooks that another tab wrote while they were open here: what is here is older, and stays unsaved. */
  const elsewhere = new Set<string>();

  async function write({ workbook, apart }: NonNullable<typeof waiting>): Promise<SaveState> {
    try {
      const mayWrite = lock.held() === workbook.id || (await lock.hold(workbook.id));
      if (!mayWrite) {
        elsewhere.add(workbook.id);
        return { state: 'unavailable', message: OTHER_TAB };
      }
      await storage.save(workbook, apart);
      return { state: 'saved' };
    } catch (error) {
      return { state: 'failed', message: saveProblem(error) };
    }
  }

  async function flush(): Promise<void> {
    clearTimeout(timer);
    if (!waiting) return;
    const sent = waiting;
    waiting = undefined;
    writing += 1;
    const result = await write(sent);
    writing -= 1;
    if (result.state === 'failed' && !waiting && !stopped) {
      waiting = sent;
      timer = setTimeout(() => void flush(), retryMs);
    }
    if (result.state !== 'saved' || (!waiting && writing === 0)) report(result);
  }

  return {
    schedule(workbook, apart = false) {
      clearTimeout(timer);
      // The last change to the workbook that is being replaced must not get lost.
      if (waiting && (apart || waiting.workbook.id !== workbook.id)) void flush();
      if (elsewhere.has(workbook.id)) {
        waiting = undefined;
        report({ state: 'unavailable', message: OTHER_TAB });
        return;
      }
      waiting = { workbook, apart: apart || waiting?.apart === true };
      report({ state: 'saving' });
      timer = setTimeout(() => void flush(), delayMs);
    },
    flush,
    stop() {
      stopped = true;
      return flush();
    },
  };
}
