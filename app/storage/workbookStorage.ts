import { type Restored, restoreWorkbook, serialiseWorkbook, type Workbook } from '../../src';
import { type Database, openDatabase, type SetAside, type StoredVersion } from './database';
import { placeInHistory } from './versions';

/** What was found in storage at the start. */
export type Loaded =
  | { kind: 'workbook'; workbook: Workbook; notes: string[] }
  | { kind: 'nothing' }
  /** The stored text could not be read; it is kept aside, never overwritten. */
  | { kind: 'set aside'; setAside: SetAside };

export interface WorkbookStorage {
  loadCurrent(): Promise<Loaded>;
  /** Keeps the workbook and makes it the current one; an earlier state stays among its versions. */
  save(workbook: Workbook): Promise<void>;
  /** Earlier states of a workbook, newest first. */
  versions(workbookId: string): Promise<StoredVersion[]>;
  setAside(): Promise<SetAside[]>;
  close(): void;
}

const CURRENT = 'current';

/** The text of a workbook that is sure to be read back. Throws where it is not: better no save than a lost one. */
function readableText(workbook: Workbook): string {
  const text = serialiseWorkbook(workbook);
  const restored = restoreWorkbook(text);
  if (!restored.ok) throw new Error(restored.message);
  return text;
}

async function putVersion(database: Database, version: StoredVersion): Promise<void> {
  const transaction = database.transaction('versions', 'readwrite');
  const kept = await transaction.store.index('workbookId').getAll(version.workbookId);
  const { remove, add } = placeInHistory(kept, version);
  for (const key of remove) await transaction.store.delete(key);
  if (add) await transaction.store.add(version);
  await transaction.done;
}

async function setAsideCurrent(
  database: Database,
  id: string,
  text: string,
  message: string,
  at: string,
): Promise<SetAside> {
  const setAside: SetAside = { text, message, setAsideAt: at };
  const transaction = database.transaction(['setAside', 'workbooks', 'meta'], 'readwrite');
  await transaction.objectStore('setAside').add(setAside);
  await transaction.objectStore('workbooks').delete(id);
  await transaction.objectStore('meta').delete(CURRENT);
  await transaction.done;
  return setAside;
}

/** The browser's storage of workbooks. Rejects where the browser refuses it. */
export async function openWorkbookStorage(factory: IDBFactory, now: () => string): Promise<WorkbookStorage> {
  const database = await openDatabase(factory);
  return {
    async loadCurrent() {
      const id = await database.get('meta', CURRENT);
      const stored = id === undefined ? undefined : await database.get('workbooks', id);
      if (!stored) return { kind: 'nothing' };
      const text = String(stored.text);
      const restored: Restored = restoreWorkbook(text);
      if (restored.ok) return { kind: 'workbook', workbook: restored.workbook, notes: restored.notes };
      return { kind: 'set aside', setAside: await setAsideCurrent(database, stored.id, text, restored.message, now()) };
    },
    async save(workbook) {
      const text = readableText(workbook);
      const savedAt = now();
      const { id, name } = workbook;
      const transaction = database.transaction(['workbooks', 'meta'], 'readwrite');
      // Put without waiting for anything first: a page that is being left gets no second turn.
      await Promise.all([
        transaction.objectStore('workbooks').put({ id, name, text, savedAt }),
        transaction.objectStore('meta').put(id, CURRENT),
        transaction.done,
      ]);
      await putVersion(database, { workbookId: id, text, savedAt });
    },
    async versions(workbookId) {
      const kept = await database.getAllFromIndex('versions', 'workbookId', workbookId);
      return kept.sort((a, b) => (a.savedAt < b.savedAt ? 1 : -1));
    },
    setAside: () => database.getAll('setAside'),
    close: () => database.close(),
  };
}
