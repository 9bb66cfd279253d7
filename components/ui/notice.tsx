import type { ReactNode } from 'react';

import { classNames } from './class-names';
import { ToneShape, type Tone } from './pill';

const WASH: Record<Tone, string> = {
  order: 'bg-verdigris-wash',
  decide: 'bg-amber-wash',
  stop: 'bg-red-wash',
  note: 'bg-uv-wash',
  plain: 'bg-raised',
};

/** A few sentences a person should read before going on, with what they can do beside them. */
export function Notice({
  tone = 'note',
  title,
  action,
  children,
  className,
}: {
  tone?: Tone;
  title?: ReactNode;
  action?: ReactNode;
  children?: ReactNode;
  className?: string;
}) {
  return (
    <div
      className={classNames(
        'flex flex-wrap items-center gap-x-4 gap-y-2 rounded-card px-4 py-3',
        WASH[tone],
        className,
      )}
    >
      <ToneShape tone={tone} className="mt-1.5 self-start" />
      <div className="min-w-0 flex-1 basis-60">
        {title && <p className="font-semibold">{title}</p>}
        {children && <div>{children}</div>}
      </div>
      {action}
    </div>
  );
}
