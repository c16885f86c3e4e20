import { spawn } from 'node:child_process'
import { endsWithStarter } from './parent-death.mjs'
import { checkout } from './paths.mjs'
import { killGroup } from './process-table.mjs'

/** @typedef {{ pid: number, ended: Promise<void> }} Running */

/** @type {Set<Running>} */
const running = new Set()

/** Ends every program that `run` is waiting for, and all that it started. */
export async function endRunning() {
  for (const { pid } of running) killGroup(pid, 'SIGTERM')
  await Promise.all([...running].map(({ ended }) => ended))
}

/**
 * Runs a program to its end and hands back its exit code and what it wrote (both streams, in order). What it
 * started itself ends with it.
 * @param {string} program
 * @param {string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, limitMs?: number }} [options] it is ended after `limitMs`
 * @returns {Promise<{ code: number, output: string }>}
 */
export function run(program, args, { cwd = checkout, env = process.env, limitMs } = {}) {
  return new Promise((done, fail) => {
    const [first = '', ...rest] = [...endsWithStarter('TERM'), program, ...args]
    // A process group of its own, so that it can be ended as a whole.
    const child = spawn(first, rest, { cwd, env, detached: true, stdio: ['ignore', 'pipe', 'pipe'] })
    child.on('error', fail)
    const { pid } = child
    if (pid === undefined) return
    const limit = limitMs ? setTimeout(() => killGroup(pid, 'SIGKILL'), limitMs) : undefined
    let output = ''
    for (const stream of [child.stdout, child.stderr]) {
      stream.setEncoding('utf8').on('data', (text) => (output += text))
    }
    const ended = new Promise((close) => child.once('exit', () => close(killGroup(pid, 'SIGKILL'))))
    const entry = { pid, ended }
    running.add(entry)
    child.on('close', (code) => {
      clearTimeout(limit)
      running.delete(entry)
      done({ code: code ?? 1, output })
    })
  })
}

/**
 * The last lines of an output: enough to see why a program failed.
 * @param {string} output
 * @param {number} [lines]
 */
export function lastLines(output, lines = 12) {
  return output.trimEnd().split('\n').slice(-lines).join('\n')
}
