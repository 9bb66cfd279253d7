'use client';

import { useSyncExternalStore } from 'react';

import { PALETTE_TOKENS, type Palette } from './chart-colour';

let cached: Palette | null = null;

function readPalette(): Palette {
  const probe = document.createElement('span');
  probe.hidden = true;
  document.body.append(probe);
  const entries = PALETTE_TOKENS.map((token) => {
    probe.style.color = `var(--color-${token})`;
    return [token, getComputedStyle(probe).color] as const;
  });
  probe.remove();
  return Object.fromEntries(entries) as Palette; // one entry per token, by the line above
}

function subscribe(changed: () => void) {
  const refresh = () => {
    cached = null;
    changed();
  };
  const observer = new MutationObserver(refresh);
  observer.observe(document.documentElement, { attributeFilter: ['data-theme'] });
  const system = matchMedia('(prefers-color-scheme: dark)');
  system.addEventListener('change', refresh);
  return () => {
    observer.disconnect();
    system.removeEventListener('change', refresh);
  };
}

/** The theme's colours as rgb(…), new when the theme changes; null on the server. */
export function usePalette(): Palette | null {
  return useSyncExternalStore(
    subscribe,
    () => (cached ??= readPalette()),
    () => null,
  );
}
