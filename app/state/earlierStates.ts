import { restoreWorkbook } from '../../src';
import type { WorkbookStorage } from '../storage/workbookStorage';
import { selectOrder, tell } from './viewStore';
import { replaceWorkbook, useWorkbook } from './workbookStore';

/** An earlier state of the workbook on the page. */
export interface EarlierState {
  /** When it was saved, ISO 8601. */
  savedAt: string;
  text: string;
}

type Source = Pick<WorkbookStorage, 'versions'>;

let source: Source | undefined;

/** Where earlier states are kept; undefined where the browser keeps nothing. */
export function setEarlierStates(storage: Source | undefined): void {
  source = storage;
}

/** Earlier states of the workbook on the page, newest first; none where the browser keeps nothing. */
export async function earlierStates(): Promise<EarlierState[]> {
  try {
    return (await source?.versions(useWorkbook.getState().workbook.id)) ?? [];
  } catch {
    return [];
  }
}

/** Puts an earlier state on the page, as a step that can be undone. Returns what is wrong where it cannot be read. */
export function bringBack({ text, savedAt }: EarlierState): string | undefined {
  const restored = restoreWorkbook(text);
  if (!restored.ok) {
    tell(`That state cannot be brought back. ${restored.message}`);
    return restored.message;
  }
  replaceWorkbook(restored.workbook, `return to the state of ${savedAt.slice(0, 16).replace('T', ' ')} UTC`);
  selectOrder(restored.workbook.orders[0]?.id);
  tell('An earlier state is on the page. Undo leads back.');
  return undefined;
}
