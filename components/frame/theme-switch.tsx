'use client';

import { Monitor, Moon, Sun } from 'lucide-react';
import { useSyncExternalStore } from 'react';

import { THEME_COOKIE, themeAttribute, themeFrom, THEMES, type Theme } from './theme';

const WORDS: Record<Theme, { label: string; icon: typeof Sun }> = {
  system: { label: 'Theme of the system', icon: Monitor },
  light: { label: 'Light theme', icon: Sun },
  dark: { label: 'Dark theme', icon: Moon },
};

const A_YEAR_S = 365 * 24 * 3600;

function subscribe(changed: () => void) {
  const observer = new MutationObserver(changed);
  observer.observe(document.documentElement, { attributeFilter: ['data-theme'] });
  return () => observer.disconnect();
}

function choose(theme: Theme) {
  const attribute = themeAttribute(theme);
  if (attribute) document.documentElement.dataset.theme = attribute;
  else delete document.documentElement.dataset.theme;
  // the server reads it and renders the right theme at once, so no page flashes in the other one
  document.cookie = `${THEME_COOKIE}=${theme}; path=/; max-age=${A_YEAR_S}; samesite=lax`;
}

/** System, light or dark. Stands on the night side. */
export function ThemeSwitch() {
  const current = useSyncExternalStore(
    subscribe,
    () => themeFrom(document.documentElement.dataset.theme),
    () => 'system' as const,
  );
  return (
    <div role="group" aria-label="Theme" className="flex w-fit gap-0.5 rounded-control bg-night-2 p-0.5">
      {THEMES.map((theme) => {
        const { label, icon: Icon } = WORDS[theme];
        return (
          <button
            key={theme}
            type="button"
            aria-pressed={theme === current}
            aria-label={label}
            title={label}
            onClick={() => choose(theme)}
            className="grid size-7 place-items-center rounded-[6px] text-night-ink-2 hover:text-night-ink aria-pressed:bg-night-3 aria-pressed:text-night-ink"
          >
            <Icon aria-hidden="true" className="size-3.5" />
          </button>
        );
      })}
    </div>
  );
}
