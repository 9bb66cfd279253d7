'use client';

import { X } from 'lucide-react';
import { Dialog as Radix } from 'radix-ui';
import type { ReactNode } from 'react';

import { classNames } from './class-names';

export interface DialogProps {
  title: ReactNode;
  /** one sentence under the title: what will happen */
  description?: ReactNode;
  /** the button that opens it; leave out when `open` is given */
  trigger?: ReactNode;
  open?: boolean;
  onOpenChange?: (open: boolean) => void;
  wide?: boolean;
  children: ReactNode;
}

/** A question on a sheet above the page. Escape and the cross close it, and the focus goes back to where it was. */
export function Dialog({ title, description, trigger, open, onOpenChange, wide, children }: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      {trigger && <Radix.Trigger asChild>{trigger}</Radix.Trigger>}
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-night/60" />
        <Radix.Content
          {...(description ? {} : { 'aria-describedby': undefined })}
          className={classNames(
            'fixed top-1/2 left-1/2 z-50 max-h-[90dvh] w-[calc(100vw-2rem)] -translate-x-1/2 -translate-y-1/2',
            'overflow-y-auto rounded-card border border-rule-strong bg-sheet p-5 text-ink',
            wide ? 'max-w-3xl' : 'max-w-lg',
          )}
        >
          <div className="mb-3 flex items-start justify-between gap-4">
            <Radix.Title className="font-serif text-[1.1875rem] leading-snug font-medium">
              {title}
            </Radix.Title>
            <Radix.Close
              aria-label="Close"
              className="-mt-1 -mr-1.5 grid size-8 place-items-center rounded-control text-ink-2 hover:bg-raised"
            >
              <X aria-hidden="true" className="size-4.5" />
            </Radix.Close>
          </div>
          {description && <Radix.Description className="mb-4 text-ink-2">{description}</Radix.Description>}
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}

/** Wraps the button that leaves the dialog without doing anything. */
export function DialogClose({ children }: { children: ReactNode }) {
  return <Radix.Close asChild>{children}</Radix.Close>;
}
