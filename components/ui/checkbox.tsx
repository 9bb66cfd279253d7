import { useId, type ComponentProps, type ReactNode } from 'react';

import type { FailedForm } from '@/lib/form-state';

type BoxProps = Omit<ComponentProps<'input'>, 'type' | 'id' | 'name'>;

/** One yes-or-no. It sends "on" when ticked and nothing when not, as browsers do. */
export function Checkbox({
  name,
  label,
  hint,
  failed,
  defaultChecked,
  ...box
}: BoxProps & { name: string; label: ReactNode; hint?: ReactNode; failed?: FailedForm }) {
  const id = useId();
  const sentence = failed?.fields[name]?.[0];
  const ticked = failed ? failed.values[name] === (box.value ?? 'on') : defaultChecked;
  const described = [sentence && `${id}-error`, hint && `${id}-hint`].filter(Boolean).join(' ');
  return (
    <div className="grid gap-1">
      <label className="flex items-start gap-2.5 text-base">
        <input
          key={box.checked === undefined ? String(ticked) : 'controlled'}
          type="checkbox"
          id={id}
          name={name}
          defaultChecked={box.checked === undefined ? ticked : undefined}
          aria-invalid={sentence ? true : undefined}
          aria-describedby={described || undefined}
          className="mt-0.5 size-4.5 shrink-0 accent-uv"
          {...box}
        />
        <span>{label}</span>
      </label>
      {sentence && (
        <p id={`${id}-error`} className="flex gap-1.5 text-sm text-red">
          <span aria-hidden="true">▲</span>
          {sentence}
        </p>
      )}
      {hint && (
        <p id={`${id}-hint`} className="pl-7 text-sm text-ink-2">
          {hint}
        </p>
      )}
    </div>
  );
}
