import type { Workbook } from '../../src';
import type { Answer } from './answerStore';
import type { Explained, ExplainState } from './explainStore';
import type { SaveState } from './saveStore';
import type { ViewState } from './viewStore';
import type { WorkbookState } from './workbookStore';

/** What becomes of a field of the app's state. */
export interface FieldClass {
  /** Survives a reload. */
  stored: boolean;
  /** Undo takes its changes back. */
  undoable: boolean;
  /** Stands in the workbook file. */
  exported: boolean;
}

/** Every field of a state, none forgotten: a new field does not compile until it is classified here. */
type Classified<State> = { readonly [Field in keyof State]-?: FieldClass };

const KEPT: FieldClass = { stored: true, undoable: true, exported: true };
const OF_THIS_WINDOW: FieldClass = { stored: true, undoable: false, exported: false };
const PASSING: FieldClass = { stored: false, undoable: false, exported: false };

export const WORKBOOK_DOCUMENT_FIELDS: Classified<Workbook> = {
  format: KEPT,
  version: KEPT,
  id: KEPT,
  name: KEPT,
  invented: KEPT,
  products: KEPT,
  orders: KEPT,
  ownProperties: KEPT,
  settings: KEPT,
};

export const WORKBOOK_FIELDS: Classified<WorkbookState> = {
  workbook: KEPT,
  canUndo: PASSING,
  canRedo: PASSING,
  undoLabel: PASSING,
  redoLabel: PASSING,
  past: PASSING,
  future: PASSING,
};

export const VIEW_FIELDS: Classified<ViewState> = {
  orderId: OF_THIS_WINDOW,
  theme: OF_THIS_WINDOW,
  announcement: PASSING,
  message: PASSING,
  messageStays: PASSING,
  orderToName: PASSING,
};

/** Answers are worked out anew. */
export const ANSWER_FIELDS: Classified<Answer> = {
  phase: PASSING,
  stale: PASSING,
  outcome: PASSING,
  order: PASSING,
  omitted: PASSING,
  unread: PASSING,
  notes: PASSING,
  progress: PASSING,
  sinceMs: PASSING,
  message: PASSING,
};

/** What is told about an answer is worked out anew with it. */
export const EXPLAIN_FIELDS: Classified<ExplainState> = {
  explained: PASSING,
  rounding: PASSING,
};

export const EXPLAINED_FIELDS: Classified<Explained> = {
  recipe: PASSING,
  impossible: PASSING,
  alternatives: PASSING,
  rounded: PASSING,
  roundedTo: PASSING,
  opinion: PASSING,
};

export const SAVE_FIELDS: Classified<SaveState> = {
  state: PASSING,
  message: PASSING,
  setAside: PASSING,
  unguarded: PASSING,
};

/** The fields that survive a reload. */
export function storedFields<State>(fields: Classified<State>): (keyof State)[] {
  const names = Object.keys(fields) as (keyof State)[];
  return names.filter((name) => fields[name].stored);
}
