'use client';

import { useActionState } from 'react';
import { NewPasswordFields } from '@/components/account/new-password-fields';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { setPassword } from './actions';

export function SetPasswordForm({ token, email }: { token: string; email: string }) {
  const [state, submit] = useActionState(setPassword, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid gap-4">
      <FormAlert state={state} />
      <input type="hidden" name="token" value={token} />
      {/* password managers keep the password under this name */}
      <input type="hidden" name="username" autoComplete="username" value={email} />
      <NewPasswordFields failed={failed} />
      <div>
        <SubmitButton>Set the password and sign in</SubmitButton>
      </div>
    </form>
  );
}
