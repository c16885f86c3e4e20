import { hasChromium } from './chromium.mjs'
import { installFromDebian, isRoot } from './debian.mjs'
import { findPostgresPrograms } from './postgres-programs.mjs'
import { userExists } from './server-user.mjs'

/**
 * Sees that the programs of Debian that npm cannot bring are there, in one installation.
 * @param {{ browser: boolean }} needs
 */
export async function ensurePrograms({ browser }) {
  const missing = []
  if (!findPostgresPrograms() || (isRoot && !userExists()))
    missing.push({ package: 'postgresql', name: "PostgreSQL's programs" })
  if (browser && !hasChromium()) missing.push({ package: 'chromium', name: 'the Chromium browser' })
  if (missing.length === 0) return
  const names = missing.map((item) => item.name).join(' and ')
  const sentence = `${names[0]?.toUpperCase()}${names.slice(1)} ${names.endsWith('browser') && missing.length === 1 ? 'is' : 'are'}`
  await installFromDebian(
    missing.map((item) => item.package),
    sentence,
  )
}
