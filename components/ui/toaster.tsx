'use client';

import { Toaster as Sonner } from 'sonner';

export { toast } from 'sonner';

const COLOURS = {
  '--normal-bg': 'var(--color-sheet)',
  '--normal-text': 'var(--color-ink)',
  '--normal-border': 'var(--color-rule-strong)',
  '--success-bg': 'var(--color-verdigris-wash)',
  '--success-text': 'var(--color-ink)',
  '--success-border': 'var(--color-verdigris)',
  '--error-bg': 'var(--color-red-wash)',
  '--error-text': 'var(--color-ink)',
  '--error-border': 'var(--color-red)',
  '--border-radius': 'var(--radius-card)',
  fontFamily: 'var(--font-sans)',
} as React.CSSProperties; // custom properties are not in React's list

/** Where short confirmations appear. Stands once, in the root layout; `toast.success('…')` speaks through it. */
export function Toaster() {
  return (
    <Sonner richColors closeButton position="bottom-right" style={COLOURS} containerAriaLabel="Messages" />
  );
}
