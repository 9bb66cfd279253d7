import { useId, type ReactNode } from 'react';

import { classNames } from './class-names';

/** A sheet with a title. `aside` is the quiet remark on the right; `flush` lets a table touch the edges. */
export function Card({
  title,
  aside,
  actions,
  flush = false,
  level = 2,
  className,
  children,
}: {
  title?: ReactNode;
  aside?: ReactNode;
  actions?: ReactNode;
  flush?: boolean;
  level?: 2 | 3;
  className?: string;
  children: ReactNode;
}) {
  const id = useId();
  const Heading = `h${level}` as const;
  return (
    <section
      aria-labelledby={title ? id : undefined}
      className={classNames('min-w-0 rounded-card border bg-sheet', flush && 'overflow-hidden', className)}
    >
      {(title || aside || actions) && (
        <header className="flex min-h-11 flex-wrap items-center gap-x-4 gap-y-1 border-b px-4 py-2">
          {title && (
            <Heading id={id} className="text-[0.875rem] font-semibold">
              {title}
            </Heading>
          )}
          {aside && <p className="ml-auto text-sm text-ink-2">{aside}</p>}
          {actions && (
            <div className={classNames('flex flex-wrap gap-2', !aside && 'ml-auto')}>{actions}</div>
          )}
        </header>
      )}
      <div className={flush ? undefined : 'p-4'}>{children}</div>
    </section>
  );
}
