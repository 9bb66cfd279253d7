import { useId, type ReactNode } from 'react';

import type { FailedForm } from '@/lib/form-state';

import { classNames } from './class-names';

export interface Choice {
  value: string;
  label: ReactNode;
  hint?: ReactNode;
  disabled?: boolean;
}

export interface RadioGroupProps {
  name: string;
  label: ReactNode;
  choices: readonly Choice[];
  initial?: string;
  failed?: FailedForm;
  hint?: ReactNode;
  hideLabel?: boolean;
  /** given with onChange, the group is controlled */
  value?: string;
  onChange?: (value: string) => void;
  className?: string;
}

const LIST = 'grid gap-2';
const SEGMENTS = 'flex w-fit flex-wrap rounded-control border border-control bg-sheet p-0.5';
const SEGMENT =
  'relative flex min-h-7.5 items-center rounded-[6px] px-3 text-sm font-medium text-ink-2 hover:text-ink ' +
  'has-checked:bg-uv-wash has-checked:text-uv has-focus-visible:outline-2 has-focus-visible:outline-uv has-disabled:opacity-60';

function Group({ segmented, ...group }: RadioGroupProps & { segmented: boolean }) {
  const id = useId();
  const { name, choices, value, onChange, failed } = group;
  const sentence = failed?.fields[name]?.[0];
  const start = failed?.values[name] ?? group.initial;
  const described = [sentence && `${id}-error`, group.hint && `${id}-hint`].filter(Boolean).join(' ');
  return (
    <fieldset
      className={classNames('grid content-start gap-1', group.className)}
      aria-describedby={described || undefined}
    >
      <legend className={group.hideLabel ? 'sr-only' : 'mb-1 text-sm font-medium'}>{group.label}</legend>
      <div className={segmented ? SEGMENTS : LIST} key={value === undefined ? start : 'controlled'}>
        {choices.map((choice) => (
          <label key={choice.value} className={segmented ? SEGMENT : 'flex items-start gap-2.5'}>
            <input
              type="radio"
              name={name}
              value={choice.value}
              disabled={choice.disabled}
              className={segmented ? 'absolute inset-0 opacity-0' : 'mt-0.5 size-4.5 shrink-0 accent-uv'}
              {...(value === undefined
                ? { defaultChecked: choice.value === start }
                : { checked: choice.value === value, onChange: () => onChange?.(choice.value) })}
            />
            <span>
              {choice.label}
              {choice.hint && <span className="block text-sm font-normal text-ink-2">{choice.hint}</span>}
            </span>
          </label>
        ))}
      </div>
      {sentence && (
        <p id={`${id}-error`} className="flex gap-1.5 text-sm text-red">
          <span aria-hidden="true">▲</span>
          {sentence}
        </p>
      )}
      {group.hint && (
        <p id={`${id}-hint`} className="text-sm text-ink-2">
          {group.hint}
        </p>
      )}
    </fieldset>
  );
}

/** One among a few, each with its own line and, if need be, a line that explains it. */
export function RadioGroup(props: RadioGroupProps) {
  return <Group {...props} segmented={false} />;
}

/** One among two to four short words, side by side. */
export function SegmentedControl(props: RadioGroupProps) {
  return <Group {...props} segmented />;
}
