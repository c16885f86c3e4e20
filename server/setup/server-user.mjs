import { spawnSync } from 'node:child_process'
import { chownSync, existsSync, mkdirSync } from 'node:fs'
import { isRoot } from './debian.mjs'

const name = 'postgres'
const asPostgres = ['setpriv', `--reuid=${name}`, `--regid=${name}`, '--init-groups']
const throughClosedFolders = ['--inh-caps=+dac_read_search', '--ambient-caps=+dac_read_search']

/**
 * How the database server is run: PostgreSQL refuses root, so root runs it as Debian's `postgres` user.
 * @typedef {{ prefix: string[], ids?: { uid: number, gid: number } }} ServerUser
 */

/** Whether Debian's `postgres` user is there. */
export function userExists() {
  return numericId('-u') !== undefined
}

/**
 * The way to run the server in a folder, which is made, or undefined where its user cannot reach it: a
 * checkout inside a folder only root may enter is reached with a capability that some containers lack.
 * @param {string} folder
 * @returns {ServerUser | undefined}
 */
export function serverUserFor(folder) {
  const made = !existsSync(folder)
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  if (!isRoot) return { prefix: [] }
  const ids = { uid: numericId('-u') ?? 0, gid: numericId('-g') ?? 0 }
  if (made) chownSync(folder, ids.uid, ids.gid)
  const ways = [asPostgres, [...asPostgres, ...throughClosedFolders]]
  const prefix = ways.find(
    ([program = '', ...args]) => spawnSync(program, [...args, 'test', '-w', folder]).status === 0,
  )
  return prefix && { prefix, ids }
}

/** @param {string} flag of `id` */
function numericId(flag) {
  const { status, stdout } = spawnSync('id', [flag, name], { encoding: 'utf8' })
  return status === 0 ? Number(stdout) : undefined
}
