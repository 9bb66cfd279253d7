'use client';

import { useSearchParams } from 'next/navigation';
import { useSyncExternalStore } from 'react';

import { CopyButton } from '@/components/ui/copy-button';

const never = () => () => {};

/** Puts the address of what is shown on the clipboard: whoever opens it sees the same. */
export function CopyAddressButton() {
  const search = useSearchParams().toString();
  const here = useSyncExternalStore(
    never,
    () => window.location.origin + window.location.pathname,
    () => '',
  );
  return (
    <CopyButton
      text={search === '' ? here : `${here}?${search}`}
      label="Copy link to this view"
      size="normal"
    />
  );
}
