'use client';

import { useActionState } from 'react';
import { classNames } from '@/components/ui/class-names';
import { signOut } from './actions';

/** Sends the person out; it works without JavaScript. */
export function SignOutForm({ className = 'hover:text-night-ink' }: { className?: string }) {
  const [, submit] = useActionState(signOut, { status: 'idle' });
  return (
    <form action={submit}>
      <button type="submit" className={classNames('underline underline-offset-2', className)}>
        Sign out
      </button>
    </form>
  );
}
