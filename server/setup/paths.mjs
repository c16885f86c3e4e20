import { mkdirSync } from 'node:fs'
import { dirname, join, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'

/** The checkout this file belongs to. */
export const checkout = resolve(dirname(fileURLToPath(import.meta.url)), '../..')

/** What `npm start` keeps between two starts: database, passwords, logs. Not in version control. */
export function localFolder() {
  const folder = join(checkout, '.underfoot')
  mkdirSync(folder, { recursive: true, mode: 0o755 })
  return folder
}
