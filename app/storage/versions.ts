import type { StoredVersion } from './database';

/** How many earlier states of a workbook are kept. */
export const MOST_VERSIONS = 20;
/** States saved closer together than this count as one [ms]. */
export const VERSION_SPACING_MS = 60_000;

/** What to do with the kept versions when a new state is saved. */
export interface HistoryChange {
  add: boolean;
  remove: number[];
}

const time = ({ savedAt }: StoredVersion) => Date.parse(savedAt);

/**
 * Twenty states a minute apart: a state saved within a minute of the one before the last takes the last one's place,
 * so that a spell of typing does not push out yesterday; not so a state that comes `apart`, as an import over it does.
 * The same text twice is kept once.
 */
export function placeInHistory(kept: readonly StoredVersion[], next: StoredVersion, apart = false): HistoryChange {
  const byDate = [...kept].sort((a, b) => time(a) - time(b));
  const last = byDate.at(-1);
  if (last?.text === next.text) return { add: false, remove: [] };
  const beforeLast = byDate.at(-2);
  const close =
    !apart && last !== undefined && beforeLast !== undefined && time(next) - time(beforeLast) < VERSION_SPACING_MS;
  const gone = close ? [last] : [];
  const left = byDate.filter((version) => !gone.includes(version));
  gone.push(...left.slice(0, Math.max(0, left.length + 1 - MOST_VERSIONS)));
  return { add: true, remove: gone.flatMap(({ key }) => (key === undefined ? [] : [key])) };
}

/** Keys of kept states in the order in which they give way to a workbook that finds no room: its own oldest first. */
export function inOrderOfLoss(kept: readonly StoredVersion[], workbookId: string): number[] {
  const byDate = [...kept].sort((a, b) => time(a) - time(b));
  const own = byDate.filter((version) => version.workbookId === workbookId);
  const others = byDate.filter((version) => version.workbookId !== workbookId);
  return [...own, ...others].flatMap(({ key }) => (key === undefined ? [] : [key]));
}
