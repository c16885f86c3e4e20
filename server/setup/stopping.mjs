import { parentOf } from './process-table.mjs'
import { step } from './problem.mjs'
import { endRunning } from './run.mjs'

/** @type {(() => Promise<void>)[]} */
const stops = []
/** @type {Promise<void> | undefined} */
let stopping

/**
 * Notes how something that was just started is stopped again.
 * @param {() => Promise<void>} stop
 */
export async function onStop(stop) {
  if (stopping) await stop()
  else stops.push(stop)
}

/** Stops everything that was started, the last first. */
export function stopAll() {
  stopping ??= stopEach()
  return stopping
}

async function stopEach() {
  await endRunning()
  for (const stop of stops.reverse()) await stop().catch((error) => console.error(error))
}

/**
 * Stops everything and ends: on Ctrl-C, when a service manager or a closing terminal says so, and when npm,
 * which started this process, is killed.
 * @param {{ exitCode: number }} options
 */
export function stopWhenAsked({ exitCode }) {
  const end = async () => {
    if (stopping) return
    step('Stopping')
    await stopAll()
    process.exit(exitCode)
  }
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, end)
  // A terminal that closed takes no more text.
  process.stdout.on('error', () => undefined)
  if (process.env.npm_lifecycle_event) onDeathOfNpm(end)
}

/**
 * npm runs a script through a shell, which outlives it: npm is this process's parent's parent.
 * @param {() => void} end
 */
function onDeathOfNpm(end) {
  const ancestors = () => `${process.ppid} ${parentOf(process.ppid)}`
  const atFirst = ancestors()
  setInterval(() => ancestors() !== atFirst && end(), 500).unref()
}

/** Whether the end was asked for, so that what breaks from now on is no problem to report. */
export const isStopping = () => stopping !== undefined
