import type { ReactNode } from 'react';

/** A list with nothing in it: what would stand here, and the one next step. */
export function EmptyState({
  title,
  action,
  children,
}: {
  title: ReactNode;
  action?: ReactNode;
  children?: ReactNode;
}) {
  return (
    <div className="grid justify-items-center gap-3 px-6 py-12 text-center">
      <svg viewBox="0 0 48 48" aria-hidden="true" className="size-12">
        <circle cx="24" cy="24" r="20" className="fill-raised stroke-control" strokeDasharray="3 4" />
        <path d="M24 4a20 20 0 0 1 0 40z" className="fill-rule" />
      </svg>
      <p className="font-serif text-fact font-medium">{title}</p>
      {children && <div className="max-w-prose text-ink-2">{children}</div>}
      {action}
    </div>
  );
}
