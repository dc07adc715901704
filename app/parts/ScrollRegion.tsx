import { type ReactNode, useEffect, useRef, useState } from 'react';

/** What may be wider than its place and then scrolls sideways: reached by key exactly when there is something to scroll. */
export function ScrollRegion({ name, className, children }: { name: string; className?: string; children: ReactNode }) {
  const ref = useRef<HTMLElement>(null);
  const [scrolls, setScrolls] = useState(false);
  // Observed, not measured after every drawing: that would lay the page out twice for every frame of a drag.
  useEffect(() => {
    const { current } = ref;
    if (!current || typeof ResizeObserver === 'undefined') return;
    const sizes = new ResizeObserver(() => setScrolls(current.scrollWidth > current.clientWidth));
    const observe = () => {
      sizes.disconnect();
      for (const element of [current, ...current.children]) sizes.observe(element);
    };
    const parts = new MutationObserver(observe);
    parts.observe(current, { childList: true });
    observe();
    return () => {
      sizes.disconnect();
      parts.disconnect();
    };
  }, []);
  return (
    <section ref={ref} className={className} aria-label={name} tabIndex={scrolls ? 0 : undefined}>
      {children}
    </section>
  );
}
