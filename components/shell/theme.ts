export const THEMES = ['auto', 'light', 'dark'] as const;

export type Theme = (typeof THEMES)[number];

export const THEME_COOKIE = 'trymark-theme';

/** The theme a cookie asks for; anything unknown is `auto`. */
export function parseTheme(value: string | undefined): Theme {
  return THEMES.find((theme) => theme === value) ?? 'auto';
}
