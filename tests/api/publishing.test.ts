import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { getMyResults } from '../../shared/contracts/results.ts'
import {
  changeSession,
  getSession,
  publishSession,
  type SessionSheet,
} from '../../shared/contracts/sessions.ts'
import { changeTrial, getSamples, getTrial } from '../../shared/contracts/trials.ts'
import { getOriginal } from '../../shared/contracts/uploads.ts'
import { workerContext } from '../../server/db/database.ts'
import { sendJobs } from '../../server/jobs/queue.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { buildAthlete } from '../../seed/builders/athlete.ts'
import { buildMember } from '../../seed/builders/person.ts'
import type { ApiClient } from './harness/api-client.ts'
import { refusalOf } from './harness/api-client.ts'
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
import { startWorker } from './harness/worker.ts'

let harness: Harness
let worker: Awaited<ReturnType<typeof startWorker>>
let day: TestingDay
let mara: Own
let tomi: Own

interface Own {
  athleteId: string
  email: string
  browser: ApiClient
}

beforeAll(async () => {
  harness = await startHarness()
  worker = await startWorker(harness)
  day = await startTestingDay(harness, [])
  mara = await linkedAthlete('Mara Ostrow')
  tomi = await linkedAthlete('Tomi Lind')
})
afterAll(async () => {
  await worker.stop()
  await harness.stop()
})

async function linkedAthlete(name: string): Promise<Own> {
  const member = await buildMember(harness.db, day.clubId, ['athlete'], { name })
  const row = { name, recordedMassKg: 75, personId: member.id, squadIds: [day.squadId] }
  const athleteId = await buildAthlete(harness.db, day.clubId, row)
  return { athleteId, email: member.email, browser: await harness.signedIn(member) }
}

let seed = 500
let sheet: SessionSheet
beforeEach(async () => {
  const { id } = await newSession(day.coach, day.squadId)
  for (const name of ['mara_ostrow_1.csv', 'mara_ostrow_2.csv', 'tomi_lind_1.csv', 'nobody.csv']) {
    await dropFile(day.coach, id, name, jumpFile((seed += 1)))
  }
  sheet = await settledSheet(day.coach, id)
})

const sessionId = () => sheet.session.id
const trialOf = (fileName: string) => sheet.trials.find((trial) => trial.fileName === fileName)?.id ?? ''
const readSheet = () => day.coach.call(getSession, { params: { sessionId: sessionId() } })
const publish = async () => {
  const { version } = (await readSheet()).session
  return day.coach.call(publishSession, { params: { sessionId: sessionId() }, body: { version } })
}
const setAside = (fileName: string, reason: string | null, version: number) =>
  day.coach.call(changeTrial, {
    params: { trialId: trialOf(fileName) },
    body: { version, setAsideReason: reason },
  })
const resultOf = async ({ browser }: Own) =>
  (await browser.call(getMyResults)).results.find((result) => result.sessionId === sessionId())
const readTrial = (browser: ApiClient, fileName: string) =>
  browser.send(getTrial, { params: { trialId: trialOf(fileName) } })

describe('before a session is published', () => {
  it('its athletes see nothing of it', async () => {
    expect(await resultOf(mara)).toBeUndefined()
    expect(refusalOf(await readTrial(mara.browser, 'mara_ostrow_1.csv'))).toEqual([404, 'not-found'])
    const samples = await mara.browser.refusal(getSamples, {
      params: { trialId: trialOf('mara_ostrow_1.csv') },
    })
    expect(samples).toEqual([404, 'not-found'])
  })
})

