'use client';

import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { unitWithBasis } from '@/lib/batch/unit-text';
import type { FailedForm } from '@/lib/form-state';
import type { CurveSummary } from '@/lib/views/curve';
import { curveWords } from './curve-words';

const STATE: Readonly<Record<CurveSummary['status'], string>> = {
  saved: '',
  superseded: ', superseded',
  void: ', void',
};

/** Choose the curve for a batch. A void one cannot be chosen; an older one is said in words. */
export function CurveSelect({
  curves,
  value,
  onChange,
  failed,
}: {
  curves: readonly CurveSummary[];
  value: string;
  onChange: (curveId: string) => void;
  failed?: FailedForm;
}) {
  const chosen = curves.find((curve) => curve.id === value);
  const words = chosen && curveWords(chosen);
  return (
    <div className="grid gap-2">
      <Select
        name="curveId"
        label="Standard curve"
        value={value}
        onChange={(event) => onChange(event.target.value)}
        hint={
          chosen &&
          `Results in ${unitWithBasis(chosen.unit, chosen.basis)}, read at ${chosen.wavelengthNm} nm`
        }
        options={curves.map((curve) => ({
          value: curve.id,
          label: `${curve.title}, version ${curve.version}${STATE[curve.status]}`,
          disabled: curve.status === 'void',
        }))}
        failed={failed}
      />
      {words && (
        <Notice tone={chosen.status === 'void' ? 'stop' : 'decide'}>
          {words} {chosen.newer && 'Take the newer one unless you have a reason.'}
        </Notice>
      )}
    </div>
  );
}
