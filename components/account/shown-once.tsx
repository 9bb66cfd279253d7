import type { ReactNode } from 'react';

import { CopyButton } from '@/components/ui/copy-button';

/** A secret just made: a link, a token. It stands here this once; its hash is all that is kept. */
export function ShownOnce({
  text,
  label,
  copyLabel,
  children,
}: {
  text: string;
  /** what the text is, for those who listen */
  label: string;
  copyLabel: string;
  children: ReactNode;
}) {
  return (
    <div role="status" className="grid gap-2 rounded-control bg-amber-wash p-3">
      <div>{children}</div>
      <p aria-label={label} role="group" className="num text-sm break-all select-all">
        {text}
      </p>
      <div>
        <CopyButton text={text} label={copyLabel} />
      </div>
    </div>
  );
}
