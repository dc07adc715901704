import { restoreWorkbook, serialiseWorkbook, type Workbook } from '../../src';
import { environment } from './environment';
import { selectOrder, tell } from './viewStore';
import { replaceWorkbook, useWorkbook } from './workbookStore';

/** Largest file read [bytes]; the text inside has its own bound. */
const LARGEST_FILE = 80_000_000;

function fileName(name: string): string {
  const plain = name
    .normalize('NFKD')
    .replace(/[^\w]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 60);
  return `${plain || 'workbook'}.basewright.json`;
}

/** The workbook as it was last handed out as a file. */
let exported: Workbook | undefined;

/** True where a file holds the workbook as it is on the page. */
export function isExported(): boolean {
  return useWorkbook.getState().workbook === exported;
}

/** Hands the workbook to the user as a file. */
export function exportWorkbook(): void {
  const { workbook } = useWorkbook.getState();
  const name = fileName(workbook.name);
  environment().download(name, serialiseWorkbook(workbook));
  exported = workbook;
  tell(`Workbook exported as ${name}.`);
}

/** What a chosen file holds: a text, or why it cannot be read. */
async function fileText(file: File): Promise<{ text: string } | { message: string }> {
  if (file.size > LARGEST_FILE) return { message: 'This file is too large for a workbook. Pick another file.' };
  try {
    return { text: await file.text() };
  } catch {
    return { message: 'This file could not be read. Check that it is still there, and pick it again.' };
  }
}

/** How an import went. On trouble the workbook is as it was. */
export type Imported = { ok: true; notes: string[] } | { ok: false; message: string };

/** Puts the workbook of a file on the page, as a step that can be undone. Whoever asks for it shows how it went. */
export async function importWorkbook(file: File): Promise<Imported> {
  const read = await fileText(file);
  const restored = 'text' in read ? restoreWorkbook(read.text) : { ok: false as const, message: read.message };
  if (!restored.ok) {
    return { ok: false, message: restored.message };
  }
  replaceWorkbook(restored.workbook, `import of ${file.name}`);
  selectOrder(restored.workbook.orders[0]?.id);
  tell('');
  return { ok: true, notes: restored.notes };
}
