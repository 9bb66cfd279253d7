import { useId, type ReactNode } from 'react';

import type { FailedForm } from '@/lib/form-state';

import { classNames } from './class-names';

/** What every input of a form takes: its name, its words, and the refused form it must refill from. */
export interface FieldProps {
  name: string;
  label: ReactNode;
  failed?: FailedForm;
  initial?: string;
  hint?: ReactNode;
  /** a sentence found while typing, shown when the refused form has none */
  error?: string;
  /** keeps the label for screen readers only */
  hideLabel?: boolean;
  optional?: boolean;
}

export const CONTROL =
  'w-full min-w-0 rounded-control border border-control bg-sheet px-3 py-1.5 text-base text-ink placeholder:text-ink-2 ' +
  'disabled:bg-raised disabled:text-ink-2 [&[readonly]]:bg-raised aria-invalid:border-red aria-invalid:outline-red';

/** The ids and states that tie an input to its label, hint and error. */
export function useFieldIds({ name, failed, hint, error }: FieldProps) {
  const id = useId();
  const sentence = failed?.fields[name]?.[0] ?? error;
  const described = [sentence && `${id}-error`, hint && `${id}-hint`].filter(Boolean).join(' ');
  return {
    sentence,
    input: {
      id,
      name,
      'aria-invalid': sentence ? (true as const) : undefined,
      'aria-describedby': described || undefined,
    },
  };
}

export function FieldFrame({
  field,
  id,
  sentence,
  children,
  className,
}: {
  field: FieldProps;
  id: string;
  sentence?: string;
  children: ReactNode;
  className?: string;
}) {
  return (
    <div className={classNames('grid content-start gap-1', className)}>
      <label htmlFor={id} className={field.hideLabel ? 'sr-only' : 'text-sm font-medium'}>
        {field.label}
        {field.optional && <span className="aside"> (may stay empty)</span>}
      </label>
      {children}
      {sentence && (
        <p id={`${id}-error`} className="flex gap-1.5 text-sm text-red">
          <span aria-hidden="true">▲</span>
          {sentence}
        </p>
      )}
      {field.hint && (
        <p id={`${id}-hint`} className="text-sm text-ink-2">
          {field.hint}
        </p>
      )}
    </div>
  );
}
