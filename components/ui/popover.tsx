'use client';

import { Popover as Radix } from 'radix-ui';
import type { ReactNode } from 'react';

/** A small sheet that hangs on its trigger; what is behind it stays usable. */
export function Popover({
  trigger,
  label,
  children,
}: {
  trigger: ReactNode;
  label: string;
  children: ReactNode;
}) {
  return (
    <Radix.Root>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Content
          aria-label={label}
          sideOffset={6}
          collisionPadding={8}
          className="z-50 max-w-[min(24rem,calc(100vw-1rem))] rounded-card border border-rule-strong bg-sheet p-4 text-ink"
        >
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
