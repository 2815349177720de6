export type ThemeChoice = 'system' | 'light' | 'dark';

const STORED = 'spandrel.theme';

/** The theme chosen in this browser; `system` until someone chooses. */
export function chosenTheme(): ThemeChoice {
  const chosen = document.documentElement.dataset.theme;
  return chosen === 'light' || chosen === 'dark' ? chosen : 'system';
}

/** Shows a theme at once and remembers it in this browser; public/theme.js reads it before the next first paint. */
export function chooseTheme(choice: ThemeChoice): void {
  if (choice === 'system') delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = choice;
  remember(STORED, choice === 'system' ? null : choice);
}

/** Keeps a small choice in this browser. A browser that forbids storage only forgets it. */
export function remember(key: string, value: string | null): void {
  try {
    if (value === null) localStorage.removeItem(key);
    else localStorage.setItem(key, value);
  } catch {
    return;
  }
}

/** A small choice kept in this browser, or null. */
export function remembered(key: string): string | null {
  try {
    return localStorage.getItem(key);
  } catch {
    return null;
  }
}
