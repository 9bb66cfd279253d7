import type { ReactNode } from 'react';

import { Brand } from './brand';
import { NavigationList, type NavigationEntry, type RecentEntry } from './navigation-list';
import { NavigationSheet } from './navigation-sheet';
import { ThemeSwitch } from './theme-switch';

export interface NavigationProps {
  entries: readonly NavigationEntry[];
  recent?: readonly RecentEntry[];
  person: { name: string; role: string; laboratory: string };
  /** the form or link that signs the person out */
  signOut: ReactNode;
}

function SignedIn({ person, signOut }: Pick<NavigationProps, 'person' | 'signOut'>) {
  return (
    <div className="mt-auto grid gap-3 border-t border-night-3 px-2.5 pt-3 text-sm">
      <p>
        <span className="block text-night-ink-3">Signed in</span>
        <span className="block text-night-ink">{person.name}</span>
        <span className="block text-night-ink-3">
          {person.role} · {person.laboratory}
        </span>
      </p>
      <div className="flex flex-wrap items-center justify-between gap-2 text-night-ink-2">
        {signOut}
        <ThemeSwitch />
      </div>
    </div>
  );
}

/** The night side: beside the page on a wide screen, a bar above it with a menu on a narrow one. */
export function Navigation({ entries, recent, person, signOut }: NavigationProps) {
  const list = <NavigationList entries={entries} recent={recent} />;
  const signedIn = <SignedIn person={person} signOut={signOut} />;
  return (
    <>
      <header className="night-side no-print flex items-center justify-between gap-3 bg-night px-4 py-2.5 md:hidden">
        <Brand />
        <NavigationSheet>
          {list}
          {signedIn}
        </NavigationSheet>
      </header>
      <aside aria-label="Halflight" className="night-side no-print hidden w-52 shrink-0 bg-night md:block">
        <div className="sticky top-0 flex h-dvh flex-col gap-5 overflow-y-auto px-3.5 py-5">
          <div className="px-2">
            <Brand />
          </div>
          {list}
          {signedIn}
        </div>
      </aside>
    </>
  );
}
