import { loadConfig } from './config/config.ts'
import { createDatabase } from './db/database.ts'
import { createLog } from './integrations/log.ts'
import { stopOnSignal } from './integrations/stop-on-signal.ts'
import { allJobs } from './jobs/all-jobs.ts'
import { watchNights } from './jobs/nightly.ts'
import { runJobs } from './jobs/run-jobs.ts'
import { createThreads } from './jobs/threads/threads.ts'

const healthEveryMs = 60_000

const config = loadConfig('worker')
const log = createLog(config.logLevel)
const db = createDatabase(config, (error) => log.warn({ err: error }, 'an idle database connection broke'))
const threads = createThreads()
await threads.warm()

const running = await runJobs({ config, db, log, clock: () => new Date(), threads }, allJobs)
log.info({ queues: allJobs.map(({ queue }) => queue) }, 'the worker takes jobs')
const stopNights = watchNights({ db, log, clock: () => new Date() })
const health = setInterval(() => log.info(running.counts, 'the worker is well'), healthEveryMs)

/** Jobs under way are ended; those not begun stay in the queue for another worker. */
stopOnSignal(log, async () => {
  clearInterval(health)
  stopNights()
  await running.stop()
  await threads.close()
  await db.close()
})
