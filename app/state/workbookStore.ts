import { produceWithPatches } from 'immer';
import { create } from 'zustand';
import { emptyWorkbook, type Workbook } from '../../src';
import { applyChanges, changesNothing, type HistoryStep, joinSteps, pushStep } from './history';
import { announce, endMessage, tell } from './viewStore';

export interface WorkbookState {
  workbook: Workbook;
  canUndo: boolean;
  canRedo: boolean;
  undoLabel?: string;
  redoLabel?: string;
  past: HistoryStep[];
  future: HistoryStep[];
}

function withHistory(workbook: Workbook, past: HistoryStep[], future: HistoryStep[]): WorkbookState {
  return {
    workbook,
    past,
    future,
    canUndo: past.length > 0,
    canRedo: future.length > 0,
    undoLabel: past.at(-1)?.label,
    redoLabel: future.at(-1)?.label,
  };
}

/** The one workbook on the page, with its undo history. Change it through the functions below only. */
export const useWorkbook = create<WorkbookState>(() => withHistory(emptyWorkbook('not-loaded', 'Workbook'), [], []));

/** Puts a loaded workbook on the page; its history starts empty. */
export function openWorkbook(workbook: Workbook): void {
  useWorkbook.setState(withHistory(workbook, [], []), true);
}

/**
 * Changes the workbook as one undo step. Edits in a row with the same `join` key are one step, until `endEdit()`
 * or an edit with another key. A change that changes nothing leaves no step.
 */
export function editWorkbook(label: string, change: (draft: Workbook) => void, { join }: { join?: string } = {}): void {
  const { workbook, past } = useWorkbook.getState();
  const [next, forward, inverse] = produceWithPatches(workbook, (draft: Workbook) => {
    change(draft);
  });
  const step: HistoryStep = { label, join, forward, inverse };
  if (forward.length === 0 || changesNothing(step)) return;
  const last = past.at(-1);
  const joined = join !== undefined && last?.join === join ? joinSteps(last, step) : undefined;
  const steps = joined ? pushStep(past.slice(0, -1), joined) : pushStep(past, step);
  useWorkbook.setState(withHistory(next, steps, []), true);
  endMessage();
}

/** Ends a run of joined edits: the next one is a step of its own. A run that came back to its start leaves none. */
export function endEdit(): void {
  const { workbook, past, future } = useWorkbook.getState();
  const last = past.at(-1);
  if (last?.join === undefined) return;
  const kept = changesNothing(last) ? past.slice(0, -1) : [...past.slice(0, -1), { ...last, join: undefined }];
  useWorkbook.setState(withHistory(workbook, kept, future), true);
}

/** Puts another workbook in place of this one, as a step that can be undone. */
export function replaceWorkbook(workbook: Workbook, label: string): void {
  const { workbook: before, past } = useWorkbook.getState();
  const step: HistoryStep = {
    label,
    forward: [{ op: 'replace', path: [], value: workbook }],
    inverse: [{ op: 'replace', path: [], value: before }],
  };
  useWorkbook.setState(withHistory(workbook, pushStep(past, step), []), true);
  endMessage();
}

/** What a step back or forward came to. The last message may speak of a state that is gone now: it goes too. */
function say(done: string | undefined, failed: string): void {
  if (done) announce(done);
  tell(done ? '' : failed);
}

/** Takes the last step back. A step that no longer fits is dropped with a word to the user, never in the way. */
export function undo(): void {
  endEdit();
  const { workbook, past, future } = useWorkbook.getState();
  const step = past.at(-1);
  if (!step) return;
  const before = applyChanges(workbook, step.inverse);
  useWorkbook.setState(withHistory(before ?? workbook, past.slice(0, -1), before ? [...future, step] : future), true);
  say(before && `Undone: ${step.label}`, `“${step.label}” could not be undone; the workbook is as it was.`);
}

/** Makes the last undone step again. */
export function redo(): void {
  const { workbook, past, future } = useWorkbook.getState();
  const step = future.at(-1);
  if (!step) return;
  const after = applyChanges(workbook, step.forward);
  useWorkbook.setState(withHistory(after ?? workbook, after ? pushStep(past, step) : past, future.slice(0, -1)), true);
  say(after && `Done again: ${step.label}`, `“${step.label}” could not be done again; the workbook is as it was.`);
}
