import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { changeAthlete, createAthlete } from '../../shared/contracts/athletes.ts'
import { changeClubSettings, getClubSettings, getSeats } from '../../shared/contracts/clubs.ts'
import { buildAthlete } from '../../seed/builders/athlete.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { auditLog } from '../../server/db/schema/records.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { getTableName } from 'drizzle-orm'
import { startHarness, type Harness } from './harness/harness.ts'

let harness: Harness
let clubId: string
beforeAll(async () => {
  harness = await startHarness()
  clubId = await buildClub(harness.db, { seats: 40 })
})
afterAll(() => harness.stop())

describe('club settings', () => {
  it('hold no landing limit until the club sets one, between 1 and 20 body weights', async () => {
    const physio = await harness.signedIn(await buildMember(harness.db, clubId, ['physio']))
    expect(await physio.call(getClubSettings)).toEqual({ landingPeakLimits: {}, version: 1 })
    for (const cmj of [0.5, 25]) {
      const body = { landingPeakLimits: { cmj }, version: 1 }
      expect(await physio.refusal(changeClubSettings, { body })).toEqual([400, 'invalid-request'])
    }
    const body = { landingPeakLimits: { cmj: 5.5 }, version: 1 }
    expect(await physio.call(changeClubSettings, { body })).toEqual({ ...body, version: 2 })
    expect(await physio.refusal(changeClubSettings, { body })).toEqual([409, 'stale-version'])
  })
})

describe('seats', () => {
  it('count active athletes, and staff once whatever they do', async () => {
    const admin = await harness.signedIn(await buildMember(harness.db, clubId, ['admin', 'coach']))
    const before = await admin.call(getSeats)
    await buildMember(harness.db, clubId, ['athlete'])
    await buildMember(harness.db, clubId, ['coach'], { active: false })
    await buildAthlete(harness.db, clubId)
    const form = { name: 'To Be Archived', bornOn: null, recordedMassKg: null, squadIds: [] }
    const { id, version } = await admin.call(createAthlete, { body: form })
    expect(await admin.call(getSeats)).toEqual({ ...before, paid: 40, used: before.used + 2 })
    await admin.call(changeAthlete, { params: { athleteId: id }, body: { version, archived: true } })
    expect(await admin.call(getSeats)).toEqual({ ...before, used: before.used + 1 })
  })
})

describe('the audit log', () => {
  it('notes every change with who did it and to what, and no name', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'])
    const coach = await harness.signedIn(person)
    const form = { name: 'Unmistakable Name', bornOn: null, recordedMassKg: null, squadIds: [] }
    const athlete = await coach.call(createAthlete, { body: form })
    const rows = await onDatabase(harness.database.adminUrl, async (admin) => {
      const found = await admin.query(`select * from club.${getTableName(auditLog)} where person_id = $1`, [
        person.id,
      ])
      return found.rows as unknown[]
    })
    expect(rows).toMatchObject([
      { club_id: clubId, action: 'athlete.create', subject_kind: 'athlete', subject_id: athlete.id },
    ])
    expect(JSON.stringify(rows)).not.toContain('Unmistakable')
  })
})
