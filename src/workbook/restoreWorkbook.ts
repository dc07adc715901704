import { MIGRATIONS, type Migration, migrate } from './migrations';
import { ReadFailure } from './readers';
import { readWorkbook } from './readWorkbook';
import { WORKBOOK_FORMAT, WORKBOOK_VERSION, type Workbook } from './workbook';

/** A workbook read back, or the sentence that says why not and what to do. Never half a workbook. */
export type Restored = { ok: true; workbook: Workbook; notes: string[] } | { ok: false; message: string };

/** Longest document read [characters]. */
export const LONGEST_DOCUMENT = 20_000_000;
const MOST_NOTES = 20;

const refused = (message: string): Restored => ({ ok: false, message });

function parse(text: string): { document: unknown } | undefined {
  try {
    return { document: JSON.parse(text.replace(/^\uFEFF/, '')) };
  } catch {
    return undefined;
  }
}

function isOurs(document: unknown): document is Record<string, unknown> {
  return (
    typeof document === 'object' &&
    document !== null &&
    Object.hasOwn(document, 'format') &&
    'format' in document &&
    document.format === WORKBOOK_FORMAT
  );
}

function shortened(notes: string[]): string[] {
  if (notes.length <= MOST_NOTES) return notes;
  return [...notes.slice(0, MOST_NOTES), `… and ${notes.length - MOST_NOTES} more fields that are not known here.`];
}

function readMigrated(
  document: Record<string, unknown>,
  version: number,
  migrations: Readonly<Record<number, Migration>>,
): Restored {
  try {
    const current = migrate(document, version, WORKBOOK_VERSION, migrations);
    if (!current)
      return refused(
        `This workbook has version ${version}, which is not known. Export it again from the program that wrote it.`,
      );
    const notes: string[] = [];
    const workbook = readWorkbook(current, notes);
    if (version < WORKBOOK_VERSION) notes.unshift(`Brought up from version ${version} to ${WORKBOOK_VERSION}.`);
    return { ok: true, workbook, notes: shortened(notes) };
  } catch (error) {
    const what = error instanceof ReadFailure ? error.message : 'It could not be brought up to the present version.';
    return refused(`This workbook is damaged. ${what} Correct the file, or take an earlier copy of it.`);
  }
}

/**
 * The one door for workbooks from outside: files, and the browser's own storage. Text in, a whole workbook or a
 * message out; unknown extra fields are left out and noted. Never throws.
 */
export function restoreWorkbook(text: string, migrations: Readonly<Record<number, Migration>> = MIGRATIONS): Restored {
  if (text.length > LONGEST_DOCUMENT) {
    return refused(
      `This file is too long for a workbook (over ${LONGEST_DOCUMENT / 1e6} million characters). Pick another file.`,
    );
  }
  if (text.trim() === '') return refused('This file is empty. Pick a workbook exported from Basewright.');
  const parsed = parse(text);
  if (!parsed) return refused('This file is not JSON, or was cut short. Pick a workbook exported from Basewright.');
  const { document } = parsed;
  if (!isOurs(document))
    return refused('This file is not a Basewright workbook. Pick a workbook exported from Basewright.');
  const { version } = document;
  if (typeof version !== 'number' || !Number.isInteger(version) || version < 0) {
    return refused(
      'This workbook is damaged. version must be a whole number. Correct the file, or take an earlier copy of it.',
    );
  }
  if (version > WORKBOOK_VERSION) {
    return refused(
      `This workbook was written by a newer Basewright (version ${version}; this one reads up to ${WORKBOOK_VERSION}). ` +
        'Open it there, or bring this program up to date. The file is as it was.',
    );
  }
  return readMigrated(document, version, migrations);
}
