import type { WorkbookOrder } from '../../src';

interface OfOrder {
  order: WorkbookOrder;
}

/** The same order but for its limits: for parts of the editor that need not be drawn anew while a limit is dragged. */
export function sameButForLimits({ order: a }: OfOrder, { order: b }: OfOrder): boolean {
  const keys = new Set([...Object.keys(a), ...Object.keys(b)]) as Set<keyof WorkbookOrder>;
  for (const key of keys) if (key !== 'limits' && a[key] !== b[key]) return false;
  return true;
}
