import { eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { workerContext } from '../../server/db/database.ts'
import { trials } from '../../server/db/schema/trials.ts'
import { usualTest } from '../../shared/contracts/session-test.ts'
import {
  changeSession,
  createSession,
  getSession,
  publishSession,
  type SessionSheet,
} from '../../shared/contracts/sessions.ts'
import type { Test } from '../../shared/contracts/tests.ts'
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
import { startWorker } from './harness/worker.ts'

let harness: Harness
let worker: Awaited<ReturnType<typeof startWorker>>
let day: TestingDay

beforeAll(async () => {
  harness = await startHarness()
  worker = await startWorker(harness)
  day = await startTestingDay(harness, ['Mara Ostrow', 'Tomi Lind'])
})
afterAll(async () => {
  await worker.stop()
  await harness.stop()
})

const plain = usualTest('cmj')
const loaded: Test = { ...plain, externalLoadKg: 20 }
const form = (test: unknown) => ({
  date: '2027-02-26',
  title: 'Loaded jumps',
  place: null,
  note: null,
  test,
  squadIds: [day.squadId],
})
const read = (sessionId: string) => day.coach.call(getSession, { params: { sessionId } })
const settled = (sessionId: string) => settledSheet(day.coach, sessionId)
const change = (sessionId: string, version: number, test: Test) =>
  day.coach.call(changeSession, { params: { sessionId }, body: { version, test } })
const massOf = (sheet: SessionSheet, fileName = 'mara_ostrow_1.csv') =>
  sheet.trials.find((trial) => trial.fileName === fileName)?.analysis?.metrics.bodyMass?.value ?? Number.NaN

/** A session of this test with a jump of each athlete. */
async function analysedSession(test: Test = plain) {
  const { id } = await day.coach.call(createSession, { body: form(test) })
  await dropFile(day.coach, id, 'mara_ostrow_1.csv', jumpFile(seed++))
  await dropFile(day.coach, id, 'tomi_lind_1.csv', jumpFile(seed++))
  return settled(id)
}
let seed = 50

describe('the test of a session', () => {
  it('is that of its recordings, which are analysed as such', async () => {
    const sheet = await analysedSession(loaded)
    expect(sheet.session.test).toEqual(loaded)
    expect(sheet.trials.map(({ test }) => test)).toEqual([loaded, loaded])
    // 75 kg stand on the plates: 20 kg of them are the bar.
    expect(massOf(sheet)).toBeCloseTo(55, 0)
  })

  it('has what its protocol knows, and nothing else', async () => {
    for (const wrong of [
      { side: 'left' },
      { boxHeightM: 0.3 },
      { externalLoadKg: -1 },
      { protocol: 'dive' },
    ]) {
      const refused = await day.coach.send(createSession, { body: form({ ...plain, ...wrong }) })
      expect(refusalOf(refused)).toEqual([400, 'invalid-request'])
      expect(JSON.stringify(refused.body)).toContain(`test.${Object.keys(wrong)[0]}`)
    }
    const boxless = await day.coach.send(createSession, { body: form(usualTest('dj')) })
    expect(JSON.stringify(boxless.body)).toContain('Give the height of the box')
    const boxed = { ...usualTest('dropLanding'), boxHeightM: 0.3, side: 'right' as const }
    expect((await day.coach.call(createSession, { body: form(boxed) })).test).toEqual(boxed)
  })
})

describe('another test for a session', () => {
  it('puts its trials to it, and analyses them anew', async () => {
    const before = await analysedSession(loaded)
    expect(massOf(before)).toBeCloseTo(55, 0)
    expect(await change(before.session.id, 1, plain)).toMatchObject({ test: plain, version: 2 })
    const after = await settled(before.session.id)
    expect(after.trials.map(({ test, version }) => [test, version])).toEqual([
      [plain, 2],
      [plain, 2],
    ])
    expect(massOf(after)).toBeCloseTo(75, 0)
    expect(after.athletes[0]?.means.bodyMass?.value).toBeCloseTo(75, 0)
  })

  it('leaves no figure of the former test standing meanwhile', async () => {
    const before = await analysedSession()
    await worker.stop()
    await change(before.session.id, 1, loaded)
    const between = await read(before.session.id)
    expect(between.trials.map(({ analysis }) => analysis)).toEqual([null, null])
    expect(between.athletes.map(({ means }) => means)).toEqual([{}, {}])
    worker = await startWorker(harness)
    expect(massOf(await settled(before.session.id))).toBeCloseTo(55, 0)
  })

  it('leaves trials alone that have a test of their own', async () => {
    const { session, trials: before } = await analysedSession()
    const own = { ...plain, arms: 'free' as const }
    const [first] = before
    await harness.db.inClub(workerContext(day.clubId), (tx) =>
      tx.update(trials).set({ arms: 'free' }).where(eq(trials.id, first.id)),
    )
    await change(session.id, 1, loaded)
    expect((await settled(session.id)).trials.map(({ test }) => test)).toEqual([own, loaded])
  })

  it('taken back gives the former analyses back', async () => {
    const before = await analysedSession()
    const idsOf = (sheet: SessionSheet) => sheet.trials.map(({ analysis }) => analysis?.id)
    await change(before.session.id, 1, loaded)
    const between = await settled(before.session.id)
    expect(idsOf(between)).not.toEqual(idsOf(before))
    await change(before.session.id, 2, plain)
    expect(idsOf(await settled(before.session.id))).toEqual(idsOf(before))
  })

  it('changes nothing that is published until that is published anew', async () => {
    const { session } = await analysedSession()
    const params = { sessionId: session.id }
    await day.coach.call(publishSession, { params, body: { version: 1 } })
    await change(session.id, 2, loaded)
    expect((await settled(session.id)).changedSincePublished).toBe(true)
    await day.coach.call(publishSession, { params, body: { version: 3 } })
    expect((await read(session.id)).changedSincePublished).toBe(false)
  })

  it('that is the same one starts nothing', async () => {
    const before = await analysedSession()
    await change(before.session.id, 1, plain)
    expect((await read(before.session.id)).trials).toEqual(before.trials)
  })

  it('is given to what is dropped from then on', async () => {
    const { id } = await newSession(day.coach, day.squadId)
    await change(id, 1, loaded)
    await dropFile(day.coach, id, 'mara_ostrow_1.csv', jumpFile(seed++))
    expect((await settled(id)).trials.map(({ test }) => test)).toEqual([loaded])
  })
})
