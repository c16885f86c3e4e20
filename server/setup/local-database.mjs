import { existsSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { isMade, makeCluster, startCluster } from './cluster.mjs'
import { databaseUrl, onDatabase } from './database-urls.mjs'
import { localFolder } from './paths.mjs'
import { SetUpProblem, step } from './problem.mjs'
import { forEachRole, makeDatabase, makeRoles } from './roles.mjs'
import { localSecrets } from './secrets.mjs'
import { serverUserFor } from './server-user.mjs'

const databaseName = 'underfoot'
/** Where Debian keeps clusters: for a checkout that the server's user cannot reach. */
const debianStateFolder = '/var/lib/postgresql'

/**
 * Starts this checkout's private database and makes it where it is new.
 * @returns {Promise<{ urls: import('./roles.mjs').OfRoles, stop: () => Promise<void> }>}
 */
export async function startLocalDatabase() {
  const secrets = localSecrets()
  const place = clusterPlace(secrets.id)
  const cluster = { ...place, log: join(localFolder(), 'database.log'), password: secrets.superuser }
  if (!isMade(cluster)) {
    step(`Making a private database in ${cluster.folder}`)
    await makeCluster(cluster)
  }
  const { port, adminUrl, stop } = await startCluster(cluster)
  try {
    await makeRoles(adminUrl, secrets)
    await dropHalfFilled(adminUrl)
    await makeDatabase(adminUrl, databaseName)
  } catch (error) {
    await stop()
    throw error
  }
  step(`Database started on port ${port}`)
  return { urls: forEachRole((role, key) => databaseUrl(role, secrets[key], port, databaseName)), stop }
}

/**
 * Fills the new private database. Cut short, it leaves a mark, and the next start begins with an empty one.
 * @param {() => Promise<void>} fill
 */
export async function fillOnce(fill) {
  writeFileSync(halfFilledMark(), '')
  await fill()
  rmSync(halfFilledMark())
}

/** @param {string} adminUrl */
async function dropHalfFilled(adminUrl) {
  if (!existsSync(halfFilledMark())) return
  await onDatabase(adminUrl, (admin) => admin.query(`drop database if exists ${databaseName} with (force)`))
  rmSync(halfFilledMark())
}

const halfFilledMark = () => join(localFolder(), 'demo-under-way')

/** @param {string} id */
function clusterPlace(id) {
  const folders = [join(localFolder(), 'cluster'), join(debianStateFolder, `underfoot-${id}`)]
  for (const folder of folders) {
    const user = serverUserFor(folder)
    if (user) return { folder, user }
  }
  throw new SetUpProblem(`The database server's user can write neither to ${folders.join(' nor to ')}.`)
}
