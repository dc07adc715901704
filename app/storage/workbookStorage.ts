import { type Restored, restoreWorkbook, serialiseWorkbook, type Workbook } from '../../src';
import { type Database, openDatabase, type SetAside, type StoredVersion, type StoredWorkbook } from './database';
import { isFull } from './storageTrouble';
import { inOrderOfLoss, placeInHistory } from './versions';

/** What was found in storage at the start. */
export type Loaded =
  | { kind: 'workbook'; workbook: Workbook; notes: string[] }
  | { kind: 'nothing' }
  /** The stored text could not be read; it is kept aside, never overwritten. */
  | { kind: 'set aside'; setAside: SetAside };

/** A stored workbook, as far as a list of them tells. */
export type StoredEntry = Pick<StoredWorkbook, 'id' | 'name' | 'savedAt'>;

export interface WorkbookStorage {
  /** The workbook with this id; where there is none, the one saved last. */
  loadCurrent(id?: string): Promise<Loaded>;
  /** All stored workbooks, the one saved last first. */
  list(): Promise<StoredEntry[]>;
  /** Undefined where there is none of this id (any more). */
  read(id: string): Promise<Restored | undefined>;
  /**
   * Keeps the workbook and makes it the current one; an earlier state stays among its versions, and always does where
   * this one is put in its place as a whole (`apart`).
   */
  save(workbook: Workbook, apart?: boolean): Promise<void>;
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

/** Put and committed without waiting for anything: a page that is being left gets no second turn. */
async function putCurrent(database: Database, stored: StoredWorkbook): Promise<void> {
  const transaction = database.transaction(['workbooks', 'meta'], 'readwrite');
  const puts = [
    transaction.objectStore('workbooks').put(stored),
    transaction.objectStore('meta').put(stored.id, CURRENT),
  ];
  transaction.commit();
  await Promise.all([...puts, transaction.done]);
}

/** The same in a full browser: earlier states give way to the present one, one after another, as many as it takes. */
async function putMakingRoom(database: Database, stored: StoredWorkbook, full: unknown): Promise<void> {
  let reason = full;
  for (const key of inOrderOfLoss(await database.getAll('versions'), stored.id)) {
    await database.delete('versions', key);
    try {
      return await putCurrent(database, stored);
    } catch (error) {
      if (!isFull(error)) throw error;
      reason = error;
    }
  }
  throw reason;
}

async function putVersion(database: Database, version: StoredVersion, apart: boolean): Promise<void> {
  const transaction = database.transaction('versions', 'readwrite');
  const kept = await transaction.store.index('workbookId').getAll(version.workbookId);
  const { remove, add } = placeInHistory(kept, version, apart);
  await Promise.all([
    ...remove.map((key) => transaction.store.delete(key)),
    ...(add ? [transaction.store.add(version)] : []),
    transaction.done,
  ]);
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
  const meta = transaction.objectStore('meta');
  if ((await meta.get(CURRENT)) === id) await meta.delete(CURRENT);
  await transaction.done;
  return setAside;
}

async function findStored(database: Database, wanted: string | undefined): Promise<StoredWorkbook | undefined> {
  const found = wanted === undefined ? undefined : await database.get('workbooks', wanted);
  if (found) return found;
  const id = await database.get('meta', CURRENT);
  return id === undefined ? undefined : database.get('workbooks', id);
}

/** Newest first. */
const byDate = (a: { savedAt: string }, b: { savedAt: string }) => (a.savedAt < b.savedAt ? 1 : -1);

/** The browser's storage of workbooks. Rejects where the browser refuses it. */
export async function openWorkbookStorage(factory: IDBFactory, now: () => string): Promise<WorkbookStorage> {
  const database = await openDatabase(factory);
  return {
    async loadCurrent(id) {
      const stored = await findStored(database, id);
      if (!stored) return { kind: 'nothing' };
      const text = String(stored.text);
      const restored: Restored = restoreWorkbook(text);
      if (restored.ok) return { kind: 'workbook', workbook: restored.workbook, notes: restored.notes };
      return { kind: 'set aside', setAside: await setAsideCurrent(database, stored.id, text, restored.message, now()) };
    },
    async list() {
      const stored = await database.getAll('workbooks');
      return stored.map(({ id, name, savedAt }) => ({ id, name, savedAt })).sort(byDate);
    },
    async read(id) {
      const stored = await database.get('workbooks', id);
      return stored && restoreWorkbook(String(stored.text));
    },
    async save(workbook, apart = false) {
      const stored = { id: workbook.id, name: workbook.name, text: readableText(workbook), savedAt: now() };
      try {
        await putCurrent(database, stored);
      } catch (error) {
        if (!isFull(error)) throw error;
        await putMakingRoom(database, stored, error);
      }
      const { text, savedAt } = stored;
      // The workbook itself is safe by now; an earlier state that finds no room is no reason to say otherwise.
      await putVersion(database, { workbookId: stored.id, text, savedAt }, apart).catch(() => {});
    },
    async versions(workbookId) {
      const kept = await database.getAllFromIndex('versions', 'workbookId', workbookId);
      return kept.sort(byDate);
    },
    setAside: () => database.getAll('setAside'),
    close: () => database.close(),
  };
}
