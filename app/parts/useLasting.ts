import { useEffect, useState } from 'react';

/** A flag held back until it has stood for a moment: what is over at once is never drawn, and costs no frame. */
export function useLasting(flag: boolean, forMs = 150): boolean {
  const [lasts, setLasts] = useState(false);
  useEffect(() => {
    if (!flag) return;
    const timer = setTimeout(() => setLasts(true), forMs);
    return () => {
      clearTimeout(timer);
      setLasts(false);
    };
  }, [flag, forMs]);
  return flag && lasts;
}
