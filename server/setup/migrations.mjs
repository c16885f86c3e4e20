import { SetUpProblem } from './problem.mjs'
import { lastLines, run } from './run.mjs'

/**
 * Brings a database to the present schema, as its owner.
 * @param {string} ownerUrl
 */
export async function migrate(ownerUrl) {
  const env = { ...process.env, DATABASE_OWNER_URL: ownerUrl }
  const { code, output } = await run(process.execPath, ['--import', 'tsx', 'server/commands/migrate.ts'], {
    env,
  })
  if (code !== 0)
    throw new SetUpProblem(`The database could not be brought up to date:\n${lastLines(output)}`)
}
