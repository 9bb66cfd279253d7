import { ChevronDown } from 'lucide-react';
import type { ComponentProps } from 'react';

import { classNames } from './class-names';
import { CONTROL, FieldFrame, useFieldIds, type FieldProps } from './field-frame';

export interface Option {
  value: string;
  label: string;
  disabled?: boolean;
}

type SelectInput = Omit<ComponentProps<'select'>, 'name' | 'id' | 'defaultValue' | 'children'>;

/** A labelled choice of one among many, with the browser's own list. */
export function Select({
  name,
  label,
  failed,
  initial,
  hint,
  error,
  hideLabel,
  optional,
  options,
  className,
  ...select
}: FieldProps & SelectInput & { options: readonly Option[] }) {
  const field = { name, label, failed, initial, hint, error, hideLabel, optional };
  const { input: tied, sentence } = useFieldIds(field);
  const start = failed?.values[name] ?? initial;
  const own = select.value === undefined ? { defaultValue: start } : {};
  return (
    <FieldFrame field={field} id={tied.id} sentence={sentence} className={className}>
      <span className="relative block">
        {/* the key: after a form action React resets a select to its first option, not to its new default */}
        <select
          key={select.value === undefined ? start : 'controlled'}
          className={classNames(CONTROL, 'h-9 appearance-none pr-9')}
          {...own}
          {...select}
          {...tied}
        >
          {options.map((option) => (
            <option key={option.value} value={option.value} disabled={option.disabled}>
              {option.label}
            </option>
          ))}
        </select>
        <ChevronDown
          aria-hidden="true"
          className="pointer-events-none absolute top-2.5 right-2.5 size-4 text-ink-2"
        />
      </span>
    </FieldFrame>
  );
}
