'use client';

import Link from 'next/link';
import { DropdownMenu as Radix } from 'radix-ui';
import type { ReactNode } from 'react';

import { classNames } from './class-names';

export type MenuEntry =
  | { kind: 'link'; label: ReactNode; href: string; download?: boolean }
  | { kind: 'action'; label: ReactNode; onSelect: () => void; danger?: boolean; disabled?: boolean }
  | { kind: 'rule' };

const ITEM =
  'flex min-h-8.25 w-full items-center rounded-[6px] px-3 py-1 text-left text-base outline-none select-none ' +
  'data-highlighted:bg-uv-wash data-highlighted:text-uv data-disabled:opacity-60';

function Entry({ entry }: { entry: MenuEntry }) {
  if (entry.kind === 'rule') return <Radix.Separator className="my-1 h-px bg-rule" />;
  if (entry.kind === 'link') {
    return (
      <Radix.Item asChild className={ITEM}>
        {entry.download ? (
          <a href={entry.href} download>
            {entry.label}
          </a>
        ) : (
          <Link href={entry.href}>{entry.label}</Link>
        )}
      </Radix.Item>
    );
  }
  return (
    <Radix.Item
      className={classNames(ITEM, entry.danger && 'text-red')}
      disabled={entry.disabled}
      onSelect={entry.onSelect}
    >
      {entry.label}
    </Radix.Item>
  );
}

/** A list of things to do, opened by the trigger; arrows move, letters jump, Escape closes. */
export function Menu({
  trigger,
  entries,
  align = 'end',
}: {
  trigger: ReactNode;
  entries: readonly MenuEntry[];
  align?: 'start' | 'end';
}) {
  return (
    <Radix.Root>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Content
          align={align}
          sideOffset={6}
          collisionPadding={8}
          className="z-50 min-w-48 rounded-card border border-rule-strong bg-sheet p-1 text-ink"
        >
          {entries.map((entry, index) => (
            <Entry key={index} entry={entry} />
          ))}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
