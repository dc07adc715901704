import { type DBSchema, type IDBPDatabase, wrap } from 'idb';

/** A workbook as it is kept: its text, read back through restoreWorkbook only. */
export interface StoredWorkbook {
  id: string;
  name: string;
  text: string;
  /** ISO 8601. */
  savedAt: string;
}

export interface StoredVersion {
  key?: number;
  workbookId: string;
  text: string;
  savedAt: string;
}

/** A stored text that could not be read, kept as it was. */
export interface SetAside {
  key?: number;
  text: string;
  message: string;
  setAsideAt: string;
}

export interface Schema extends DBSchema {
  workbooks: { key: string; value: StoredWorkbook };
  versions: { key: number; value: StoredVersion; indexes: { workbookId: string } };
  setAside: { key: number; value: SetAside };
  meta: { key: string; value: string };
}

export type Database = IDBPDatabase<Schema>;

const NAME = 'basewright';
const VERSION = 1;

function createStores(database: IDBDatabase): void {
  database.createObjectStore('workbooks', { keyPath: 'id' });
  database
    .createObjectStore('versions', { keyPath: 'key', autoIncrement: true })
    .createIndex('workbookId', 'workbookId');
  database.createObjectStore('setAside', { keyPath: 'key', autoIncrement: true });
  database.createObjectStore('meta');
}

/** Longest wait for the database: a page that waits for ever is worse than one that says it cannot save [ms]. */
const PATIENCE_MS = 5_000;

/** The database could be there, but did not open in time. */
export class NoAnswer extends Error {}

/** The request's database, if it comes in time. One that comes too late is closed again. */
function inTime(request: IDBOpenDBRequest): Promise<Database> {
  const opened = wrap(request) as Promise<Database>;
  let tooLate = false;
  const late = new Promise<never>((_resolve, reject) => {
    const giveUp = (reason: string) => {
      tooLate = true;
      reject(new NoAnswer(reason));
    };
    const timer = setTimeout(giveUp, PATIENCE_MS, 'The database did not open in time.');
    request.onblocked = () => giveUp('Another page holds the database.');
    const done = () => clearTimeout(timer);
    opened.then(done, done);
  });
  opened.then((database) => tooLate && database.close()).catch(() => {});
  return Promise.race([opened, late]);
}

/** Opens the browser's database. Rejects where the browser refuses it, with NoAnswer where it does not come. */
export async function openDatabase(factory: IDBFactory): Promise<Database> {
  const request = factory.open(NAME, VERSION);
  request.onupgradeneeded = () => createStores(request.result);
  const database = await inTime(request);
  // A newer page wants to change the stores: step aside rather than block it.
  database.addEventListener('versionchange', () => database.close());
  return database;
}
