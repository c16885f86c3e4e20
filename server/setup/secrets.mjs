import { randomBytes } from 'node:crypto'
import { existsSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { localFolder } from './paths.mjs'
import { SetUpProblem } from './problem.mjs'

/**
 * What this checkout keeps to itself. The id names what has to live outside the checkout.
 * @typedef {{ id: string, superuser: string, owner: string, web: string, worker: string, session: string }} Secrets
 */

/**
 * The secrets of this checkout, made on first use in a file that only its owner may read.
 * @returns {Secrets}
 */
export function localSecrets() {
  const file = join(localFolder(), 'secrets.json')
  if (!existsSync(file))
    writeFileSync(file, JSON.stringify(newSecrets(), null, 2), { mode: 0o600, flag: 'wx' })
  try {
    return JSON.parse(readFileSync(file, 'utf8'))
  } catch {
    throw new SetUpProblem(
      `${file} cannot be read: put it back, or delete the folder .underfoot to begin anew.`,
    )
  }
}

/** @returns {Secrets} */
function newSecrets() {
  const text = (bytes = 24) => randomBytes(bytes).toString('hex')
  return { id: text(6), superuser: text(), owner: text(), web: text(), worker: text(), session: text(32) }
}
