import type { ComponentProps } from 'react';

import { classNames } from './class-names';
import { CONTROL, FieldFrame, useFieldIds, type FieldProps } from './field-frame';

type AreaProps = Omit<ComponentProps<'textarea'>, 'name' | 'id' | 'defaultValue'>;

/** A labelled text of several lines. */
export function TextArea({
  name,
  label,
  failed,
  initial,
  hint,
  error,
  hideLabel,
  optional,
  className,
  ...area
}: FieldProps & AreaProps) {
  const field = { name, label, failed, initial, hint, error, hideLabel, optional };
  const { input: tied, sentence } = useFieldIds(field);
  const start = area.value === undefined ? { defaultValue: failed?.values[name] ?? initial ?? '' } : {};
  return (
    <FieldFrame field={field} id={tied.id} sentence={sentence} className={className}>
      <textarea rows={3} className={classNames(CONTROL, 'min-h-16')} {...start} {...area} {...tied} />
    </FieldFrame>
  );
}
