'use client';

import { useActionState } from 'react';
import { FormAlert } from '@/components/ui/form-alert';
import { RadioGroup } from '@/components/ui/radio-group';
import { Select } from '@/components/ui/select';
import { SubmitButton } from '@/components/ui/submit-button';
import { ROLE_WORDS } from '@/lib/policies/role-words';
import type { PersonName } from '@/lib/views/notebook';
import { add, remove } from './actions';

export function MemberForm({ notebookId, people }: { notebookId: string; people: readonly PersonName[] }) {
  const [state, submit] = useActionState(add, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <form action={submit} noValidate className="grid max-w-xl gap-4">
      <FormAlert state={state} />
      <input type="hidden" name="notebookId" value={notebookId} />
      <Select
        name="personId"
        label="Person"
        failed={failed}
        options={people.map(({ id, name, role }) => ({ value: id, label: `${name}, ${ROLE_WORDS[role]}` }))}
      />
      <RadioGroup
        name="role"
        label="What they may do"
        initial="reader"
        failed={failed}
        choices={[
          { value: 'reader', label: 'Reader', hint: 'Looks at everything, changes nothing' },
          { value: 'contributor', label: 'Contributor', hint: 'Uploads, builds curves, reads batches' },
        ]}
      />
      <div>
        <SubmitButton>Add to the notebook</SubmitButton>
      </div>
    </form>
  );
}

export function RemoveMember({ membershipId, name }: { membershipId: string; name: string }) {
  const [state, submit] = useActionState(remove, { status: 'idle' });
  return (
    <form action={submit} className="inline-flex items-center gap-2">
      <FormAlert state={state} />
      <input type="hidden" name="membershipId" value={membershipId} />
      <SubmitButton variant="quiet" size="small" aria-label={`Remove ${name}`}>
        Remove
      </SubmitButton>
    </form>
  );
}
