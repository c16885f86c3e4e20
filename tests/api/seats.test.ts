import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { changeAthlete, createAthlete } from '../../shared/contracts/athletes.ts'
import { invitePerson } from '../../shared/contracts/people.ts'
import { changeSeatRule, getSeatPlan, giveSeat, releaseSeat } from '../../shared/contracts/seats.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { buildSession } from '../../seed/builders/session.ts'
import { buildTrial, buildUpload } from '../../seed/builders/trial.ts'
import { buy } from '../../server/fakes/payments/visitor.ts'
import { changeSeats, getBilling, previewSeats, startCheckout } from '../../shared/contracts/billing.ts'
import { createSquad } from '../../shared/contracts/squads.ts'
import { changeTrial } from '../../shared/contracts/trials.ts'
import { workerContext } from '../../server/db/database.ts'
import { settings } from '../../server/db/schema/people-of-club.ts'
import type { ApiClient } from './harness/api-client.ts'
import { dropFile, jumpFile, newSession, settledSheet } from './harness/testing-day.ts'
import { startWorker } from './harness/worker.ts'
import { startPayingHarness, type PayingHarness } from './harness/payments.ts'

let harness: PayingHarness
let clubId: string
let personId: string
let admin: ApiClient
beforeAll(async () => {
  harness = await startPayingHarness()
})
afterAll(() => harness.stop())
beforeEach(() => newClub(2))

async function newClub(seats: number) {
  clubId = await buildClub(harness.db, { seats })
  const person = await buildMember(harness.db, clubId, ['admin', 'coach'])
  personId = person.id
  admin = await harness.signedIn(person)
}

const form = (name: string) => ({ name, bornOn: null, recordedMassKg: null, squadIds: [] })
const enter = (name: string) => admin.call(createAthlete, { body: form(name) })
const tick = (days: number) => {
  harness.time.now = new Date(harness.time.now.getTime() + days * 24 * 3600 * 1000)
}
/** Name → state, in the order of the names. */
async function states(): Promise<Record<string, string>> {
  const { athletes } = await admin.call(getSeatPlan)
  return Object.fromEntries(athletes.map(({ name, state }) => [name, state]).sort())
}
/** A trial of the athlete, made now. */
async function measure(athleteId: string) {
  const sessionId = await buildSession(harness.db, clubId, { createdBy: personId })
  const uploadId = await buildUpload(harness.db, clubId, { sessionId, uploadedBy: personId })
  await buildTrial(harness.db, clubId, { sessionId, uploadId, athleteId })
}

describe('a seat', () => {
  it('is given to a new athlete while one is free; after that they wait, the longest first', async () => {
    const first = await enter('A')
    await enter('B')
    tick(0.01)
    await enter('C')
    tick(0.01)
    await enter('D')
    expect(await states()).toEqual({ A: 'seated', B: 'seated', C: 'waiting', D: 'waiting' })
    await admin.call(releaseSeat, { body: { athleteId: first.id } })
    expect(await states()).toEqual({ A: 'none', B: 'seated', C: 'seated', D: 'waiting' })
  })

  it('is not given by itself where the club wishes to give it by hand, neither on entering nor on inviting', async () => {
    const { version } = await admin.call(getSeatPlan)
    await admin.call(changeSeatRule, { body: { byItself: false, version } })
    expect(await admin.refusal(changeSeatRule, { body: { byItself: true, version } })).toEqual([
      409,
      'stale-version',
    ])
    const { id: athleteId } = await enter('A')
    const guest = { name: 'A', roles: ['athlete'], athleteId }
    await admin.call(invitePerson, { body: { ...guest, email: 'by-hand@example.org' } })
    expect(await states()).toEqual({ A: 'none' })
    await admin.call(giveSeat, { body: { athleteId } })
    expect(await states()).toEqual({ A: 'seated' })
  })

  it('is given on inviting an athlete who has none', async () => {
    const { version } = await admin.call(getSeatPlan)
    const rule = await admin.call(changeSeatRule, { body: { byItself: false, version } })
    const { id: athleteId } = await enter('A')
    await admin.call(changeSeatRule, { body: { byItself: true, version: rule.version } })
    const guest = { name: 'A', roles: ['athlete'], athleteId }
    await admin.call(invitePerson, { body: { ...guest, email: 'by-itself@example.org' } })
    expect(await states()).toEqual({ A: 'seated' })
  })

  it('of somebody who was measured cools for fourteen days from its giving, and is its athlete’s again at once', async () => {
    const { id: athleteId } = await enter('A')
    await enter('B')
    await enter('C')
    await measure(athleteId)
    await admin.call(releaseSeat, { body: { athleteId } })
    expect(await states()).toEqual({ A: 'cooling', B: 'seated', C: 'waiting' })
    await admin.call(giveSeat, { body: { athleteId } })
    expect(await states()).toMatchObject({ A: 'seated', C: 'waiting' })
    await admin.call(releaseSeat, { body: { athleteId } })
    await harness.advance(13)
    expect(await states()).toMatchObject({ A: 'cooling', C: 'waiting' })
    tick(1)
    await admin.call(giveSeat, { body: { athleteId: (await enter('D')).id } })
    expect(await states()).toEqual({ A: 'none', B: 'seated', C: 'seated', D: 'waiting' })
  })

  it('goes with an athlete who is archived, and comes back with them', async () => {
    const { id: athleteId, version } = await enter('A')
    await enter('B')
    await enter('C')
    const archive = (archived: boolean, v: number) =>
      admin.call(changeAthlete, { params: { athleteId }, body: { version: v, archived } })
    await archive(true, version)
    expect(await states()).toEqual({ B: 'seated', C: 'seated' })
    await archive(false, version + 1)
    expect(await states()).toEqual({ A: 'waiting', B: 'seated', C: 'seated' })
  })

  it('is never given to two at once', async () => {
    const { version } = await admin.call(getSeatPlan)
    await admin.call(changeSeatRule, { body: { byItself: false, version } })
    const ids = await Promise.all(['A', 'B', 'C', 'D', 'E'].map(async (name) => (await enter(name)).id))
    await Promise.all(ids.map((athleteId) => admin.call(giveSeat, { body: { athleteId } })))
    const held = Object.values(await states())
    expect(held.filter((state) => state === 'seated')).toHaveLength(2)
    expect(held.filter((state) => state === 'waiting')).toHaveLength(3)
  })
})

