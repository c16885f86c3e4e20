import { once } from 'node:events'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { createApp } from '../../../server/app.ts'
import { loadConfig, type Config } from '../../../server/config/config.ts'
import { createDatabase, type Database } from '../../../server/db/database.ts'
import type { Deps } from '../../../server/deps.ts'
import { createLog } from '../../../server/integrations/log.ts'
import { createTestDatabase, type TestDatabase } from '../../setup/database.ts'
import { ApiClient } from './api-client.ts'

export interface Harness {
  /** What the web process runs with; `workerDeps` the same in the worker's role. */
  deps: Deps
  workerDeps: Deps
  /** As the web role. */
  db: Database
  database: TestDatabase
  url: string
  /** Every line that was logged. */
  log: string[]
  /** The product's clock; a test moves it by hand. */
  time: { now: Date }
  /** Somebody's browser; nobody is signed in yet. */
  client(): ApiClient
  /** A browser in which the person is signed in. */
  signedIn(person: { email: string }): Promise<ApiClient>
  stop(): Promise<void>
}

/** The web application as it runs, on real PostgreSQL, on a port of its own. */
export async function startHarness(environment: Record<string, string> = {}): Promise<Harness> {
  const database = await createTestDatabase()
  const lines: string[] = []
  const log = createLog('info', { write: (line) => void lines.push(line) })
  const time = { now: new Date('2027-03-01T10:00:00Z') }
  const open = (role: 'web' | 'worker'): Deps => {
    const config: Config = loadConfig(role, {
      NODE_ENV: 'test',
      DATABASE_WEB_URL: database.webUrl,
      DATABASE_WORKER_URL: database.workerUrl,
      ...environment,
    })
    const db = createDatabase(config, (error) => log.warn({ err: error }, 'idle connection'))
    return { config, db, log, clock: () => new Date(time.now) }
  }
  const deps = open('web')
  const workerDeps = open('worker')
  const server = createServer(await createApp(deps)).listen(0, '127.0.0.1')
  await once(server, 'listening')
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`
  const client = () => new ApiClient(url, lines)
  return {
    deps,
    workerDeps,
    db: deps.db,
    database,
    url,
    log: lines,
    time,
    client,
    async signedIn(person) {
      const browser = client()
      await browser.signIn(person.email)
      return browser
    },
    async stop() {
      server.closeAllConnections()
      server.close()
      await Promise.all([deps.db.close(), workerDeps.db.close()])
      await database.drop()
    },
  }
}
