/** Light, dark, or the system's preference; the stored choice is read before painting by /theme.js. */
export const THEMES = ['system', 'light', 'dark'] as const;
export type Theme = (typeof THEMES)[number];

const STORAGE_KEY = 'fairweight.theme';

export function currentTheme(): Theme {
  const set = document.documentElement.dataset.theme;
  return set === 'light' || set === 'dark' ? set : 'system';
}

/** Charts drawn on a canvas listen for `fairweight:theme` on the window to take the new colours. */
export function setTheme(theme: Theme): void {
  if (theme === 'system') delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = theme;
  try {
    if (theme === 'system') localStorage.removeItem(STORAGE_KEY);
    else localStorage.setItem(STORAGE_KEY, theme);
  } catch {
    // Storage switched off: the choice lasts until the page is left.
  }
  window.dispatchEvent(new Event('fairweight:theme'));
}
