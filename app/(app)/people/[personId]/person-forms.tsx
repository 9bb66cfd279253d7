'use client';

import { useActionState } from 'react';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextArea } from '@/components/ui/text-area';
import { LIMITS } from '@/lib/limits';
import type { PersonView } from '@/lib/views/person';
import { change, makeLink, setAccess, withdrawLink } from '@/app/(app)/people/actions';
import { NewLink } from '@/app/(app)/people/new-link';
import { PersonFields } from '@/app/(app)/people/person-fields';

export function ChangePersonForm({ person }: { person: PersonView }) {
  const [state, submit] = useActionState(change, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid max-w-xl gap-4">
      <FormAlert state={state} />
      <input type="hidden" name="personId" value={person.id} />
      <PersonFields person={person} failed={failed} />
      <div>
        <SubmitButton>Save</SubmitButton>
      </div>
    </form>
  );
}

export function MakeLinkForm({ personId }: { personId: string }) {
  const [state, submit] = useActionState(makeLink, { status: 'idle' });
  return (
    <form action={submit} className="grid gap-3">
      <FormAlert state={state} />
      {state.status === 'done' && state.shownOnce && <NewLink link={state.shownOnce} />}
      <input type="hidden" name="personId" value={personId} />
      <div>
        <SubmitButton variant="secondary" pendingLabel="Making…">
          Make a link to set a password
        </SubmitButton>
      </div>
    </form>
  );
}

export function WithdrawLinkForm({ personId }: { personId: string }) {
  const [state, submit] = useActionState(withdrawLink, { status: 'idle' });
  return (
    <form action={submit}>
      <FormAlert state={state} />
      <input type="hidden" name="personId" value={personId} />
      <SubmitButton variant="quiet" pendingLabel="Withdrawing…">
        Withdraw the open link
      </SubmitButton>
    </form>
  );
}

/** Close an account, or open it again. */
export function AccessForm({ personId, active }: { personId: string; active: boolean }) {
  const [state, submit] = useActionState(setAccess, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid max-w-xl gap-4">
      <FormAlert state={state} />
      <input type="hidden" name="personId" value={personId} />
      <input type="hidden" name="active" value={active ? 'no' : 'yes'} />
      <TextArea
        name="why"
        label="Why"
        optional
        hint="Goes into the record"
        rows={2}
        maxLength={LIMITS.reason}
        failed={failed}
      />
      <div>
        <SubmitButton variant={active ? 'danger' : 'secondary'}>
          {active ? 'Close the account' : 'Open the account again'}
        </SubmitButton>
      </div>
    </form>
  );
}
