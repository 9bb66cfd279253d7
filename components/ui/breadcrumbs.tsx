import Link from 'next/link';
import { Fragment } from 'react';

export interface Crumb {
  label: string;
  href?: string;
}

/** Where this page stands. The last one is the page itself and no link. */
export function Breadcrumbs({ crumbs }: { crumbs: readonly Crumb[] }) {
  return (
    <nav aria-label="Where you are" className="no-print text-sm text-ink-2">
      <ol className="flex flex-wrap items-center gap-x-1.5">
        {crumbs.map((crumb, index) => (
          <Fragment key={index}>
            {index > 0 && (
              <li aria-hidden="true" className="text-ink-3">
                /
              </li>
            )}
            <li>
              {crumb.href && index < crumbs.length - 1 ? (
                <Link href={crumb.href} className="hover:text-ink hover:underline">
                  {crumb.label}
                </Link>
              ) : (
                <span aria-current={index === crumbs.length - 1 ? 'page' : undefined}>{crumb.label}</span>
              )}
            </li>
          </Fragment>
        ))}
      </ol>
    </nav>
  );
}
