import { eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { buildAthlete, buildSquad } from '../../seed/builders/athlete.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { buildTrial, buildUpload } from '../../seed/builders/trial.ts'
import { workerContext } from '../../server/db/database.ts'
import { trials } from '../../server/db/schema/trials.ts'
import { candidatesOf } from '../../server/modules/sessions/sessions.service.ts'
import { changeSession, getSession } from '../../shared/contracts/sessions.ts'
import { changeSquad } from '../../shared/contracts/squads.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { refusalOf } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import { newSession, startTestingDay, type TestingDay } from './harness/testing-day.ts'
import { until } from './harness/until.ts'

let harness: Harness
let day: TestingDay
let jumps: string
let tomi: string

beforeAll(async () => {
  harness = await startHarness()
  day = await startTestingDay(harness, ['Ada Berg', 'Mara Ostrow'])
  jumps = await buildSquad(harness.db, day.clubId, { name: 'Jumps' })
  tomi = await buildAthlete(harness.db, day.clubId, { name: 'Tomi Lind', squadIds: [jumps] })
  await buildAthlete(harness.db, day.clubId, { name: 'Zoe Both', squadIds: [jumps, day.squadId] })
})
afterAll(() => harness.stop())

const sheetOf = (sessionId: string) => day.coach.call(getSession, { params: { sessionId } })
const namesOn = async (sessionId: string) => (await sheetOf(sessionId)).athletes.map(({ name }) => name)
const send = (sessionId: string, version: number, squadIds: string[]) =>
  day.coach.send(changeSession, { params: { sessionId }, body: { version, squadIds } })

/** A session of the first squad and then of these. */
async function sessionOf(squadIds: string[]) {
  const { id } = await newSession(day.coach, day.squadId)
  await send(id, 1, squadIds).expect(200)
  return id
}

async function trialOn(sessionId: string, athleteId: string | null) {
  const { id: uploadedBy } = await buildMember(harness.db, day.clubId, ['coach'])
  const uploadId = await buildUpload(harness.db, day.clubId, { sessionId, uploadedBy })
  return buildTrial(harness.db, day.clubId, { sessionId, uploadId, athleteId })
}

describe('the squads of a session', () => {
  it('that come bring the athletes they have today', async () => {
    const id = await sessionOf([day.squadId, jumps])
    expect(await namesOn(id)).toEqual(['Ada Berg', 'Mara Ostrow', 'Tomi Lind', 'Zoe Both'])
    const { session } = await sheetOf(id)
    expect([...session.squadIds].sort()).toEqual([day.squadId, jumps].sort())
    expect(session).toMatchObject({ athletes: 4, version: 2 })
  })

  it('that go take along those who are in no other of them', async () => {
    expect(await namesOn(await sessionOf([jumps]))).toEqual(['Tomi Lind', 'Zoe Both'])
  })

  it('leave athletes with trials on the sheet, and trials on their athletes', async () => {
    const id = await sessionOf([day.squadId, jumps])
    const trialId = await trialOn(id, day.athletes['Ada Berg'])
    await send(id, 2, [jumps]).expect(200)
    expect(await namesOn(id)).toEqual(['Ada Berg', 'Tomi Lind', 'Zoe Both'])
    const sheet = await sheetOf(id)
    expect(sheet.trials).toMatchObject([{ id: trialId, athleteId: day.athletes['Ada Berg'] }])
  })

  it('that stay neither add nor drop anybody', async () => {
    const squad = await buildSquad(harness.db, day.clubId, { name: 'Shifting' })
    await buildAthlete(harness.db, day.clubId, { name: 'Early Bird', squadIds: [squad] })
    const { id } = await newSession(day.coach, squad)
    const late = await buildAthlete(harness.db, day.clubId, { name: 'Late Comer' })
    const body = { version: 1, athleteIds: [late] }
    await day.coach.call(changeSquad, { params: { squadId: squad }, body })
    await send(id, 1, [squad, jumps]).expect(200)
    expect(await namesOn(id)).toEqual(['Early Bird', 'Tomi Lind', 'Zoe Both'])
  })

  it('may keep one that was archived since, and cannot gain one', async () => {
    const squad = await buildSquad(harness.db, day.clubId, { name: 'Last season' })
    const { id } = await newSession(day.coach, squad)
    const params = { squadId: squad }
    await day.coach.call(changeSquad, { params, body: { version: 1, archived: true } })
    await send(id, 1, [squad, jumps]).expect(200)
    const other = await newSession(day.coach, day.squadId)
    const refused = await send(other.id, 1, [day.squadId, squad])
    expect(refusalOf(refused)).toEqual([400, 'invalid-request'])
    expect(JSON.stringify(refused.body)).toContain('squadIds')
    expect((await sheetOf(other.id)).session.version).toBe(1)
  })

  it('are of the club, and at least one', async () => {
    const { id } = await newSession(day.coach, day.squadId)
    const elsewhere = (await startTestingDay(harness, [])).squadId
    expect(refusalOf(await send(id, 1, [elsewhere]))).toEqual([400, 'invalid-request'])
    expect(refusalOf(await send(id, 1, []))).toEqual([400, 'invalid-request'])
  })

  it('are changed at the present version only', async () => {
    const id = await sessionOf([jumps])
    expect(refusalOf(await send(id, 1, [day.squadId]))).toEqual([409, 'stale-version'])
    expect(await namesOn(id)).toEqual(['Tomi Lind', 'Zoe Both'])
  })

  it('wait for a recording that is just finding its athlete, who then stays', async () => {
    const id = await sessionOf([day.squadId, jumps])
    const trialId = await trialOn(id, null)
    const change = await harness.db.inClub(workerContext(day.clubId), async (tx) => {
      const { candidates } = await candidatesOf(tx, day.clubId, id)
      expect(candidates.map(({ id: candidate }) => candidate)).toContain(tomi)
      const sent = send(id, 2, [day.squadId]).then(({ status }) => status)
      await until(waitingForLocks, (n) => n > 0, { what: 'the change waiting' })
      await tx.update(trials).set({ athleteId: tomi, assignedBy: 'hand' }).where(eq(trials.id, trialId))
      return { sent }
    })
    expect(await change.sent).toBe(200)
    expect(await namesOn(id)).toEqual(['Ada Berg', 'Mara Ostrow', 'Tomi Lind', 'Zoe Both'])
  })
})

const waitingForLocks = () =>
  onDatabase(harness.database.adminUrl, async (admin) => {
    const { rows } = await admin.query(
      `select count(*)::int as n from pg_locks join pg_database d on d.oid = database
       where locktype = 'advisory' and not granted and datname = current_database()`,
    )
    return (rows[0] as { n: number }).n
  })
