'use client';

import { Menu as MenuIcon, X } from 'lucide-react';
import { usePathname } from 'next/navigation';
import { Dialog } from 'radix-ui';
import { useState, type ReactNode } from 'react';

const SQUARE = 'grid size-10 place-items-center rounded-control text-night-ink hover:bg-night-3';

/** The narrow screen's navigation: a sheet over the page, closed by Escape, the cross, or by going somewhere. */
export function NavigationSheet({ children }: { children: ReactNode }) {
  const pathname = usePathname();
  const [openAt, setOpenAt] = useState<string | null>(null);
  return (
    <Dialog.Root open={openAt === pathname} onOpenChange={(open) => setOpenAt(open ? pathname : null)}>
      <Dialog.Trigger aria-label="Open the menu" className={SQUARE}>
        <MenuIcon aria-hidden="true" className="size-5" />
      </Dialog.Trigger>
      <Dialog.Portal>
        <Dialog.Overlay className="fixed inset-0 z-40 bg-night/60" />
        <Dialog.Content
          aria-describedby={undefined}
          className="night-side fixed inset-y-0 right-0 z-50 flex w-72 max-w-[85vw] flex-col gap-4 overflow-y-auto bg-night p-4"
        >
          <div className="flex items-center justify-between">
            <Dialog.Title className="px-2.5 text-sm text-night-ink-3">Menu</Dialog.Title>
            <Dialog.Close aria-label="Close the menu" className={SQUARE}>
              <X aria-hidden="true" className="size-5" />
            </Dialog.Close>
          </div>
          {children}
        </Dialog.Content>
      </Dialog.Portal>
    </Dialog.Root>
  );
}
