import { spawn } from 'node:child_process'
import { checkout } from './paths.mjs'

/** @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set()

/** Ends every program that `run` is waiting for. */
export function endRunning() {
  for (const child of running) child.kill()
}

/**
 * Runs a program to its end and hands back its exit code and what it wrote (both streams, in order).
 * @param {string} program
 * @param {string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, limitMs?: number }} [options] it is ended after `limitMs`
 * @returns {Promise<{ code: number, output: string }>}
 */
export function run(program, args, options = {}) {
  return new Promise((done, fail) => {
    const child = spawn(program, args, {
      cwd: options.cwd ?? checkout,
      env: options.env ?? process.env,
      stdio: ['ignore', 'pipe', 'pipe'],
      timeout: options.limitMs,
    })
    running.add(child)
    let output = ''
    for (const stream of [child.stdout, child.stderr]) {
      stream.setEncoding('utf8').on('data', (text) => (output += text))
    }
    child.on('error', fail)
    child.on('close', (code) => {
      running.delete(child)
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
