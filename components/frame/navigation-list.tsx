'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';

import { classNames } from '@/components/ui/class-names';

export interface NavigationEntry {
  href: string;
  label: string;
  count?: number;
  /** a few words that ask for attention, for instance "1 due" */
  due?: string;
}

export interface RecentEntry {
  href: string;
  label: string;
}

const ENTRY = 'flex min-h-9 items-center justify-between gap-3 rounded-[7px] px-2.5 py-1.5';

/** True on the page itself and on every page below it. */
export function isCurrent(pathname: string, href: string): boolean {
  return pathname === href || (href !== '/' && pathname.startsWith(`${href}/`));
}

/** The entries of the night side, in a list; the one that is open is marked. */
export function NavigationList({
  entries,
  recent = [],
}: {
  entries: readonly NavigationEntry[];
  recent?: readonly RecentEntry[];
}) {
  const pathname = usePathname();
  const mark = (href: string) => (isCurrent(pathname, href) ? ('page' as const) : undefined);
  return (
    <nav aria-label="Main" className="grid gap-1 text-night-ink-2">
      <ul className="grid gap-0.5">
        {entries.map((entry) => (
          <li key={entry.href}>
            <Link
              href={entry.href}
              aria-current={mark(entry.href)}
              className={classNames(
                ENTRY,
                'hover:text-night-ink aria-[current]:bg-night-3 aria-[current]:text-night-ink',
              )}
            >
              {entry.label}
              {entry.due ? (
                <span className="text-sm text-night-warn">{entry.due}</span>
              ) : (
                entry.count !== undefined && <span className="num text-sm">{entry.count}</span>
              )}
            </Link>
          </li>
        ))}
      </ul>
      {recent.length > 0 && (
        <>
          <h2 className="mt-4 px-2.5 text-xs font-normal text-night-ink-3">Recent</h2>
          <ul className="grid gap-0.5">
            {recent.map((entry) => (
              <li key={entry.href}>
                <Link
                  href={entry.href}
                  aria-current={isCurrent(pathname, entry.href) ? 'true' : undefined}
                  className={classNames(ENTRY, 'hover:text-night-ink aria-[current]:text-night-ink')}
                >
                  <span className="line-clamp-2">{entry.label}</span>
                </Link>
              </li>
            ))}
          </ul>
        </>
      )}
    </nav>
  );
}
