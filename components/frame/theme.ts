export const THEME_COOKIE = 'halflight-theme';

export const THEMES = ['system', 'light', 'dark'] as const;
export type Theme = (typeof THEMES)[number];

/** The theme a cookie asks for; anything unknown follows the system. */
export function themeFrom(cookie: string | undefined): Theme {
  return THEMES.find((theme) => theme === cookie) ?? 'system';
}

/** What <html> carries: nothing for the system's own setting, so that CSS alone decides. */
export function themeAttribute(theme: Theme): 'light' | 'dark' | undefined {
  return theme === 'system' ? undefined : theme;
}
