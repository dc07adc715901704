import { applyPatches, enablePatches, type Patch } from 'immer';
import type { Workbook } from '../../src';

enablePatches();

/** How many steps back are kept. */
export const MOST_STEPS = 200;

/** One step of the undo history, as changes forward and back. */
export interface HistoryStep {
  label: string;
  /** Edits in a row with the same key (a drag, typing in one cell) are one step. */
  join?: string;
  forward: Patch[];
  inverse: Patch[];
}

const pathOf = (patch: Patch) => JSON.stringify(patch.path);
const onlyReplaces = (patches: Patch[]) => patches.every((patch) => patch.op === 'replace');

/** True where the step leaves everything as it was. */
export function changesNothing({ forward, inverse }: Pick<HistoryStep, 'forward' | 'inverse'>): boolean {
  if (!onlyReplaces(forward) || !onlyReplaces(inverse)) return false;
  const before = new Map(inverse.map((patch) => [pathOf(patch), JSON.stringify(patch.value)]));
  return forward.every((patch) => before.get(pathOf(patch)) === JSON.stringify(patch.value));
}

/** The two steps as one. A drag that moves one value a thousand times stays two patches long. */
export function joinSteps(first: HistoryStep, second: HistoryStep): HistoryStep {
  const samePlaces =
    onlyReplaces([...first.forward, ...first.inverse, ...second.forward, ...second.inverse]) &&
    first.inverse.length === second.inverse.length &&
    first.inverse.every((patch) => second.inverse.some((other) => pathOf(other) === pathOf(patch)));
  if (samePlaces) return { ...first, forward: second.forward };
  return {
    ...first,
    forward: [...first.forward, ...second.forward],
    inverse: [...second.inverse, ...first.inverse],
  };
}

/** The past with one more step, bounded. */
export function pushStep(past: readonly HistoryStep[], step: HistoryStep): HistoryStep[] {
  return [...past, step].slice(-MOST_STEPS);
}

/** The workbook after the changes; undefined where they do not fit it (a broken step). */
export function applyChanges(workbook: Workbook, changes: readonly Patch[]): Workbook | undefined {
  try {
    return applyPatches(workbook, changes);
  } catch {
    return undefined;
  }
}
