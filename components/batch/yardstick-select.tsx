'use client';

import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import type { Yardstick } from '@/lib/batch/yardstick';
import { unitWithBasis } from '@/lib/batch/unit-text';
import type { FailedForm } from '@/lib/form-state';
import type { YardstickView } from '@/lib/views/batch';
import { curveWords } from './curve-words';

/** A curve or a known absorptivity to choose from. */
export interface YardstickChoice extends YardstickView {
  readonly kind: Yardstick['kind'];
  readonly unit: string;
  readonly basis: string;
  readonly wavelengthNm: number;
}

const STATE: Readonly<Record<YardstickView['status'], string>> = {
  saved: '',
  superseded: ', superseded',
  void: ', void',
};
const NAME: Readonly<Record<Yardstick['kind'], string>> = {
  curve: 'Standard curve',
  absorptivity: 'Known absorptivity',
};

/** What the form sends for a choice. */
export const choiceValue = ({ kind, id }: Pick<YardstickChoice, 'kind' | 'id'>): string => `${kind} ${id}`;

/** Choose what a batch is read on. A void one cannot be chosen; an older one is said in words. */
export function YardstickSelect({
  choices,
  value,
  onChange,
  failed,
}: {
  choices: readonly YardstickChoice[];
  value: string;
  onChange: (value: string) => void;
  failed?: FailedForm;
}) {
  const chosen = choices.find((choice) => choiceValue(choice) === value);
  const words = chosen && curveWords(chosen, chosen.kind);
  const both = new Set(choices.map(({ kind }) => kind)).size > 1;
  const [only = 'curve'] = choices.map(({ kind }) => kind);
  return (
    <div className="grid gap-2">
      <Select
        name="readOn"
        label={both ? 'Read on' : NAME[only]}
        value={value}
        onChange={(event) => onChange(event.target.value)}
        hint={
          chosen &&
          `Results in ${unitWithBasis(chosen.unit, chosen.basis)}, read at ${chosen.wavelengthNm} nm`
        }
        options={choices.map((choice) => ({
          value: choiceValue(choice),
          label: `${both ? `${NAME[choice.kind]}: ` : ''}${choice.title}, version ${choice.version}${STATE[choice.status]}`,
          disabled: choice.status === 'void',
        }))}
        failed={failed}
        error={failed?.fields.curveId?.[0] ?? failed?.fields.absorptivityId?.[0]}
      />
      {words && (
        <Notice tone={chosen.status === 'void' ? 'stop' : 'decide'}>
          {words} {chosen.newer && 'Take the newer one unless you have a reason.'}
        </Notice>
      )}
    </div>
  );
}
