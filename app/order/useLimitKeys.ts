import { useState } from 'react';
import type { Limit } from '../../src';
import { isSameProperty } from '../parts/limitEnds';

interface Known {
  limits: readonly Limit[];
  keys: readonly number[];
  next: number;
}

/** A key for each limit, which has no id of its own; it stays while the limit is edited, its temperature included. */
export function useLimitKeys(limits: readonly Limit[]): readonly number[] {
  const [known, setKnown] = useState<Known>(() => following({ limits: [], keys: [], next: 0 }, limits));
  if (known.limits === limits) return known.keys;
  const now = following(known, limits);
  setKnown(now);
  return now.keys;
}

/** As many limits as before: they were edited in place. Otherwise the same limit keeps its key. */
function following(known: Known, limits: readonly Limit[]): Known {
  if (known.limits.length === limits.length) return { ...known, limits };
  const free = known.limits.map((limit, place) => ({ limit, key: known.keys[place] ?? -1 }));
  let { next } = known;
  const take = (matches: (limit: Limit) => boolean) => {
    const place = free.findIndex(({ limit }) => matches(limit));
    return place < 0 ? undefined : free.splice(place, 1)[0]?.key;
  };
  const unchanged = limits.map((limit) => take((old) => old === limit));
  const keys = limits.map((limit, place) => {
    const key = unchanged[place] ?? take((old) => isSameProperty(old, limit));
    if (key !== undefined) return key;
    next += 1;
    return next;
  });
  return { limits, keys, next };
}
