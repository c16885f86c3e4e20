import { spawn } from 'node:child_process'
import { closeSync, openSync } from 'node:fs'
import { join } from 'node:path'
import { forget, remember } from './leftovers.mjs'
import { endsWithStarter } from './parent-death.mjs'
import { checkout, localFolder } from './paths.mjs'
import { step } from './problem.mjs'
import { killGroup } from './process-table.mjs'

/**
 * One process of the product.
 * @typedef {object} Service
 * @property {string} name
 * @property {string[]} args of Node.js
 * @property {NodeJS.ProcessEnv} env
 * @property {boolean} showOutput in the terminal, instead of in a file of its own
 */

const stopSeconds = 10
/** A service that ends this many times within a minute will not do better the next time. */
const mostEnds = 5
const endsWindowMs = 60_000

/** @param {string} name of a service */
const logOf = (name) => join(localFolder(), `${name}.log`)

/**
 * Keeps a service running: one that is killed or breaks is started again, a few times.
 * @param {Service} service
 * @param {(name: string, log: string) => void} giveUp
 * @returns {{ stop: () => Promise<void> }}
 */
export function keepRunning(service, giveUp) {
  let stopping = false
  /** @type {number[]} */
  let ends = []
  let child = launch(service, ended)

  function ended() {
    if (child.pid) killGroup(child.pid, 'SIGKILL')
    if (stopping) return
    ends = [...ends.filter((time) => time > Date.now() - endsWindowMs), Date.now()]
    if (ends.length >= mostEnds) return giveUp(service.name, logOf(service.name))
    step(`The ${service.name} process ended by itself; starting it again`)
    child = launch(service, ended)
  }

  return {
    async stop() {
      stopping = true
      await stopGroup(child)
      forget(service.name)
    },
  }
}

/**
 * Starts a service in a session of its own: Ctrl-C in the terminal reaches the starter alone, which then
 * stops everything in order.
 * @param {Service} service
 * @param {() => void} onEnd
 */
function launch(service, onEnd) {
  const [program = '', ...args] = [...endsWithStarter('TERM'), process.execPath, ...service.args]
  const out = service.showOutput ? 'inherit' : openSync(logOf(service.name), 'a')
  const child = spawn(program, args, {
    cwd: checkout,
    env: service.env,
    detached: true,
    stdio: ['ignore', out, out],
  })
  if (out !== 'inherit') closeSync(out)
  child.on('error', onEnd).on('exit', onEnd)
  if (child.pid) remember(service.name, child.pid)
  return child
}

/**
 * Asks a service to end, and ends it and all it started where it takes too long.
 * @param {import('node:child_process').ChildProcess} child
 */
async function stopGroup(child) {
  const { pid } = child
  if (pid === undefined) return
  if (child.exitCode === null && child.signalCode === null) {
    const ended = new Promise((done) => child.once('exit', done))
    killGroup(pid, 'SIGTERM')
    const late = setTimeout(() => killGroup(pid, 'SIGKILL'), stopSeconds * 1000)
    await ended
    clearTimeout(late)
  }
  killGroup(pid, 'SIGKILL')
}
