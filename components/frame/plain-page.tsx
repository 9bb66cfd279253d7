import type { ReactNode } from 'react';

import { classNames } from '@/components/ui/class-names';

import { Brand } from './brand';
import { ThemeSwitch } from './theme-switch';

/** A page outside the notebooks: signing in, setting a password, a refusal. One sheet, between the two halves. */
export function PlainPage({
  title,
  banner,
  footer,
  wide = false,
  children,
}: {
  title: ReactNode;
  banner?: ReactNode;
  footer?: ReactNode;
  /** for a page to be read, not filled in */
  wide?: boolean;
  children: ReactNode;
}) {
  return (
    <div className="flex min-h-dvh flex-col">
      <header className="night-side flex items-center justify-between bg-night px-4 py-3 md:px-7.5">
        <Brand />
        <ThemeSwitch />
      </header>
      {banner}
      <main
        id="main"
        tabIndex={-1}
        className="grid flex-1 content-start justify-items-center px-4 py-10 outline-none"
      >
        <div
          className={classNames(
            'grid w-full gap-4 rounded-card border border-rule bg-sheet p-6',
            wide ? 'max-w-3xl' : 'max-w-md',
          )}
        >
          <h1>{title}</h1>
          {children}
        </div>
      </main>
      {footer}
    </div>
  );
}
