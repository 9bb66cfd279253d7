import type { ReactNode } from 'react';

import { Breadcrumbs, type Crumb } from '@/components/ui/breadcrumbs';

/** The top of a page: where it stands, its title, a status beside it, what can be done at the right. */
export function PageHeader({
  crumbs = [],
  title,
  status,
  lead,
  actions,
}: {
  crumbs?: readonly Crumb[];
  title: ReactNode;
  status?: ReactNode;
  lead?: ReactNode;
  actions?: ReactNode;
}) {
  return (
    <header className="grid gap-1.5">
      {crumbs.length > 0 && <Breadcrumbs crumbs={crumbs} />}
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <div className="flex min-w-0 flex-wrap items-center gap-x-4 gap-y-1">
          <h1 className="min-w-0">{title}</h1>
          {status}
        </div>
        {actions && <div className="no-print flex flex-wrap gap-2">{actions}</div>}
      </div>
      {lead && <div className="max-w-prose text-ink-2">{lead}</div>}
    </header>
  );
}
