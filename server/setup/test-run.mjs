import { ensureClient } from './client-build.mjs'
import { SetUpProblem, step } from './problem.mjs'
import { ensurePrograms } from './programs.mjs'
import { isStopping, onStop } from './stopping.mjs'
import { startTestCluster } from './test-cluster.mjs'
import { describeResult, reportOf } from './test-report.mjs'
import { runRunner, runners } from './test-runners.mjs'

/** Two at once: more only get in each other's way on a machine of two cores. */
const atOnce = 2

/** Settings of a running product, which must not reach into the tests. */
const settingsOfProduct =
  /^(DATABASE_|SMTP_URL|APP_URL|PORT$|SESSION_SECRET|NODE_ENV|MAIL_|FORCE_COLOR|NO_COLOR)/

/**
 * Runs the tests and prints what they found.
 * @param {string[]} names of the runners, all where there is none
 * @returns {Promise<boolean>} whether something ran and nothing failed
 */
export async function runTests(names) {
  const chosen = choose(names)
  const needsDatabase = chosen.some((runner) => runner.database)
  const needsBrowser = chosen.some((runner) => runner.browser)
  if (needsDatabase || needsBrowser) await ensurePrograms({ browser: needsBrowser })
  const env = testEnvironment()
  if (needsDatabase) env.UNDERFOOT_TEST_CLUSTER = JSON.stringify(await startDatabase())
  if (needsBrowser) await ensureClient()

  /** @type {import('./test-runners.mjs').Result[]} */
  const results = []
  const waiting = [...chosen]
  const began = Date.now()
  await Promise.all(Array.from({ length: atOnce }, work))
  if (isStopping()) return false
  const { text, ok } = reportOf(results, (Date.now() - began) / 1000)
  console.log(text)
  return ok

  async function work() {
    for (let runner = waiting.shift(); runner; runner = waiting.shift()) {
      const result = await runRunner(runner, env)
      if (isStopping()) return
      results.push(result)
      if (result.failed > 0) console.log(result.output)
      step(describeResult(result))
    }
  }
}

/** @returns {NodeJS.ProcessEnv} */
function testEnvironment() {
  const kept = Object.entries(process.env).filter(([name]) => !settingsOfProduct.test(name))
  return { ...Object.fromEntries(kept), ...(process.stdout.isTTY ? { FORCE_COLOR: '1' } : { NO_COLOR: '1' }) }
}

/** @param {string[]} names */
function choose(names) {
  const unknown = names.filter((name) => !runners.some((runner) => runner.name === name))
  if (unknown.length > 0) {
    const known = runners.map((runner) => runner.name).join(', ')
    throw new SetUpProblem(`There are no tests called ${unknown.join(', ')}; there are ${known}.`)
  }
  return names.length > 0 ? runners.filter((runner) => names.includes(runner.name)) : runners
}

async function startDatabase() {
  step('Starting a database for the tests')
  const { cluster, stop } = await startTestCluster()
  await onStop(stop)
  return cluster
}
