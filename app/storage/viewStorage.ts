import { storedFields, VIEW_FIELDS } from '../state/stateFields';
import type { Theme, ViewState } from '../state/viewStore';

const KEY = 'basewright.view';
const WORKBOOK_KEY = 'basewright.workbook';
const THEMES: readonly Theme[] = ['system', 'light', 'dark'];

type StoredView = Pick<ViewState, 'orderId' | 'theme'>;

/** The view as it was left; what cannot be read is left out. */
export function loadView(storage: Storage | undefined): Partial<StoredView> {
  try {
    const view: unknown = JSON.parse(storage?.getItem(KEY) ?? '{}');
    if (typeof view !== 'object' || view === null) return {};
    const { orderId, theme } = view as Record<string, unknown>;
    const known = THEMES.find((entry) => entry === theme);
    return { ...(typeof orderId === 'string' ? { orderId } : {}), ...(known ? { theme: known } : {}) };
  } catch {
    return {};
  }
}

/** Keeps what belongs to this window. A browser that refuses only forgets the view, so nobody is told. */
export function saveView(storage: Storage | undefined, view: ViewState): void {
  try {
    const kept = storedFields(VIEW_FIELDS).map((field) => [field, view[field]]);
    storage?.setItem(KEY, JSON.stringify(Object.fromEntries(kept)));
  } catch {
    // Storage refused or full: the workbook's own saving says so.
  }
}

/** Id of the workbook this window showed last, also before a reload; other windows have their own. */
export function loadWorkbookId(storage: Storage | undefined): string | undefined {
  try {
    return storage?.getItem(WORKBOOK_KEY) ?? undefined;
  } catch {
    return undefined;
  }
}

export function saveWorkbookId(storage: Storage | undefined, id: string): void {
  try {
    storage?.setItem(WORKBOOK_KEY, id);
  } catch {
    // Storage refused or full: the workbook saved last opens instead.
  }
}
