export type Theme = 'system' | 'light' | 'dark';

const KEY = 'steelyard.theme';

/** The theme chosen in this browser; public/theme.js sets it before the first paint. */
export function chosenTheme(): Theme {
  const theme = document.documentElement.dataset.theme;
  return theme === 'light' || theme === 'dark' ? theme : 'system';
}

/** Sets and keeps a theme; where storage is shut off it holds until the page is left. */
export function chooseTheme(theme: Theme): void {
  if (theme === 'system') delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = theme;
  try {
    if (theme === 'system') localStorage.removeItem(KEY);
    else localStorage.setItem(KEY, theme);
  } catch {
    // Shut off: nothing to keep it in.
  }
}
