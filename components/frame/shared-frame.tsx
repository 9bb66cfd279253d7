import type { ReactNode } from 'react';

import { BrandMark } from './brand';
import { ThemeSwitch } from './theme-switch';

/** The frame of a notebook shown by a share link: no navigation, and a strip that says what this is. */
export function SharedFrame({
  sharedBy,
  until,
  banner,
  footer,
  children,
}: {
  /** who shared it, for instance "Ines Farrow, Larkmoor Reach Laboratory" */
  sharedBy: string;
  /** the day the link ends, already written out */
  until?: string;
  banner?: ReactNode;
  footer?: ReactNode;
  children: ReactNode;
}) {
  return (
    <div className="flex min-h-dvh flex-col">
      <header className="night-side flex flex-wrap items-center gap-x-4 gap-y-2 bg-night px-4 py-2.5 md:px-7.5">
        <p className="flex items-center gap-2.5 font-serif text-[1.1875rem] font-medium text-night-ink">
          <BrandMark />
          Halflight
        </p>
        <p className="min-w-0 flex-1 basis-60 text-sm text-night-ink-2">
          Shared to be read by {sharedBy}
          {until && `, until ${until}`}. Nothing can be changed here.
        </p>
        <ThemeSwitch />
      </header>
      {banner}
      <main
        id="main"
        tabIndex={-1}
        className="mx-auto grid w-full max-w-330 content-start gap-4.5 px-4 py-5 outline-none md:px-7.5"
      >
        {children}
      </main>
      {footer}
    </div>
  );
}
