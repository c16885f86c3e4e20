import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { workerContext } from '../../server/db/database.ts'
import { sendJobs } from '../../server/jobs/queue.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { startHarness, type Harness } from './harness/harness.ts'
import {
  dropFile,
  jumpFile,
  newSession,
  settledSheet,
  startTestingDay,
  type TestingDay,
} from './harness/testing-day.ts'
import { until } from './harness/until.ts'
import { startWorker, type WorkerOptions } from './harness/worker.ts'
import { kill, spawnWorker, threadModule } from './harness/worker-process.ts'

let harness: Harness
let day: TestingDay
const started: { stop(): Promise<unknown> }[] = []

beforeAll(async () => {
  harness = await startHarness()
  day = await startTestingDay(harness, ['Mara Ostrow'])
})
afterEach(async () => {
  await Promise.all(started.splice(0).map((one) => one.stop()))
})
afterAll(() => harness.stop())

const start = async (options?: WorkerOptions) => {
  const worker = await startWorker(harness, options)
  started.push(worker)
  return worker
}
const rowsOf = <T>(query: string, values: unknown[] = []) =>
  onDatabase(harness.database.adminUrl, async (admin) => (await admin.query(query, values)).rows as T[])
const stateOf = async (uploadId: string) => {
  const [job] = await rowsOf<{ state: string }>(
    `select state::text from pgboss.job where name = 'read-upload' and data ->> 'uploadId' = $1`,
    [uploadId],
  )
  return job?.state
}

let seed = 900
const drop = async (fileName = 'mara_ostrow.csv') => {
  const session = await newSession(day.coach, day.squadId)
  return { session, upload: await dropFile(day.coach, session.id, fileName, jumpFile((seed += 1))) }
}

describe('a job that is run twice', () => {
  it('reads and analyses once', async () => {
    const { session, upload } = await drop()
    await harness.workerDeps.db.inClub(workerContext(day.clubId), (tx) =>
      sendJobs(tx, 'read-upload', { version: 1, clubId: day.clubId, uploadId: upload.id }),
    )
    await start()
    const { trials } = await settledSheet(day.coach, session.id)
    const trialId = trials[0].id
    await harness.workerDeps.db.inClub(workerContext(day.clubId), (tx) =>
      sendJobs(
        tx,
        'analyse-trial',
        { version: 1, clubId: day.clubId, trialId },
        { version: 1, clubId: day.clubId, trialId },
      ),
    )
    await until(
      () => rowsOf<{ n: number }>(`select count(*)::int as n from pgboss.job where state < 'completed'`),
      ([{ n }]) => n === 0,
      { what: 'an empty queue' },
    )
    const counts = await rowsOf(
      `select (select count(*)::int from club.trials where upload_id = $1) as trials,
        (select count(*)::int from club.analyses where trial_id = $2) as analyses`,
      [upload.id, trialId],
    )
    expect(counts).toEqual([{ trials: 1, analyses: 1 }])
  })
})

describe('two workers', () => {
  it('share the jobs of a drop, each done once', async () => {
    const session = await newSession(day.coach, day.squadId)
    const files = Array.from(
      { length: 12 },
      (_, i) => [`mara_ostrow_${i}.csv`, jumpFile((seed += 1))] as const,
    )
    for (const [name, bytes] of files) await dropFile(day.coach, session.id, name, bytes)
    const workers = await Promise.all([start({ run: { atOnce: 3 } }), start({ run: { atOnce: 3 } })])
    const { trials, athletes } = await settledSheet(day.coach, session.id)
    expect(trials).toHaveLength(12)
    expect(athletes[0].means.jumpHeightImpulse.trials).toBe(12)
    expect(workers.map(({ counts }) => counts.failed)).toEqual([0, 0])
  })
})

describe('a worker that is killed in the middle of a job', () => {
  it('loses it to another worker when it expires', async () => {
    await rowsOf(`update pgboss.queue set expire_seconds = 1`)
    const { session, upload } = await drop()
    await onDatabase(harness.database.adminUrl, async (admin) => {
      // Whoever reads the upload cannot write what it read: the worker stays in the middle of the job.
      await admin.query('begin')
      await admin.query('select 1 from club.uploads where id = $1 for update', [upload.id])
      const doomed = spawnWorker(harness)
      try {
        await until(
          () => stateOf(upload.id),
          (state) => state === 'active',
          { what: 'the job taken up', deadlineMs: 40_000 },
        )
      } finally {
        await kill(doomed)
        await admin.query('rollback')
      }
    })
    expect(await stateOf(upload.id)).toBe('active')
    await start({ run: { maintenanceSeconds: 1 } })
    const { trials } = await settledSheet(day.coach, session.id)
    expect(trials).toHaveLength(1)
    await rowsOf(`update pgboss.queue set expire_seconds = 40`)
  }, 60_000)
})

describe('a file that cannot be read in time', () => {
  it('is refused by name, its thread is ended, and the next file is read', async () => {
    const endless = await drop('endless.csv')
    await start({ threads: { readTimeLimitMs: 3000, filename: threadModule('bad-reading') } })
    const stuck = await settledSheet(day.coach, endless.session.id)
    expect(stuck.uploads[0]).toMatchObject({ state: 'refused', error: { code: 'reading-too-long' } })
    const next = await drop('next.csv')
    expect((await settledSheet(day.coach, next.session.id)).uploads[0].state).toBe('read')
  })

  it('is refused by name where it needs too much memory', async () => {
    const greedy = await drop('greedy.csv')
    await start({ threads: { memoryMb: 48, filename: threadModule('bad-reading') } })
    const { uploads } = await settledSheet(day.coach, greedy.session.id)
    expect(uploads[0]).toMatchObject({ state: 'refused', error: { code: 'reading-too-much-memory' } })
  })
})

describe('a job that fails at every try', () => {
  it('is given up: the file says so, and its bytes are kept', async () => {
    await rowsOf(`update pgboss.queue set retry_limit = 1, retry_delay = 0, retry_backoff = false`)
    const { session } = await drop('fails.csv')
    await start({ threads: { filename: threadModule('bad-reading') } })
    const { uploads } = await settledSheet(day.coach, session.id)
    expect(uploads[0]).toMatchObject({ state: 'refused', error: { code: 'reading-failed' } })
  })

  it('is given up: the trial says so, and counts nowhere', async () => {
    const { session } = await drop('mara_ostrow_unanalysable.csv')
    await start({ threads: { filename: threadModule('no-analysis') } })
    const { trials, athletes } = await settledSheet(day.coach, session.id)
    expect(trials[0].analysis).toMatchObject({
      metrics: {},
      fails: 1,
      worstSentence: expect.stringMatching(/our side/),
    })
    expect(athletes[0].means).toEqual({})
  })
})

describe('a queue that cannot be read', () => {
  it('is told in the log, and not taken for an empty one', async () => {
    await rowsOf('revoke update on pgboss.job from underfoot_worker')
    try {
      await start()
      await until(
        () => Promise.resolve(harness.log.some((line) => line.includes('the queue cannot be read'))),
        Boolean,
        { what: 'a line in the log' },
      )
    } finally {
      await rowsOf('grant update on pgboss.job to underfoot_worker')
    }
  })
})
