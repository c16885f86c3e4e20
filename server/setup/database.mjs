import { onDatabase } from './database-urls.mjs'
import { startLocalDatabase } from './local-database.mjs'
import { SetUpProblem, step } from './problem.mjs'
import { ensurePrograms } from './programs.mjs'
import { onStop } from './stopping.mjs'

/**
 * The addresses of the database to use: the operator's own, or a private one that is started here.
 * @param {import('./settings.mjs').Settings} settings
 */
export async function openDatabase(settings) {
  if (settings.database) {
    step('Using the database of DATABASE_OWNER_URL, DATABASE_WEB_URL and DATABASE_WORKER_URL')
    for (const [role, url] of Object.entries(settings.database)) await checkOwnDatabase(role, url)
    return settings.database
  }
  await ensurePrograms({ browser: false })
  const { urls, stop } = await startLocalDatabase()
  await onStop(stop)
  return urls
}

/**
 * @param {string} role
 * @param {string} url
 */
async function checkOwnDatabase(role, url) {
  try {
    await onDatabase(url, (client) => client.query('select 1'))
  } catch (error) {
    const reason = error instanceof Error ? error.message || error.name : String(error)
    throw new SetUpProblem(`The database of DATABASE_${role.toUpperCase()}_URL does not answer (${reason}).`)
  }
}
