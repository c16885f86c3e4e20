import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { checkout } from './paths.mjs'
import { SetUpProblem, step } from './problem.mjs'
import { lastLines, run } from './run.mjs'

/** All that the client's build is made of. */
const sources = [
  'src',
  'shared',
  'public',
  'index.html',
  'vite.config.ts',
  'tsconfig.json',
  'package-lock.json',
]
const builtFrom = join(checkout, 'dist/client-sources.sha256')

/** Builds the client into dist/client where it is missing or its sources have changed since. */
export async function ensureClient() {
  const present = hashOfSources()
  if (existsSync(builtFrom) && readFileSync(builtFrom, 'utf8') === present) return
  step('Building the client')
  const vite = join(checkout, 'node_modules/vite/bin/vite.js')
  const env = { ...process.env, NODE_ENV: 'production' }
  const { code, output } = await run(process.execPath, [vite, 'build', '--logLevel', 'warn'], { env })
  if (code !== 0) throw new SetUpProblem(`The client could not be built:\n${lastLines(output, 20)}`)
  writeFileSync(builtFrom, present)
}

function hashOfSources() {
  const hash = createHash('sha256')
  for (const source of sources) {
    for (const file of filesIn(source))
      hash
        .update(file)
        .update('\0')
        .update(readFileSync(join(checkout, file)))
  }
  return hash.digest('hex')
}

/**
 * @param {string} path from the checkout
 * @returns {string[]}
 */
function filesIn(path) {
  const found = statSync(join(checkout, path), { throwIfNoEntry: false })
  if (!found?.isDirectory()) return found ? [path] : []
  return readdirSync(join(checkout, path))
    .sort()
    .flatMap((name) => filesIn(`${path}/${name}`))
}
