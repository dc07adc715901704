import { type ReactNode, useLayoutEffect, useState } from 'react';
import { useWidth } from './useWidth';

/** What may be wider than its place and then scrolls sideways: reached by key exactly when there is something to scroll. */
export function ScrollRegion({ name, className, children }: { name: string; className?: string; children: ReactNode }) {
  const [ref, width] = useWidth<HTMLElement>(0);
  const [scrolls, setScrolls] = useState(false);
  // After every drawing: the content may have grown as well as the place have shrunk.
  useLayoutEffect(() => {
    const { current } = ref;
    if (current) setScrolls(current.scrollWidth > Math.max(width, current.clientWidth));
  });
  return (
    <section ref={ref} className={className} aria-label={name} tabIndex={scrolls ? 0 : undefined}>
      {children}
    </section>
  );
}
