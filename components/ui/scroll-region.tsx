'use client';

import { useEffect, useRef, useState, type ReactNode } from 'react';

import { classNames } from './class-names';

/** Scrolls inside itself, sideways and, when it is tall, downwards. The keyboard can stop at it only while there is something to scroll. */
export function ScrollRegion({
  label,
  tall = false,
  children,
}: {
  label: string;
  /** Long content stays as high as a plot and scrolls under its own head. */
  tall?: boolean;
  children: ReactNode;
}) {
  const region = useRef<HTMLDivElement>(null);
  const [scrolls, setScrolls] = useState(false);

  useEffect(() => {
    const element = region.current;
    if (!element) return;
    const measure = () =>
      setScrolls(
        element.scrollWidth > element.clientWidth + 1 || element.scrollHeight > element.clientHeight + 1,
      );
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    for (const child of element.children) observer.observe(child);
    return () => observer.disconnect();
  }, []);

  const stop = scrolls ? { tabIndex: 0, role: 'region', 'aria-label': `${label}, scrolls` } : {};
  return (
    <div
      ref={region}
      className={classNames(
        'scroll-region relative overflow-x-auto focus-visible:-outline-offset-2',
        tall &&
          'max-h-112 overflow-y-auto print:max-h-none [&_thead_th]:sticky [&_thead_th]:top-0 [&_thead_th]:z-1 [&_thead_th]:bg-sheet',
      )}
      {...stop}
    >
      {children}
    </div>
  );
}
