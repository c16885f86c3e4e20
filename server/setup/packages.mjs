import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { checkout } from './paths.mjs'
import { SetUpProblem, step } from './problem.mjs'
import { lastLines, run } from './run.mjs'

const oldestNode = [20, 19]

/** Stops where Node.js is too old to run the product. */
export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number)
  if (major > oldestNode[0] || (major === oldestNode[0] && minor >= oldestNode[1])) return
  throw new SetUpProblem(
    `Underfoot needs Node.js ${oldestNode.join('.')} or newer; this is ${process.versions.node}.`,
  )
}

/** Installs the packages of the lock file where they are missing or differ from it. */
export async function ensurePackages() {
  if (packagesMatchLock()) return
  step('Installing the packages of package-lock.json (about a minute)')
  // Development packages are needed to build the client, so NODE_ENV=production must not drop them.
  // None of them needs a script of its own to run, and so none gets to.
  const flags = ['--include=dev', '--ignore-scripts', '--no-audit', '--no-fund']
  const { code, output } = await run('npm', ['ci', ...flags])
  if (code !== 0)
    throw new SetUpProblem(`The packages could not be installed. npm says:\n${lastLines(output)}`)
}

/**
 * npm writes what it installed to node_modules/.package-lock.json, as its last act: an install that was cut
 * short, or a lock file that moved on, shows there.
 */
export function packagesMatchLock(folder = checkout) {
  const wanted = readPackages(join(folder, 'package-lock.json'))
  const installed = readPackages(join(folder, 'node_modules/.package-lock.json'))
  if (!wanted) throw new SetUpProblem('package-lock.json is missing or damaged: check it out again.')
  if (!installed) return false
  return Object.entries(wanted).every(([path, { version, integrity, optional, extraneous }]) => {
    const found = installed[path]
    if (path === '' || (!found && (optional || extraneous))) return true
    return found?.version === version && found?.integrity === integrity
  })
}

/**
 * @param {string} file
 * @returns {Record<string, { version?: string, integrity?: string, optional?: boolean, extraneous?: boolean }> | undefined}
 */
function readPackages(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8')).packages
  } catch {
    return undefined
  }
}
