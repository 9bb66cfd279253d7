'use client';

import { useActionState, useEffect, useState, type ReactNode } from 'react';
import { useRouter } from 'next/navigation';
import { Button } from '@/components/ui/button';
import { Dialog, DialogClose } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import type { FailedForm, FormState } from '@/lib/form-state';
import { LIMITS } from '@/lib/limits';

interface ReasonDialogProps {
  title: string;
  description: ReactNode;
  trigger: ReactNode;
  action: (previous: FormState, form: FormData) => Promise<FormState>;
  /** values that go with the form unseen */
  hidden: Readonly<Record<string, string | number>>;
  submitLabel: string;
  danger?: boolean;
  children?: (failed: FailedForm | undefined) => ReactNode;
}

function ReasonForm({
  action,
  hidden,
  submitLabel,
  danger,
  children,
  onDone,
}: Omit<ReasonDialogProps, 'title' | 'description' | 'trigger'> & { onDone: () => void }) {
  const router = useRouter();
  const [state, submit] = useActionState(action, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  useEffect(() => {
    if (state.status === 'done') onDone();
    // the page behind shows what the other person saved, and the next try starts from there
    if (state.status === 'failed' && state.code === 'CHANGED_MEANWHILE') router.refresh();
  }, [state, onDone, router]);
  return (
    <form action={submit} noValidate className="grid gap-4">
      <FormAlert state={state} />
      {Object.entries(hidden).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      {children?.(failed)}
      <Field
        name="reason"
        label="Reason"
        hint="It stands in the record beside the change"
        maxLength={LIMITS.reason}
        failed={failed}
      />
      <div className="flex flex-wrap justify-end gap-2">
        <DialogClose>
          <Button type="button">Leave it</Button>
        </DialogClose>
        <SubmitButton variant={danger ? 'danger' : 'primary'}>{submitLabel}</SubmitButton>
      </div>
    </form>
  );
}

/** A change that asks for its reason. Refused, it keeps what was typed; done, it closes. */
export function ReasonDialog({ title, description, trigger, ...form }: ReasonDialogProps) {
  const [open, setOpen] = useState(false);
  return (
    <Dialog title={title} description={description} trigger={trigger} open={open} onOpenChange={setOpen}>
      <ReasonForm {...form} onDone={() => setOpen(false)} />
    </Dialog>
  );
}
