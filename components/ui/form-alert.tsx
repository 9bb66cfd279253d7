'use client';

import { useEffect, useRef } from 'react';

import type { FormState } from '@/lib/form-state';

/**
 * What came of the form: a refusal (red, announced at once) or a thing done (verdigris). After a refusal the
 * keyboard is taken to the first field that has a sentence, or to the refusal itself.
 */
export function FormAlert({ state }: { state: FormState }) {
  const alert = useRef<HTMLDivElement>(null);

  useEffect(() => {
    if (state.status !== 'failed') return;
    const field = alert.current?.closest('form')?.querySelector<HTMLElement>('[aria-invalid="true"]');
    (field ?? alert.current)?.focus();
  }, [state]);

  if (state.status === 'failed') {
    return (
      <div
        ref={alert}
        role="alert"
        tabIndex={-1}
        className="flex gap-2 rounded-control border border-red bg-red-wash px-3 py-2 text-ink"
      >
        <span aria-hidden="true" className="text-red">
          ▲
        </span>
        <p>{state.message}</p>
      </div>
    );
  }
  if (state.status === 'done' && state.message) {
    return (
      <p role="status" className="flex gap-2 rounded-control bg-verdigris-wash px-3 py-2 text-ink">
        <span aria-hidden="true" className="text-verdigris">
          ●
        </span>
        {state.message}
      </p>
    );
  }
  return null;
}
