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

/** Opens the browser's database. Rejects where the browser refuses it. */
export async function openDatabase(factory: IDBFactory): Promise<Database> {
  const request = factory.open(NAME, VERSION);
  request.onupgradeneeded = () => createStores(request.result);
  const database = (await wrap(request)) as Database;
  // A newer page wants to change the stores: step aside rather than block it.
  database.addEventListener('versionchange', () => database.close());
  return database;
}
