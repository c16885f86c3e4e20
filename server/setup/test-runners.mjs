import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { checkout } from './paths.mjs'
import { run } from './run.mjs'

/**
 * One program of the test run. A check (lint, types …) counts as one test; a runner of tests counts its own.
 * @typedef {object} Runner
 * @property {string} name
 * @property {string[]} args of Node.js
 * @property {boolean} counts whether it is Vitest, and reports counts of its own
 * @property {boolean} [database] whether it needs PostgreSQL
 * @property {boolean} [browser] whether it needs Chromium and the built client
 *
 * @typedef {{ passed: number, failed: number, skipped: number }} Counts
 * @typedef {Counts & { name: string, seconds: number, output: string }} Result
 */

/** A runner that hangs is ended, and counts as failed. */
const limitMs = 20 * 60_000

/** The long ones first, so that the short ones fill the gaps. @type {Runner[]} */
export const runners = [
  vitest('browser', { database: true, browser: true }),
  vitest('api', { database: true }),
  vitest('client', {}),
  vitest('unit', {}),
  vitest('reference', {}),
  check('types', ['typescript/bin/tsc', '--noEmit']),
  check('lint', ['eslint/bin/eslint.js', '.', '--cache', '--cache-location', 'node_modules/.cache/eslint/']),
  vitest('guards', {}),
  check('format', ['prettier/bin/prettier.cjs', '--check', '.', '--cache']),
]

/**
 * @param {string} name
 * @param {string[]} command inside node_modules
 * @returns {Runner}
 */
function check(name, [program = '', ...args]) {
  return { name, args: [join('node_modules', program), ...args], counts: false }
}

/**
 * @param {string} name of the Vitest project
 * @param {{ database?: boolean, browser?: boolean }} needs
 * @returns {Runner}
 */
function vitest(name, needs) {
  return { name, args: ['node_modules/vitest/vitest.mjs', 'run', '--project', name], counts: true, ...needs }
}

/**
 * Runs one runner to its end.
 * @param {Runner} runner
 * @param {NodeJS.ProcessEnv} env
 * @returns {Promise<Result>}
 */
export async function runRunner(runner, env) {
  const folder = mkdtempSync(join(tmpdir(), 'underfoot-report-'))
  const report = join(folder, 'report.json')
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`]
  const began = Date.now()
  try {
    const args = runner.counts ? [...runner.args, ...reporters] : runner.args
    const { code, output } = await run(process.execPath, args, { cwd: checkout, env, limitMs })
    const counts = runner.counts ? countVitest(report, code) : countCheck(code)
    return { name: runner.name, ...counts, seconds: (Date.now() - began) / 1000, output }
  } finally {
    rmSync(folder, { recursive: true, force: true })
  }
}

/**
 * @param {number} code
 * @returns {Counts}
 */
function countCheck(code) {
  return { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1, skipped: 0 }
}

/**
 * The counts of a report, with one failure more where Vitest failed and no test did: an error outside any
 * test, a file that does not load, no test at all.
 * @param {string} report
 * @param {number} code
 * @returns {Counts}
 */
export function countVitest(report, code) {
  const { passed, failed, skipped } = readReport(report)
  const failedAsAWhole = failed === 0 && (code !== 0 || passed === 0)
  return { passed, failed: failedAsAWhole ? 1 : failed, skipped }
}

/** @param {string} report */
function readReport(report) {
  try {
    const found = JSON.parse(readFileSync(report, 'utf8'))
    return {
      passed: found.numPassedTests,
      failed: found.numFailedTests,
      skipped: found.numPendingTests + found.numTodoTests,
    }
  } catch {
    return { passed: 0, failed: 0, skipped: 0 }
  }
}
