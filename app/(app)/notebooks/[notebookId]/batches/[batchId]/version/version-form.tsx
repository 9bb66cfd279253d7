'use client';

import { useActionState, useState } from 'react';
import { CurveSelect } from '@/components/batch/curve-select';
import { Field } from '@/components/ui/field';
import { FormAlert } from '@/components/ui/form-alert';
import { SubmitButton } from '@/components/ui/submit-button';
import { LIMITS } from '@/lib/limits';
import type { CurveSummary } from '@/lib/views/curve';
import { makeVersion } from './actions';

export function VersionForm({
  batchId,
  submissionKey,
  curves,
  newerId,
}: {
  batchId: string;
  submissionKey: string;
  curves: readonly CurveSummary[];
  newerId?: string;
}) {
  const [state, submit] = useActionState(makeVersion, { status: 'idle' });
  const failed = state.status === 'failed' ? state : undefined;
  const first = curves.find((curve) => curve.id === newerId) ?? curves[0];
  const [curveId, setCurveId] = useState(first?.id ?? '');
  return (
    <form action={submit} noValidate className="grid max-w-xl gap-4">
      <FormAlert state={state} />
      <input type="hidden" name="batchId" value={batchId} />
      <input type="hidden" name="submissionKey" value={submissionKey} />
      <CurveSelect curves={curves} value={curveId} onChange={setCurveId} failed={failed} />
      <Field
        name="reason"
        label="Reason"
        hint="Why the samples are read on this curve"
        maxLength={LIMITS.reason}
        failed={failed}
      />
      <div>
        <SubmitButton>Make version on this curve</SubmitButton>
      </div>
    </form>
  );
}
