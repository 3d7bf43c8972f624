export type Theme = 'system' | 'light' | 'dark'

const key = 'tracelamp-theme'

/**
 * The theme chosen on this device. It lies in localStorage, not with the other settings, because
 * `public/theme.js` must read it without waiting, before the first paint.
 */
export function themeChoice(): Theme {
  try {
    const kept = localStorage.getItem(key)
    return kept === 'light' || kept === 'dark' ? kept : 'system'
  } catch {
    return 'system'
  }
}

/** Remembers the theme and draws the page in it. */
export function chooseTheme(theme: Theme): void {
  if (theme === 'system') delete document.documentElement.dataset['theme']
  else document.documentElement.dataset['theme'] = theme
  try {
    if (theme === 'system') localStorage.removeItem(key)
    else localStorage.setItem(key, theme)
  } catch {
    // Not remembered where the browser keeps nothing; drawn all the same.
  }
}
