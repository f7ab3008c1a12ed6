export const themes = ['device', 'light', 'dark'] as const;
export type Theme = (typeof themes)[number];

const storageKey = 'weftway-theme';

export function chosenTheme(): Theme {
  const kept = localStorage.getItem(storageKey);
  return themes.find((theme) => theme === kept) ?? 'device';
}

/** Called once before the first drawing, and whenever the person chooses. */
export function applyTheme(theme: Theme): void {
  localStorage.setItem(storageKey, theme);
  if (theme === 'device') delete document.documentElement.dataset['theme'];
  else document.documentElement.dataset['theme'] = theme;
}
