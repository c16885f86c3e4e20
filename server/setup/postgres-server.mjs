import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { pause } from './pause.mjs'

const stopSeconds = 10

/**
 * The live server of a cluster, as its own pid file says: first line process, fourth line port.
 * @param {string} folder of the cluster
 */
export function runningServer(folder) {
  const lines = readPidFile(folder)
  const pid = Number(lines[0])
  return pid && isServerOf(pid, folder) ? { pid, port: Number(lines[3]) } : undefined
}

/**
 * The lines of the pid file; none where there is none. A server that stops removes it between two looks, so it
 * is read without asking first.
 * @param {string} folder
 */
function readPidFile(folder) {
  try {
    return readFileSync(join(folder, 'postmaster.pid'), 'utf8').split('\n')
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code === 'ENOENT') return []
    throw error
  }
}

/**
 * Stops the live server of a cluster: INT ends connections and shuts down cleanly, QUIT leaves the tidying to
 * the next start.
 * @param {string} folder of the cluster
 */
export async function stopServer(folder) {
  const pid = runningServer(folder)?.pid
  if (pid === undefined) return
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGQUIT'])) {
    sendSignal(pid, signal)
    const end = Date.now() + stopSeconds * 1000
    while (Date.now() < end) {
      if (!runningServer(folder)) return
      await pause()
    }
  }
}

/**
 * Whether a process is the server of a cluster, and not another program that got its number after a crash.
 * @param {number} pid
 * @param {string} folder
 */
function isServerOf(pid, folder) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0').includes(folder)
  } catch {
    return false
  }
}

/**
 * @param {number} pid
 * @param {NodeJS.Signals} signal
 */
function sendSignal(pid, signal) {
  try {
    process.kill(pid, signal)
  } catch {
    // It ended by itself in the meantime.
  }
}
