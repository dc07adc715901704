import { useEffect, useRef, useState } from 'react';

/** A value that follows another at most so often, and catches up at the end: for what is costly to draw. */
export function usePaced<Value>(value: Value, everyMs: number): Value {
  const [paced, setPaced] = useState(value);
  const last = useRef(-Infinity);
  useEffect(() => {
    const wait = Math.max(0, last.current + everyMs - performance.now());
    const timer = setTimeout(() => {
      last.current = performance.now();
      setPaced(value);
    }, wait);
    return () => clearTimeout(timer);
  }, [value, everyMs]);
  return paced;
}
