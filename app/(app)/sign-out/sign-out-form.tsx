'use client';

import { useActionState } from 'react';
import { signOut } from './actions';

/** Sends the person out; it works without JavaScript. */
export function SignOutForm() {
  const [, submit] = useActionState(signOut, { status: 'idle' });
  return (
    <form action={submit}>
      <button type="submit" className="underline underline-offset-2 hover:text-night-ink">
        Sign out
      </button>
    </form>
  );
}
