'use client';

import { useActionState } from 'react';
import { NewPasswordFields } from '@/components/account/new-password-fields';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { LIMITS } from '@/lib/limits';
import { changePassword, endOne, rename, signOutEverywhere } from './actions';

export function NameForm({ name }: { name: string }) {
  const [state, submit] = useActionState(rename, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid max-w-md gap-4">
      <FormAlert state={state} />
      <Field
        name="name"
        label="Name"
        hint="As it stands in the record from now on; older entries keep the name of their day"
        initial={name}
        autoComplete="name"
        maxLength={LIMITS.name}
        failed={failed}
      />
      <div>
        <SubmitButton>Save the name</SubmitButton>
      </div>
    </form>
  );
}

export function PasswordForm({ email }: { email: string }) {
  const [state, submit] = useActionState(changePassword, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid max-w-md gap-4">
      <FormAlert state={state} />
      {/* password managers keep the password under this name */}
      <input type="hidden" name="username" autoComplete="username" value={email} />
      <Field
        name="currentPassword"
        label="Password now"
        type="password"
        autoComplete="current-password"
        failed={failed}
      />
      <NewPasswordFields failed={failed} />
      <div>
        <SubmitButton>Change the password</SubmitButton>
      </div>
    </form>
  );
}

export function EndSessionForm({ id, opened }: { id: string; opened: string }) {
  const [state, submit] = useActionState(endOne, { status: 'idle' });
  return (
    <form action={submit} className="flex items-center gap-2">
      <FormAlert state={state} />
      <input type="hidden" name="id" value={id} />
      <SubmitButton
        variant="quiet"
        size="small"
        pendingLabel="Ending…"
        aria-label={`End the session opened ${opened}`}
      >
        End
      </SubmitButton>
    </form>
  );
}

export function SignOutEverywhereForm() {
  const [state, submit] = useActionState(signOutEverywhere, { status: 'idle' });
  return (
    <form action={submit}>
      <FormAlert state={state} />
      <SubmitButton variant="danger" size="small" pendingLabel="Signing out…">
        Sign out everywhere
      </SubmitButton>
    </form>
  );
}
