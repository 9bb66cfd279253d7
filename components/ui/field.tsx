import type { ComponentProps, ReactNode } from 'react';

import { classNames } from './class-names';
import { CONTROL, FieldFrame, useFieldIds, type FieldProps } from './field-frame';

type InputProps = Omit<ComponentProps<'input'>, 'name' | 'id' | 'defaultValue'>;

/**
 * A labelled input. Uncontrolled unless `value` is given: it starts from what the refused form held, else from
 * `initial`. `unit` stands behind the number, in the field.
 */
export function Field({
  name,
  label,
  failed,
  initial,
  hint,
  error,
  hideLabel,
  optional,
  unit,
  className,
  ...input
}: FieldProps & InputProps & { unit?: ReactNode }) {
  const field = { name, label, failed, initial, hint, error, hideLabel, optional };
  const { input: tied, sentence } = useFieldIds(field);
  const start = input.value === undefined ? { defaultValue: failed?.values[name] ?? initial ?? '' } : {};
  const numeric = input.inputMode === 'decimal' || input.inputMode === 'numeric';
  return (
    <FieldFrame field={field} id={tied.id} sentence={sentence} className={className}>
      <span className="relative block">
        <input
          type="text"
          autoComplete="off"
          className={classNames(CONTROL, 'h-9', numeric && 'num', Boolean(unit) && 'pr-16')}
          {...start}
          {...input}
          {...tied}
        />
        {unit && (
          <span className="aside pointer-events-none absolute inset-y-0 right-3 flex items-center text-sm">
            {unit}
          </span>
        )}
      </span>
    </FieldFrame>
  );
}
