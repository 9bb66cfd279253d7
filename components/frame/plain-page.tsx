import type { ReactNode } from 'react';

import { Brand } from './brand';
import { ThemeSwitch } from './theme-switch';

/** A page outside the notebooks: signing in, setting a password, a refusal. One sheet, between the two halves. */
export function PlainPage({
  title,
  banner,
  footer,
  children,
}: {
  title: ReactNode;
  banner?: ReactNode;
  footer?: ReactNode;
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
        <div className="grid w-full max-w-md gap-4 rounded-card border border-rule bg-sheet p-6">
          <h1>{title}</h1>
          {children}
        </div>
      </main>
      {footer}
    </div>
  );
}
