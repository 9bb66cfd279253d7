import Link from 'next/link';
import type { ReactNode } from 'react';

import { classNames } from './class-names';

export interface Tab {
  href: string;
  label: ReactNode;
  count?: number;
}

/** Pages beside each other, as links. `current` is the href of the one shown. */
export function Tabs({ label, tabs, current }: { label: string; tabs: readonly Tab[]; current?: string }) {
  return (
    <nav aria-label={label} className="no-print border-b border-rule-strong">
      <ul className="-mb-px flex flex-wrap gap-x-5.5">
        {tabs.map((tab) => (
          <li key={tab.href}>
            <Link
              href={tab.href}
              aria-current={tab.href === current ? 'page' : undefined}
              className={classNames(
                'flex items-baseline gap-1.5 border-b-2 py-2',
                tab.href === current
                  ? 'border-uv font-semibold text-ink'
                  : 'border-transparent text-ink-2 hover:border-rule-strong hover:text-ink',
              )}
            >
              {tab.label}
              {tab.count !== undefined && <span className="num text-xs text-ink-2">{tab.count}</span>}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
