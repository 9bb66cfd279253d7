import type { ComponentProps } from 'react';

import { classNames } from './class-names';
import { ScrollRegion } from './scroll-region';

const SIDE = 'px-3 first:pl-4 last:pr-4';

/** A dense table of 33 px rows that scrolls inside its card. `label` is its name for those who do not see the card's title. */
export function Table({
  label,
  tall,
  className,
  children,
  ...rest
}: ComponentProps<'table'> & { label: string; tall?: boolean }) {
  return (
    <ScrollRegion label={label} tall={tall}>
      <table
        aria-label={label}
        className={classNames('w-full border-collapse text-left', className)}
        {...rest}
      >
        {children}
      </table>
    </ScrollRegion>
  );
}

/** A column's head. Numbers stand right, words left. */
export function Th({ numeric = false, className, ...rest }: ComponentProps<'th'> & { numeric?: boolean }) {
  return (
    <th
      scope="col"
      className={classNames(
        SIDE,
        'h-8.25 border-b py-1 align-middle text-xs font-medium whitespace-nowrap text-ink-2',
        numeric ? 'text-right' : 'text-left',
        className,
      )}
      {...rest}
    />
  );
}

/** The head of a row: what the row is about. */
export function RowHead({ className, ...rest }: ComponentProps<'th'>) {
  return (
    <th
      scope="row"
      className={classNames(
        SIDE,
        'h-8.25 border-b py-1 text-left align-middle font-medium in-[tr:last-child]:border-b-0',
        className,
      )}
      {...rest}
    />
  );
}

/** A cell. `numeric` sets tabular figures to the right; `selected` marks the one being worked on. */
export function Td({
  numeric = false,
  selected = false,
  className,
  ...rest
}: ComponentProps<'td'> & { numeric?: boolean; selected?: boolean }) {
  return (
    <td
      className={classNames(
        SIDE,
        'h-8.25 border-b py-1 align-middle in-[tr:last-child]:border-b-0',
        numeric && 'num text-right text-[0.84375rem] whitespace-nowrap',
        selected && 'bg-uv-wash outline-2 -outline-offset-2 outline-uv',
        className,
      )}
      {...rest}
    />
  );
}
