import type { ReactNode } from 'react';

import { classNames } from './class-names';

const SHARES = {
  even: 'xl:grid-cols-2',
  wideFirst: 'xl:grid-cols-[minmax(0,1fr)_22rem]',
  wideLast: 'xl:grid-cols-[26rem_minmax(0,1fr)]',
};

/** Side by side where there is room, stacked where there is not. */
export function Columns({
  share = 'even',
  className,
  children,
}: {
  share?: keyof typeof SHARES;
  className?: string;
  children: ReactNode;
}) {
  return (
    <div
      className={classNames('grid grid-cols-[minmax(0,1fr)] items-start gap-4.5', SHARES[share], className)}
    >
      {children}
    </div>
  );
}
