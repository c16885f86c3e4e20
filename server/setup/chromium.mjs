import { existsSync } from 'node:fs'

/** Debian's Chromium: the one browser that the real-browser tests drive. */
export const chromiumPath = '/usr/bin/chromium'

export function hasChromium() {
  return existsSync(chromiumPath)
}
