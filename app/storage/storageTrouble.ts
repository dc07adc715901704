const EXPORT = 'Export the workbook to a file to keep it.';

/** True where the browser has no room left for this page. */
export function isFull(error: unknown): boolean {
  return error instanceof DOMException && error.name === 'QuotaExceededError';
}

/** What a failed save means for the user: what is wrong, then what to do. */
export function saveProblem(error: unknown): string {
  if (isFull(error)) return `The browser's storage is full, so the last change is not saved. ${EXPORT}`;
  const reason = error instanceof Error && error.message ? ` (${error.message.replace(/\.$/, '')})` : '';
  return `The last change could not be saved${reason}. ${EXPORT}`;
}
