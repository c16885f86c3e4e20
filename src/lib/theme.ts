/** `system` follows the device's own setting. */
export type Theme = 'system' | 'light' | 'dark'

/** Read by public/theme.js before the first paint as well. */
const storageKey = 'underfoot-theme'

const isChosen = (value: string | null): value is 'light' | 'dark' => value === 'light' || value === 'dark'

/** The theme chosen on this device. */
export function chosenTheme(): Theme {
  try {
    const stored = localStorage.getItem(storageKey)
    return isChosen(stored) ? stored : 'system'
  } catch {
    return 'system'
  }
}

/** Shows the theme now and remembers it on this device, where the browser lets us. */
export function chooseTheme(theme: Theme): void {
  if (theme === 'system') delete document.documentElement.dataset.theme
  else document.documentElement.dataset.theme = theme
  try {
    if (theme === 'system') localStorage.removeItem(storageKey)
    else localStorage.setItem(storageKey, theme)
  } catch {
    // Storage is closed to us (a private window): the choice holds until the page is left.
  }
}