describe('a club that bought 20 seats', () => {
  it('has its 21st athlete wait until there are 21, and keeps everybody where it goes back to fewer', async () => {
    await newClub(0)
    const { url } = await admin.call(startCheckout, { body: { interval: 'month', seats: 20 } })
    await buy(url, { number: '4000002500003155', second: 'yes' })
    await harness.workOff()
    for (let n = 1; n <= 21; n++) await enter(`Athlete ${String(n).padStart(2, '0')}`)
    expect((await states())['Athlete 21']).toBe('waiting')
    const { version } = await admin.call(getBilling)
    const { at } = await admin.call(previewSeats, { query: { seats: 21 } })
    const grown = await admin.call(changeSeats, { body: { version, seats: 21, at } })
    expect((await states())['Athlete 21']).toBe('seated')
    await admin.call(changeSeats, { body: { version: grown.version, seats: 19, at: null } })
    // The clocks of a month, both.
    await harness.advance(31)
    const held = Object.values(await states())
    expect(held.filter((state) => state === 'seated')).toHaveLength(19)
    expect(held.filter((state) => state === 'over')).toHaveLength(2)
  })
})

describe('a recording of an athlete without a seat', () => {
  it('is analysed and waits in the Tray, is put on nobody, and goes to its athlete once they have a seat', async () => {
    const worker = await startWorker(harness)
    try {
      await newClub(1)
      const seated = await enter('Mara Ostrow')
      const waiting = await enter('Tomi Lind')
      const body = { name: 'Squad', athleteIds: [seated.id, waiting.id] }
      const { id: squadId } = await admin.call(createSquad, { body })
      const session = await newSession(admin, squadId)
      await dropFile(admin, session.id, 'ostrow_mara.csv', jumpFile(401))
      await dropFile(admin, session.id, 'lind_tomi.csv', jumpFile(402))
      const { trials } = await settledSheet(admin, session.id)
      const of = (fileName: string) => trials.find((trial) => trial.fileName === fileName)
      expect(of('ostrow_mara.csv')?.athleteId).toBe(seated.id)
      const kept = of('lind_tomi.csv')
      expect(kept).toMatchObject({ athleteId: null, analysis: { worstSentence: null } })
      const put = {
        params: { trialId: kept?.id ?? '' },
        body: { version: kept?.version, athleteId: waiting.id },
      }
      expect(await admin.refusal(changeTrial, put)).toEqual([409, 'athlete-unseated'])
      await harness.db.inClub(workerContext(clubId), (tx) => tx.update(settings).set({ seats: 2 }))
      await admin.call(giveSeat, { body: { athleteId: waiting.id } })
      expect((await admin.call(changeTrial, put)).athlete?.id).toBe(waiting.id)
    } finally {
      await worker.stop()
    }
  })
})
