import { useEffect, useRef } from 'react';
import type { Answer } from '../state/answerStore';
import { announce } from '../state/viewStore';

/** An answer is read out once it has stood so long: not on every frame of a drag. */
const SETTLED_MS = 900;

/** Says the new answer to those who do not see it, when the order has come to rest. The first one is no news. */
export function useSettledAnnouncement(answer: Answer, words: string | undefined): void {
  const settled = answer.phase === 'answered' && !answer.stale ? words : undefined;
  const last = useRef<string>(undefined);
  useEffect(() => {
    if (settled === undefined) return;
    const timer = setTimeout(() => {
      if (last.current !== undefined && last.current !== settled) announce(settled);
      last.current = settled;
    }, SETTLED_MS);
    return () => clearTimeout(timer);
  }, [settled]);
}
