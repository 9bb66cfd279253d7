import type { ReactNode } from 'react';

/** Words for those who listen. */
export function VisuallyHidden({ children }: { children: ReactNode }) {
  return <span className="sr-only">{children}</span>;
}
