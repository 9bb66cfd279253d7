'use client';

import { useActionState } from 'react';
import { ShownOnce } from '@/components/account/shown-once';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { RadioGroup } from '@/components/ui/radio-group';
import { SubmitButton } from '@/components/ui/submit-button';
import { LIMITS } from '@/lib/limits';
import { make, revoke } from './actions';

const SCOPES = [
  { value: 'read', label: 'read', hint: 'Sees what you see and changes nothing' },
  {
    value: 'write',
    label: 'read and write',
    hint: 'Also works in notebooks as you do; never in accounts, people or tokens',
  },
];

export function NewTokenForm() {
  const [state, submit] = useActionState(make, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid max-w-xl gap-4">
      <FormAlert state={state} />
      {state.status === 'done' && state.shownOnce && (
        <ShownOnce text={state.shownOnce} label="Access token" copyLabel="Copy the token">
          Copy the token now: it is shown this once. A script sends it as{' '}
          <span className="num text-sm">Authorization: Bearer</span> and is you for as long as it is good.
        </ShownOnce>
      )}
      <Field
        name="name"
        label="What it is for"
        hint="So that you know later which one to revoke"
        maxLength={LIMITS.name}
        failed={failed}
      />
      <RadioGroup name="scope" label="What it may do" choices={SCOPES} initial="read" failed={failed} />
      <Field
        name="days"
        label="Good for"
        unit="days"
        inputMode="numeric"
        initial="90"
        hint={`${LIMITS.tokenDaysMax} days at most`}
        className="max-w-48"
        failed={failed}
      />
      <div>
        <SubmitButton pendingLabel="Making…">Make a token</SubmitButton>
      </div>
    </form>
  );
}

export function RevokeTokenForm({ id, name }: { id: string; name: string }) {
  const [state, submit] = useActionState(revoke, { status: 'idle' });
  return (
    <form action={submit} className="flex items-center gap-2">
      <FormAlert state={state} />
      <input type="hidden" name="id" value={id} />
      <SubmitButton
        variant="quiet"
        size="small"
        pendingLabel="Revoking…"
        aria-label={`Revoke the token ${name}`}
      >
        Revoke
      </SubmitButton>
    </form>
  );
}
