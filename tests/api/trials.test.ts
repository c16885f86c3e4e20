import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { getAthlete } from '../../shared/contracts/athletes.ts'
import { getSession, type SheetTrial } from '../../shared/contracts/sessions.ts'
import { changeTrial, getTrial } from '../../shared/contracts/trials.ts'
import { finishUpload } from '../../shared/contracts/uploads.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { buildAthlete } from '../../seed/builders/athlete.ts'
import { refusalOf } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import {
  dropFile,
  jumpFile,
  newSession,
  sendFile,
  settledSheet,
  startTestingDay,
  type TestingDay,
} from './harness/testing-day.ts'
import { until } from './harness/until.ts'
import { startWorker } from './harness/worker.ts'

let harness: Harness
let worker: Awaited<ReturnType<typeof startWorker>>
let day: TestingDay
let mara: string
let tomi: string

beforeAll(async () => {
  harness = await startHarness()
  worker = await startWorker(harness)
  day = await startTestingDay(harness, ['Mara Ostrow', 'Tomi Lind'])
  mara = day.athletes['Mara Ostrow']
  tomi = day.athletes['Tomi Lind']
})
afterAll(async () => {
  await worker.stop()
  await harness.stop()
})

let seed = 100
/** A session of its own with these files, analysed; trials by file name. */
async function sessionWith(...fileNames: string[]) {
  const session = await newSession(day.coach, day.squadId)
  for (const fileName of fileNames) await dropFile(day.coach, session.id, fileName, jumpFile((seed += 1)))
  const { trials } = await settledSheet(day.coach, session.id)
  const trial = (name: string) => trials.find(({ fileName }) => fileName === name) as SheetTrial
  return { session, trial }
}
const change = (id: string, body: Record<string, unknown>) =>
  day.coach.call(changeTrial, { params: { trialId: id }, body })
const means = async (sessionId: string, athleteId: string) => {
  const { athletes } = await day.coach.call(getSession, { params: { sessionId } })
  return athletes.find((athlete) => athlete.athleteId === athleteId)?.means ?? {}
}

describe('trials on the sheet', () => {
  it('stand in the order in which their files were dropped, whichever was read first', async () => {
    const session = await newSession(day.coach, day.squadId)
    const first = await sendFile(day.coach, session.id, 'ostrow_mara_1.csv', jumpFile(90))
    await dropFile(day.coach, session.id, 'ostrow_mara_2.csv', jumpFile(91))
    await settledSheet(day.coach, session.id)
    await day.coach.call(finishUpload, { params: { uploadId: first.id } })
    const { trials } = await settledSheet(day.coach, session.id)
    expect(trials.map(({ fileName }) => fileName)).toEqual(['ostrow_mara_1.csv', 'ostrow_mara_2.csv'])
  })
})

describe('a trial in the Tray', () => {
  it('goes on an athlete by hand, counts in the mean, and is checked against that athlete’s mass', async () => {
    const { session, trial } = await sessionWith('x1.csv', 'x2.csv')
    const assigned = await change(trial('x1.csv').id, { version: 1, athleteId: mara })
    expect(assigned).toMatchObject({ athlete: { id: mara }, placeInSession: { n: 1, of: 1 }, version: 2 })
    expect((await means(session.id, mara)).jumpHeightImpulse.trials).toBe(1)
    await until(
      () => day.coach.call(getTrial, { params: { trialId: trial('x1.csv').id } }),
      ({ analysis }) => analysis?.checks.some(({ key }) => key.startsWith('mass')) ?? false,
      { what: 'the check against the recorded mass' },
    )
    await change(trial('x2.csv').id, { version: 1, athleteId: mara })
    expect((await means(session.id, mara)).jumpHeightImpulse.trials).toBe(2)
  })

  it('cannot go on somebody who is not on the sheet', async () => {
    const { trial } = await sessionWith('x1.csv')
    const stranger = await buildAthlete(harness.db, day.clubId, { name: 'Not Here' })
    const refused = await day.coach.refusal(changeTrial, {
      params: { trialId: trial('x1.csv').id },
      body: { version: 1, athleteId: stranger },
    })
    expect(refused).toEqual([409, 'athlete-not-in-session'])
  })
})

