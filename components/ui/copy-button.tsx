'use client';

import { useEffect, useState } from 'react';

import { Button, type ButtonSize, type ButtonVariant } from './button';

type Outcome = 'waiting' | 'copied' | 'refused';

/** Puts `text` on the clipboard and says so in its own place. */
export function CopyButton({
  text,
  label = 'Copy',
  copiedLabel = 'Copied',
  refusedLabel = 'Not copied: select it and copy by hand',
  size = 'small',
  variant = 'secondary',
}: {
  text: string;
  label?: string;
  copiedLabel?: string;
  refusedLabel?: string;
  size?: ButtonSize;
  variant?: ButtonVariant;
}) {
  const [outcome, setOutcome] = useState<Outcome>('waiting');

  useEffect(() => {
    if (outcome === 'waiting') return;
    const timer = setTimeout(() => setOutcome('waiting'), 4000);
    return () => clearTimeout(timer);
  }, [outcome]);

  async function copy() {
    try {
      // undefined on plain http away from this machine; that is a refusal like any other
      await navigator.clipboard.writeText(text);
      setOutcome('copied');
    } catch {
      setOutcome('refused');
    }
  }

  const words = { waiting: label, copied: copiedLabel, refused: refusedLabel };
  return (
    <Button size={size} variant={variant} onClick={copy}>
      <span aria-live="polite">{words[outcome]}</span>
    </Button>
  );
}
