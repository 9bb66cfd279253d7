'use client';

import { useActionState } from 'react';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { signIn } from './actions';

export function SignInForm() {
  const [state, submit] = useActionState(signIn, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid gap-4">
      <FormAlert state={state} />
      <Field
        name="email"
        label="E-mail address"
        type="email"
        autoComplete="username"
        failed={failed}
        autoFocus
      />
      <Field
        name="password"
        label="Password"
        type="password"
        autoComplete="current-password"
        failed={failed}
      />
      <div>
        <SubmitButton pendingLabel="Signing in…">Sign in</SubmitButton>
      </div>
    </form>
  );
}
