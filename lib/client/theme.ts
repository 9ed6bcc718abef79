/** What a person chose to read in; `device` follows the device's own setting. */
export type Theme = 'device' | 'light' | 'dark';

/** The cookie that keeps the choice, so that the server draws the first frame already right. */
export const themeCookie = 'wakewright-theme';

/** Reads a cookie's value; anything unknown counts as no choice. */
export function parseTheme(value: string | undefined): Theme {
  return value === 'light' || value === 'dark' ? value : 'device';
}

/** Shows `theme` at once and keeps it for a year. Browser only. */
export function chooseTheme(theme: Theme): void {
  const root = document.documentElement;
  if (theme === 'device') delete root.dataset.theme;
  else root.dataset.theme = theme;
  const age = theme === 'device' ? 0 : 31_536_000;
  document.cookie = `${themeCookie}=${theme}; path=/; max-age=${age}; samesite=lax`;
}
