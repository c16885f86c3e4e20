import { randomBytes } from 'node:crypto'
import { readdirSync, rmSync, statSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { makeCluster, startCluster } from './cluster.mjs'
import { databaseUrl } from './database-urls.mjs'
import { migrate } from './migrations.mjs'
import { runningServer } from './postgres-server.mjs'
import { SetUpProblem } from './problem.mjs'
import { forEachRole, makeDatabase, makeRoles } from './roles.mjs'
import { serverUserFor } from './server-user.mjs'

/** The migrated, empty database that each test file gets a clone of. */
export const templateDatabase = 'underfoot_template'

const folderPrefix = 'underfoot-test-'
const forsakenMs = 3_600_000

/** Tests may lose everything at a power cut: waiting for the disk would only make them slow. */
const settings = { fsync: 'off', synchronous_commit: 'off', full_page_writes: 'off', max_connections: '200' }

/**
 * What a test needs to know of the server: enough to clone the template and sign in as each role.
 * @typedef {{ port: number, adminUrl: string, passwords: import('./roles.mjs').OfRoles }} TestCluster
 */

/**
 * Starts a database server that lives as long as one test run and holds the migrated template. Two runs never
 * share one, so they cannot disturb each other.
 * @returns {Promise<{ cluster: TestCluster, stop: () => Promise<void> }>}
 */
export async function startTestCluster() {
  dropForsaken()
  const folder = join(tmpdir(), `${folderPrefix}${randomBytes(6).toString('hex')}`)
  const log = `${folder}.log`
  const user = serverUserFor(folder)
  if (!user) throw new SetUpProblem(`The database server's user cannot write to ${tmpdir()}.`)
  const files = { folder, log, user, password: randomText(), settings }
  await makeCluster(files)
  const { port, adminUrl, stop: stopServer } = await startCluster(files)
  const stop = async () => {
    await stopServer()
    for (const path of [folder, log]) rmSync(path, { recursive: true, force: true })
  }
  try {
    const passwords = forEachRole(randomText)
    await makeRoles(adminUrl, passwords)
    await makeDatabase(adminUrl, templateDatabase)
    await migrate(databaseUrl('underfoot_owner', passwords.owner, port, templateDatabase))
    return { cluster: { port, adminUrl, passwords }, stop }
  } catch (error) {
    await stop()
    throw error
  }
}

/** Removes the files of runs that were killed: theirs is no server any more, and they are not just beginning. */
function dropForsaken() {
  for (const name of readdirSync(tmpdir()).filter((name) => name.startsWith(folderPrefix))) {
    const path = join(tmpdir(), name)
    const found = statSync(path, { throwIfNoEntry: false })
    if (!found || Date.now() - found.mtimeMs < forsakenMs || runningServer(path.replace(/\.log$/, '')))
      continue
    rmSync(path, { recursive: true, force: true })
  }
}

const randomText = () => randomBytes(16).toString('hex')
