import { tsImport } from 'tsx/esm/api'
import { onDatabase } from './database-urls.mjs'
import { fillOnce } from './local-database.mjs'
import { SetUpProblem, step } from './problem.mjs'
import { lastLines, run } from './run.mjs'

const roles = ['coach', 'physio', 'athlete', 'admin']

/**
 * Makes the invented demo club in a database that has no club yet.
 * @param {import('./roles.mjs').OfRoles} urls
 * @param {NodeJS.ProcessEnv} env
 * @param {{ disposable: boolean }} options whether the database is private, and a demo cut short may be dropped
 */
export async function ensureDemo(urls, env, { disposable }) {
  const clubs = await asIdentity(urls.web, 'select 1 from identity.clubs limit 1', [])
  if (clubs.length > 0) return
  step('Making the demo club: invented people, recordings made from physics (about a minute)')
  const make = async () => {
    const { code, output } = await run(process.execPath, ['--import', 'tsx', 'seed/demo/main.ts'], { env })
    if (code !== 0) throw new SetUpProblem(`The demo club could not be made:\n${lastLines(output)}`)
  }
  await (disposable ? fillOnce(make) : make())
}

/**
 * Who can sign in to the demo club, a line for each role; nothing where the database holds no demo.
 * @param {import('./roles.mjs').OfRoles} urls
 * @returns {Promise<string[]>}
 */
export async function demoAccountLines(urls) {
  /** @type {typeof import('../../seed/demo/accounts.ts')} */
  const { demoAccounts, demoPassword } = await tsImport('../../seed/demo/accounts.ts', import.meta.url)
  const addresses = demoAccounts.map(({ email }) => email)
  const there = await asIdentity(urls.web, 'select 1 from identity.people where email = any($1) limit 1', [
    addresses,
  ])
  if (there.length === 0) return []
  const lines = roles.map((role) => {
    const holders = demoAccounts.filter((account) => account.roles.some((held) => held === role))
    return `  ${role.padEnd(8)} ${holders.map(({ email }) => email).join('\n           ')}`
  })
  return [`Accounts of the invented demo club, all with the password ${demoPassword}`, ...lines]
}

/**
 * Asks as the role of identity, which alone sees every club, and which the web role may turn into.
 * @param {string} webUrl
 * @param {string} query
 * @param {unknown[]} values
 */
async function asIdentity(webUrl, query, values) {
  return onDatabase(webUrl, async (client) => {
    await client.query('set role underfoot_identity')
    return (await client.query(query, values)).rows
  })
}
