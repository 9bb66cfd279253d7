'use client';

import { useEffect, useRef, useState, type ReactNode } from 'react';

/** Scrolls sideways inside itself. The keyboard can stop at it only while there is something to scroll. */
export function ScrollRegion({ label, children }: { label: string; children: ReactNode }) {
  const region = useRef<HTMLDivElement>(null);
  const [scrolls, setScrolls] = useState(false);

  useEffect(() => {
    const element = region.current;
    if (!element) return;
    const measure = () => setScrolls(element.scrollWidth > element.clientWidth + 1);
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    for (const child of element.children) observer.observe(child);
    return () => observer.disconnect();
  }, []);

  const stop = scrolls ? { tabIndex: 0, role: 'region', 'aria-label': `${label}, scrolls sideways` } : {};
  return (
    <div
      ref={region}
      className="scroll-region relative overflow-x-auto focus-visible:-outline-offset-2"
      {...stop}
    >
      {children}
    </div>
  );
}
