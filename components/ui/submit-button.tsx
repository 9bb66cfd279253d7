'use client';

import type { ComponentProps } from 'react';
import { useFormStatus } from 'react-dom';

import { Button } from './button';

/** Sends its form once: while the answer is on its way it is disabled and says so. */
export function SubmitButton({
  pendingLabel = 'Saving…',
  variant = 'primary',
  disabled,
  children,
  ...rest
}: Omit<ComponentProps<typeof Button>, 'type'> & { pendingLabel?: string }) {
  const { pending } = useFormStatus();
  return (
    <Button type="submit" variant={variant} disabled={pending || disabled} {...rest}>
      {pending ? pendingLabel : children}
    </Button>
  );
}
