'use client';

import { useActionState } from 'react';
import { NewPasswordFields } from '@/components/account/new-password-fields';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { Select } from '@/components/ui/select';
import { SubmitButton } from '@/components/ui/submit-button';
import { LIMITS } from '@/lib/limits';
import { setUp } from './actions';

export function SetUpForm({ zones, zone }: { zones: readonly string[]; zone: string }) {
  const [state, submit] = useActionState(setUp, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid gap-4">
      <FormAlert state={state} />
      <Field
        name="code"
        label="Code"
        hint="Printed in the terminal where Halflight was started; each start prints a new one"
        autoComplete="one-time-code"
        failed={failed}
        autoFocus
      />
      <Field
        name="laboratory"
        label="Name of the laboratory"
        autoComplete="organization"
        maxLength={LIMITS.name}
        failed={failed}
      />
      <Select
        name="timeZone"
        label="Time zone"
        hint="Every date and time is shown in it"
        initial={zone}
        options={zones.map((name) => ({ value: name, label: name.replaceAll('_', ' ') }))}
        failed={failed}
      />
      <h2 className="mt-2">The first administrator</h2>
      <Field name="name" label="Your name" autoComplete="name" maxLength={LIMITS.name} failed={failed} />
      <Field name="email" label="Your e-mail address" type="email" autoComplete="username" failed={failed} />
      <NewPasswordFields failed={failed} />
      <div>
        <SubmitButton pendingLabel="Setting up…">Set up the laboratory</SubmitButton>
      </div>
    </form>
  );
}
