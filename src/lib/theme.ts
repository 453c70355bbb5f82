export type Theme = 'light' | 'dark' | 'device';

export const THEMES: readonly { value: Theme; label: string }[] = [
  { value: 'device', label: 'As the device' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Night bench' },
];

/** The same place that `public/theme-boot.js` reads before the first paint. */
const PLACE = 'ferrule-theme';

export function chosenTheme(): Theme {
  try {
    const kept = localStorage.getItem(PLACE);
    return kept === 'light' || kept === 'dark' ? kept : 'device';
  } catch {
    return 'device';
  }
}

export function chooseTheme(theme: Theme): void {
  if (theme === 'device') delete document.documentElement.dataset['theme'];
  else document.documentElement.dataset['theme'] = theme;
  try {
    if (theme === 'device') localStorage.removeItem(PLACE);
    else localStorage.setItem(PLACE, theme);
  } catch {
    // the choice then holds for this page alone
  }
}