describe('a published session', () => {
  it('shows each athlete the means of their own trials, and nothing else', async () => {
    expect(await publish()).toMatchObject({ athletesPublished: 2, trialsPublished: 3, inTray: 1, version: 2 })
    const means = sheet.athletes.find(({ athleteId }) => athleteId === mara.athleteId)?.means
    expect(await resultOf(mara)).toMatchObject({
      trialIds: [trialOf('mara_ostrow_1.csv'), trialOf('mara_ostrow_2.csv')],
      means,
    })
    expect((await resultOf(tomi))?.trialIds).toEqual([trialOf('tomi_lind_1.csv')])
  })

  it('opens an athlete’s own trial, simpler, and nobody else’s', async () => {
    await publish()
    const own = await readTrial(mara.browser, 'mara_ostrow_1.csv')
    expect(own.body).toMatchObject({
      athlete: { id: mara.athleteId },
      placeInSession: { n: 1, of: 2 },
      fileName: null,
      mayEdit: false,
      previousTrialId: null,
      nextTrialId: trialOf('mara_ostrow_2.csv'),
    })
    const params = { trialId: trialOf('mara_ostrow_1.csv') }
    expect((await mara.browser.send(getSamples, { params })).status).toBe(200)
    for (const fileName of ['tomi_lind_1.csv', 'nobody.csv']) {
      expect(refusalOf(await readTrial(mara.browser, fileName))).toEqual([404, 'not-found'])
      const refused = await mara.browser.refusal(getSamples, { params: { trialId: trialOf(fileName) } })
      expect(refused).toEqual([404, 'not-found'])
    }
    const uploadId = sheet.uploads[0].id
    expect(await mara.browser.refusal(getOriginal, { params: { uploadId } })).toEqual([403, 'not-allowed'])
  })

  it('stays what it was whatever is done to the sheet, until it is published as a correction', async () => {
    await publish()
    const before = await resultOf(mara)
    await setAside('mara_ostrow_1.csv', 'Stumbled', 1)
    await recomputeWithAnotherMass('mara_ostrow_2.csv')
    expect(await resultOf(mara)).toEqual(before)
    expect((await readTrial(mara.browser, 'mara_ostrow_1.csv')).body).toMatchObject({ setAside: null })
    expect((await readSheet()).changedSincePublished).toBe(true)

    expect(await publish()).toMatchObject({ trialsPublished: 2 })
    expect((await resultOf(mara))?.trialIds).toEqual([trialOf('mara_ostrow_2.csv')])
    expect(refusalOf(await readTrial(mara.browser, 'mara_ostrow_1.csv'))).toEqual([404, 'not-found'])
    expect((await readSheet()).changedSincePublished).toBe(false)
  })

  it('pins the analysis: a newer one is the coach’s alone until then', async () => {
    await publish()
    const pinned = (await readTrial(mara.browser, 'mara_ostrow_2.csv')).body as { analysis: { id: string } }
    const newer = await recomputeWithAnotherMass('mara_ostrow_2.csv')
    expect(newer).not.toBe(pinned.analysis.id)
    expect((await readTrial(mara.browser, 'mara_ostrow_2.csv')).body).toMatchObject({
      analysis: { id: pinned.analysis.id },
    })
  })

  it('keeps the test that it was published under when the session is put to another', async () => {
    await publish()
    const before = (await readTrial(mara.browser, 'mara_ostrow_1.csv')).body as {
      test: object
      analysis: object
    }
    const { version } = (await readSheet()).session
    const test = { ...before.test, externalLoadKg: 20 }
    const body = { version, test }
    await day.coach.call(changeSession, { params: { sessionId: sessionId() }, body })
    await settledSheet(day.coach, sessionId())
    const { test: asPublished, analysis } = before
    const after = await readTrial(mara.browser, 'mara_ostrow_1.csv')
    expect(after.body).toMatchObject({ test: asPublished, analysis })
    await publish()
    expect((await readTrial(mara.browser, 'mara_ostrow_1.csv')).body).toMatchObject({ test })
  })

  it('loses an athlete’s results when all their trials are gone from the correction', async () => {
    await publish()
    await setAside('tomi_lind_1.csv', 'Another athlete', 1)
    expect(await publish()).toMatchObject({ athletesPublished: 1 })
    expect(await resultOf(tomi)).toBeUndefined()
  })

  it('is published by the one who saw it last: a stale version is refused', async () => {
    await publish()
    const stale = await day.coach.refusal(publishSession, {
      params: { sessionId: sessionId() },
      body: { version: 1 },
    })
    expect(stale).toEqual([409, 'stale-version'])
  })

  it('by two at once is published once', async () => {
    const params = { sessionId: sessionId() }
    const answers = await Promise.all(
      [1, 2].map(() => day.coach.send(publishSession, { params, body: { version: 1 } })),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
  })

  it('with nothing that counts is refused', async () => {
    const { id } = await newSession(day.coach, day.squadId)
    const refused = await day.coach.refusal(publishSession, {
      params: { sessionId: id },
      body: { version: 1 },
    })
    expect(refused).toEqual([409, 'nothing-to-publish'])
  })

  it('is told to those athletes by mail for whom something is new', async () => {
    const mailsTo = ({ email }: Own) =>
      onDatabase(harness.database.adminUrl, async (admin) => {
        const { rows } = await admin.query(
          `select 1 from identity.outbox where to_address = $1 and template = 'results-published'`,
          [email],
        )
        return rows.length
      })
    const [maraBefore, tomiBefore] = [await mailsTo(mara), await mailsTo(tomi)]
    await publish()
    expect([await mailsTo(mara), await mailsTo(tomi)]).toEqual([maraBefore + 1, tomiBefore + 1])
    await setAside('mara_ostrow_1.csv', 'Stumbled', 1)
    await publish()
    expect([await mailsTo(mara), await mailsTo(tomi)]).toEqual([maraBefore + 2, tomiBefore + 1])
    await closePlace(mara, true)
    await setAside('mara_ostrow_1.csv', null, 2)
    await publish()
    await closePlace(mara, false)
    expect(await mailsTo(mara), 'with a closed place').toBe(maraBefore + 2)
  })
})

const closePlace = ({ email }: Own, closed: boolean) =>
  onDatabase(harness.database.adminUrl, async (admin) => {
    await admin.query(
      `update identity.memberships set active = $1 where person_id = (select id from identity.people where email = $2)`,
      [!closed, email],
    )
  })

/** The athlete's recorded mass changes, and the trial is analysed anew with it; returns the newer analysis. */
async function recomputeWithAnotherMass(fileName: string): Promise<string> {
  const trialId = trialOf(fileName)
  await onDatabase(harness.database.adminUrl, (admin) =>
    admin.query(`update club.athletes set recorded_mass_kg = recorded_mass_kg + 1 where id = $1`, [
      mara.athleteId,
    ]),
  )
  await harness.workerDeps.db.inClub(workerContext(day.clubId), (tx) =>
    sendJobs(tx, 'analyse-trial', { version: 1, clubId: day.clubId, trialId }),
  )
  const before = sheet.trials.find(({ id }) => id === trialId)?.analysis?.id
  const newer = await until(
    () => day.coach.call(getTrial, { params: { trialId } }),
    ({ analysis }) => analysis !== null && analysis.id !== before,
    { what: 'a newer analysis' },
  )
  return newer.analysis?.id ?? ''
}
