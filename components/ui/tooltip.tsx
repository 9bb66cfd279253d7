'use client';

import { Tooltip as Radix } from 'radix-ui';
import type { ReactNode } from 'react';

/** A few words beside a thing that has the focus or the pointer. Never the only place where something is said. */
export function Tooltip({ text, children }: { text: ReactNode; children: ReactNode }) {
  return (
    <Radix.Provider delayDuration={250}>
      <Radix.Root>
        <Radix.Trigger asChild>{children}</Radix.Trigger>
        <Radix.Portal>
          <Radix.Content
            sideOffset={6}
            collisionPadding={8}
            className="z-50 max-w-72 rounded-control bg-night-2 px-2.5 py-1.5 text-sm text-night-ink"
          >
            {text}
          </Radix.Content>
        </Radix.Portal>
      </Radix.Root>
    </Radix.Provider>
  );
}