describe('a trial on the wrong athlete', () => {
  it('moves, and both means follow', async () => {
    const { session, trial } = await sessionWith('mara_ostrow_1.csv', 'mara_ostrow_2.csv')
    const moved = await change(trial('mara_ostrow_2.csv').id, { version: 1, athleteId: tomi })
    expect(moved.athlete?.name).toBe('Tomi Lind')
    expect((await means(session.id, mara)).takeoffVelocity.trials).toBe(1)
    expect((await means(session.id, tomi)).takeoffVelocity.trials).toBe(1)
  })

  it('goes back to the Tray, and to its first analysis when it comes back', async () => {
    const { session, trial } = await sessionWith('mara_ostrow_1.csv')
    const { id, analysis } = trial('mara_ostrow_1.csv')
    await change(id, { version: 1, athleteId: null })
    expect(await means(session.id, mara)).toEqual({})
    const other = await until(
      () => day.coach.call(getTrial, { params: { trialId: id } }),
      (now) => now.analysis !== null && now.analysis.id !== analysis?.id,
      { what: 'an analysis without a recorded mass' },
    )
    expect(other).toMatchObject({ athlete: null, placeInSession: null })
    await change(id, { version: 2, athleteId: mara })
    await until(
      () => day.coach.call(getTrial, { params: { trialId: id } }),
      (now) => now.analysis?.id === analysis?.id,
      { what: 'the analysis with the recorded mass again' },
    )
  })
})

describe('a trial set aside', () => {
  it('stays with its reason and leaves the means; taken back, it counts again', async () => {
    const { session, trial } = await sessionWith('mara_ostrow_1.csv', 'mara_ostrow_2.csv')
    const { id } = trial('mara_ostrow_1.csv')
    const aside = await change(id, { version: 1, setAsideReason: 'Stumbled at takeoff' })
    expect(aside.setAside).toMatchObject({
      reason: 'Stumbled at takeoff',
      byName: expect.stringMatching(/Person/),
    })
    expect((await means(session.id, mara)).jumpHeightImpulse.trials).toBe(1)
    const back = await change(id, { version: 2, setAsideReason: null })
    expect(back.setAside).toBeNull()
    expect((await means(session.id, mara)).jumpHeightImpulse.trials).toBe(2)
  })

  it('leaves nothing in the athlete’s points when it was the only one', async () => {
    const { session, trial } = await sessionWith('tomi_lind.csv')
    const pointsHere = async () => {
      const { results } = await day.coach.call(getAthlete, { params: { athleteId: tomi } })
      return results.filter(({ sessionId }) => sessionId === session.id)
    }
    expect(await pointsHere()).toMatchObject([{ trialIds: [trial('tomi_lind.csv').id], date: '2027-02-26' }])
    await change(trial('tomi_lind.csv').id, { version: 1, setAsideReason: 'Not a jump' })
    expect(await pointsHere()).toEqual([])
  })

  it('needs a reason', async () => {
    const { trial } = await sessionWith('mara_ostrow_1.csv')
    const refused = await day.coach.refusal(changeTrial, {
      params: { trialId: trial('mara_ostrow_1.csv').id },
      body: { version: 1, setAsideReason: ' ' },
    })
    expect(refused).toEqual([400, 'invalid-request'])
  })
})

describe('two people at one trial', () => {
  it('do not overwrite each other: the second sees what the first did', async () => {
    const { trial } = await sessionWith('x1.csv')
    const { id } = trial('x1.csv')
    await change(id, { version: 1, athleteId: mara })
    const stale = await day.coach.send(changeTrial, {
      params: { trialId: id },
      body: { version: 1, athleteId: tomi },
    })
    expect(refusalOf(stale)).toEqual([409, 'stale-version'])
    expect(stale.body).toMatchObject({ error: { details: { newer: { athlete: { id: mara }, version: 2 } } } })
  })

  it('who change two trials of one athlete at once leave a mean of both', async () => {
    const { session, trial } = await sessionWith('a.csv', 'b.csv', 'c.csv', 'd.csv')
    await Promise.all(
      ['a', 'b', 'c', 'd'].map((name) => change(trial(`${name}.csv`).id, { version: 1, athleteId: mara })),
    )
    expect((await means(session.id, mara)).takeoffVelocity.trials).toBe(4)
  })
})

describe('what was done to a trial', () => {
  it('stands in the audit log, by ids', async () => {
    const { trial } = await sessionWith('x1.csv')
    const { id } = trial('x1.csv')
    await change(id, { version: 1, athleteId: mara })
    await change(id, { version: 2, setAsideReason: 'Stumbled' })
    await change(id, { version: 3, setAsideReason: null })
    const rows = await onDatabase(harness.database.adminUrl, async (admin) => {
      const found = await admin.query(
        `select action, detail from club.audit_log where subject_id = $1 order by at`,
        [id],
      )
      return found.rows as { action: string; detail: unknown }[]
    })
    expect(rows).toEqual([
      { action: 'trial.assign', detail: { from: null, to: mara } },
      { action: 'trial.set-aside', detail: {} },
      { action: 'trial.take-back', detail: {} },
    ])
  })
})
