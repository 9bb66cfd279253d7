import { LinkButton } from './button';

/** Steps through a long list by cursor. `shown` says what is seen, for instance "1 to 50 of 230". */
export function Pagination({
  label,
  previous,
  next,
  shown,
}: {
  label: string;
  previous?: string;
  next?: string;
  shown?: string;
}) {
  if (!previous && !next) return null;
  return (
    <nav aria-label={label} className="no-print flex flex-wrap items-center gap-2 border-t px-4 py-2">
      {shown && <p className="mr-auto text-sm text-ink-2">{shown}</p>}
      {previous && (
        <LinkButton href={previous} rel="prev" size="small">
          Earlier page
        </LinkButton>
      )}
      {next && (
        <LinkButton href={next} rel="next" size="small">
          Next page
        </LinkButton>
      )}
    </nav>
  );
}
