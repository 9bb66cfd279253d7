'use client';

import { useActionState } from 'react';
import { CopyButton } from '@/components/ui/copy-button';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { LIMITS } from '@/lib/limits';
import { revoke, share } from './actions';

export function ShareForm({ notebookId }: { notebookId: string }) {
  const [state, submit] = useActionState(share, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid max-w-xl gap-4">
      {failed && <FormAlert state={failed} />}
      {state.status === 'done' && state.message && <NewAddress address={state.message} />}
      <input type="hidden" name="notebookId" value={notebookId} />
      <Field
        name="label"
        label="Who is it for"
        hint="So that you know later which link to withdraw"
        maxLength={LIMITS.name}
        failed={failed}
      />
      <Field name="days" label="Good for" unit="days" inputMode="numeric" initial="30" failed={failed} />
      <div>
        <SubmitButton pendingLabel="Making…">Make a link</SubmitButton>
      </div>
    </form>
  );
}

function NewAddress({ address }: { address: string }) {
  return (
    <div role="status" className="grid gap-2 rounded-control bg-verdigris-wash p-3">
      <p>Copy the link now: it is shown this once. Whoever holds it can look at the notebook.</p>
      <p className="num text-sm break-all" data-testid="share-address">
        {address}
      </p>
      <div>
        <CopyButton text={address} label="Copy the link" />
      </div>
    </div>
  );
}

export function RevokeLink({ shareLinkId, label }: { shareLinkId: string; label: string }) {
  const [state, submit] = useActionState(revoke, { status: 'idle' });
  return (
    <form action={submit} className="inline-flex items-center gap-2">
      <FormAlert state={state} />
      <input type="hidden" name="shareLinkId" value={shareLinkId} />
      <SubmitButton variant="quiet" size="small" aria-label={`Withdraw the link for ${label}`}>
        Withdraw
      </SubmitButton>
    </form>
  );
}
