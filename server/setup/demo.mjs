import { onDatabase } from './database-urls.mjs'
import { fillOnce } from './local-database.mjs'
import { SetUpProblem, step } from './problem.mjs'
import { lastLines, run } from './run.mjs'

/**
 * Makes the invented demo club in a database that has no club yet.
 * @param {import('./roles.mjs').OfRoles} urls
 * @param {NodeJS.ProcessEnv} env
 * @param {{ disposable: boolean }} options whether the database is private, and a demo cut short may be dropped
 */
export async function ensureDemo(urls, env, { disposable }) {
  if (await hasClub(urls.web)) return
  step('Making the demo club: invented people, recordings made from physics (about a minute)')
  const make = async () => {
    const { code, output } = await run(process.execPath, ['--import', 'tsx', 'seed/demo/main.ts'], { env })
    if (code !== 0) throw new SetUpProblem(`The demo club could not be made:\n${lastLines(output)}`)
  }
  await (disposable ? fillOnce(make) : make())
}

/** @param {string} webUrl */
async function hasClub(webUrl) {
  return onDatabase(webUrl, async (client) => {
    // Clubs are seen by the role of identity alone, which the web role may turn into.
    await client.query('set role underfoot_identity')
    const { rowCount } = await client.query('select 1 from identity.clubs limit 1')
    return Boolean(rowCount)
  })
}
