import { existsSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { localFolder } from './paths.mjs'
import { pause } from './pause.mjs'
import { beganAt, killGroup } from './process-table.mjs'

/**
 * Process groups of the product by name, with the moment each began: a number alone may have been given to
 * another program since.
 * @typedef {Record<string, { pid: number, began: string }>} Remembered
 */

const file = () => join(localFolder(), 'processes.json')

/**
 * Notes that a process group is ours.
 * @param {string} name
 * @param {number} pid
 */
export function remember(name, pid) {
  write({ ...read(), [name]: { pid, began: beganAt(pid) ?? '' } })
}

/** @param {string} name */
export function forget(name) {
  const { [name]: _gone, ...others } = read()
  write(others)
}

/** Ends what a starter that was killed left running, so that its ports are free again. */
export async function endLeftovers() {
  const alive = Object.values(read()).filter(({ pid, began }) => beganAt(pid) === began)
  for (const { pid } of alive) killGroup(pid, 'SIGKILL')
  while (alive.some(({ pid, began }) => beganAt(pid) === began)) await pause()
  write({})
}

/** @returns {Remembered} */
function read() {
  try {
    return existsSync(file()) ? JSON.parse(readFileSync(file(), 'utf8')) : {}
  } catch {
    return {}
  }
}

/** @param {Remembered} remembered */
function write(remembered) {
  writeFileSync(file(), JSON.stringify(remembered))
}
