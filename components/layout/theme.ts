export const THEMES = ['system', 'light', 'dark'] as const;

export type Theme = (typeof THEMES)[number];

/** Name of the cookie that remembers the reader's choice. */
export const THEME_COOKIE = 'theme';

/** The theme that a cookie or a form names; `system` where it names none. */
export function parseTheme(value: unknown): Theme {
  return THEMES.find((theme) => theme === value) ?? 'system';
}
