import { ChevronRight } from 'lucide-react';
import type { ReactNode } from 'react';

/** Something more, folded away until asked for. Works without scripts. */
export function Disclosure({
  summary,
  open,
  children,
}: {
  summary: ReactNode;
  open?: boolean;
  children: ReactNode;
}) {
  return (
    <details open={open} className="group">
      <summary className="flex w-fit list-none items-center gap-1.5 text-sm font-medium text-uv [&::-webkit-details-marker]:hidden">
        <ChevronRight aria-hidden="true" className="size-4 transition-transform group-open:rotate-90" />
        {summary}
      </summary>
      <div className="pt-3">{children}</div>
    </details>
  );
}
