'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog, DialogClose } from '@/components/ui/dialog';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextArea } from '@/components/ui/text-area';
import type { FormState } from '@/lib/form-state';
import { LIMITS } from '@/lib/limits';

/** Declare a version void, with a reason. It stays to be seen. */
export function VoidCurve({
  curve,
  action,
}: {
  curve: { readonly id: string; readonly version: number };
  action: (state: FormState, form: FormData) => Promise<FormState>;
}) {
  const [state, submit] = useActionState(action, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  return (
    <Dialog
      title={`Declare version ${curve.version} void`}
      description="Nothing is deleted. It stays here with your reason, and no new batch can be read on it."
      trigger={<Button variant="danger">Void</Button>}
    >
      <form action={submit} noValidate className="grid gap-4">
        <FormAlert state={state} />
        <input type="hidden" name="curveId" value={curve.id} />
        <TextArea name="reason" label="Reason" maxLength={LIMITS.reason} rows={2} failed={failed} />
        <div className="flex flex-wrap gap-2">
          <SubmitButton variant="danger">Declare it void</SubmitButton>
          <DialogClose>
            <Button type="button" variant="quiet">
              Cancel
            </Button>
          </DialogClose>
        </div>
      </form>
    </Dialog>
  );
}
