import type { ReactNode } from 'react';

import { classNames } from '@/components/ui/class-names';

import { Brand } from './brand';
import { ThemeSwitch } from './theme-switch';

const SHEET = 'rounded-card border border-rule bg-sheet p-6';
const WIDTH = { form: `max-w-md ${SHEET}`, text: `max-w-3xl ${SHEET}`, tables: 'max-w-6xl' };

/** A page outside the notebooks: signing in, setting a password, a refusal. One sheet, between the two halves. */
export function PlainPage({
  title,
  banner,
  footer,
  width = 'form',
  children,
}: {
  title: ReactNode;
  banner?: ReactNode;
  footer?: ReactNode;
  /** a form to be filled in; a text to be read; tables, each on a sheet of its own */
  width?: 'form' | 'text' | 'tables';
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
        <div className={classNames('grid w-full grid-cols-[minmax(0,1fr)] gap-4', WIDTH[width])}>
          <h1>{title}</h1>
          {children}
        </div>
      </main>
      {footer}
    </div>
  );
}
