import { fileURLToPath } from 'node:url'
import { Piscina } from 'piscina'
import { loadConfig } from '../../server/config/config.ts'
import { createDatabase } from '../../server/db/database.ts'
import type { Deps } from '../../server/deps.ts'
import { createLog } from '../../server/integrations/log.ts'
import { analyseTrialJob } from '../../server/modules/analyses/analyses.jobs.ts'
import { readUploadJob } from '../../server/modules/uploads/uploads.jobs.ts'
import { runJobs } from '../../server/jobs/run-jobs.ts'
import { createThreads } from '../../server/jobs/threads/threads.ts'
import { makePeople } from './people.ts'
import { type MakeFile, runSquad } from './session-days.ts'

/**
 * Makes the demo club: invented people, recordings made from physics, through the very services that people use,
 * with the jobs run in this process. Dates count back from today; everything else comes out the same each time.
 */
async function main(): Promise<void> {
  const open = (role: 'web' | 'worker'): Deps => {
    const config = loadConfig(role)
    const log = createLog('warn')
    const db = createDatabase(config, (error) => log.warn({ err: error }, 'an idle connection broke'))
    return { config, db, log, clock: () => new Date() }
  }
  const web = open('web')
  const worker = open('worker')
  // One thread reads and one makes files: with the database, that fills two cores.
  const threads = createThreads({ threads: 1 })
  const files = new Piscina({
    filename: fileURLToPath(new URL('./file-thread.ts', import.meta.url)),
    execArgv: ['--import', new URL('../../server/jobs/threads/load-typescript.mjs', import.meta.url).href],
    maxThreads: 1,
  })
  const makeFile: MakeFile = (recipe, style) => files.run({ recipe, style }) as Promise<Uint8Array>
  const running = await runJobs({ ...worker, threads }, [readUploadJob, analyseTrialJob], { idleMs: 30 })
  const today = new Date()
  const squads = await makePeople(web)
  await Promise.all(squads.map((site, number) => runSquad(web, site, { number, today, makeFile })))
  await running.stop()
  await Promise.all([threads.close(), files.close(), web.db.close(), worker.db.close()])
  const seconds = Math.round(process.uptime())
  const megabytes = Math.round(process.resourceUsage().maxRSS / 1024)
  const cost = `${running.counts.done} jobs, ${seconds} s, ${megabytes} MB of memory at most`
  process.stdout.write(`Made the demo club: ${cost}.\n`)
}

await main()
