import { type Restored, restoreWorkbook, serialiseWorkbook } from '../../src';
import type { StoredEntry, WorkbookStorage } from '../storage/workbookStorage';
import { selectOrder, tell } from './viewStore';
import { replaceWorkbook, useWorkbook } from './workbookStore';

/** An earlier state of the workbook on the page. */
export interface EarlierState {
  /** When it was saved, ISO 8601. */
  savedAt: string;
  text: string;
}

/** What is kept in the browser beside the workbook on the page. */
export interface Shelf {
  storage: Pick<WorkbookStorage, 'list' | 'read' | 'versions'>;
  /** Saves what still waits to be saved. */
  settle(): Promise<void>;
}

let shelf: Shelf | undefined;

/** Where workbooks are kept; undefined where the browser keeps nothing. */
export function setShelf(kept: Shelf | undefined): void {
  shelf = kept;
}

/** The workbooks kept in this browser, the one saved last first. Rejects where they cannot be read. */
export async function storedWorkbooks(): Promise<StoredEntry[]> {
  await shelf?.settle();
  return (await shelf?.storage.list()) ?? [];
}

/** Saved states of the workbook on the page that differ from it, newest first. Rejects where they cannot be read. */
export async function earlierStates(): Promise<EarlierState[]> {
  await shelf?.settle();
  const { workbook } = useWorkbook.getState();
  const present = serialiseWorkbook(workbook);
  const states = (await shelf?.storage.versions(workbook.id)) ?? [];
  return states.filter(({ text }) => text !== present);
}

/** Puts it on the page as a step that can be undone. Returns what is wrong where it cannot be read. */
function place(restored: Restored, label: string, words: string): string | undefined {
  if (!restored.ok) return restored.message;
  replaceWorkbook(restored.workbook, label);
  selectOrder(restored.workbook.orders[0]?.id);
  tell([words, ...restored.notes].join(' '));
  return undefined;
}

/** Opens a workbook kept in this browser, as a step that can be undone. Returns what is wrong where it cannot. */
export async function openStored({ id, name }: StoredEntry): Promise<string | undefined> {
  await shelf?.settle();
  const restored = await shelf?.storage.read(id);
  if (!restored) return 'It is not kept here any more.';
  return place(restored, `opening ${name}`, `“${name}” is on the page. Undo brings the former workbook back.`);
}

/** Puts an earlier state on the page, as a step that can be undone. Returns what is wrong where it cannot be read. */
export function bringBack({ text, savedAt }: EarlierState): string | undefined {
  const label = `return to the state of ${savedAt.slice(0, 16).replace('T', ' ')} UTC`;
  return place(restoreWorkbook(text), label, 'An earlier state is on the page. Undo leads back.');
}
