import { createServer } from 'node:http'
import { createApp } from './app.ts'
import { loadConfig } from './config/config.ts'
import { createDatabase } from './db/database.ts'
import type { Deps } from './deps.ts'
import { removeExpiredTries } from './http/rate-limits.ts'
import { createLog } from './integrations/log.ts'
import { stopOnSignal } from './integrations/stop-on-signal.ts'

const config = loadConfig('web')
const log = createLog(config.logLevel)
const db = createDatabase(config, (error) => log.warn({ err: error }, 'an idle database connection broke'))
const deps: Deps = { config, db, log, clock: () => new Date() }
removeExpiredTries(db.pool)

const server = createServer()
server.on('request', await createApp(deps, server))
server.once('error', (error) => {
  log.fatal({ err: error }, `the web server could not listen on ${config.host}:${config.port}`)
  process.exit(1)
})
server.listen(config.port, config.host, () => log.info({ port: config.port }, 'web is listening'))

/** Requests under way are answered; open event streams are cut, and their browsers come back elsewhere. */
stopOnSignal(log, async () => {
  const closed = new Promise((done) => server.close(done))
  server.closeIdleConnections()
  setTimeout(() => server.closeAllConnections(), 3000).unref()
  await closed
  await db.close()
})
