import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import {
  changeMeasuringSettings,
  changePlateCalibration,
  getMeasuringSettings,
  getPlateCalibration,
} from '../../shared/contracts/measuring.ts'
import { gravityAt, standardGravity } from '../../shared/units/gravity.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import type { ApiClient } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'

let harness: Harness
let clubId: string
let coach: ApiClient
beforeAll(async () => {
  harness = await startHarness()
  clubId = await buildClub(harness.db)
  coach = await harness.signedIn(await buildMember(harness.db, clubId, ['coach'], { name: 'Wanda Crest' }))
})
afterAll(() => harness.stop())

const editions = (table: string) =>
  onDatabase(harness.database.adminUrl, async (admin) => {
    const { rows } = await admin.query(`select * from club.${table} where club_id = $1 order by edition`, [
      clubId,
    ])
    return rows as Record<string, unknown>[]
  })

describe('the measuring settings', () => {
  it('are the engine’s own until the club changes some; each change is an edition with who made it', async () => {
    expect(await coach.call(getMeasuringSettings)).toEqual({ changed: {}, version: 1, change: null })
    const saved = await coach.call(changeMeasuringSettings, {
      body: { changed: { eventForceN: 20, onsetRule: 'standard-deviations' }, version: 1 },
    })
    expect(saved).toMatchObject({
      changed: { eventForceN: 20, onsetRule: 'standard-deviations' },
      version: 2,
      change: { byName: 'Wanda Crest' },
    })
    const body = { changed: { eventForceN: 10, massCaution: 0.05 }, version: 2 }
    const next = await coach.call(changeMeasuringSettings, { body })
    // The engine's own value is no change.
    expect(next).toMatchObject({ changed: { massCaution: 0.05 }, version: 3 })
    expect((await editions('measuring_settings')).map(({ changed }) => changed)).toEqual([
      { eventForceN: 20, onsetRule: 'standard-deviations' },
      { massCaution: 0.05 },
    ])
  })

  it('stay within their bounds, in order, and are told at their field', async () => {
    const refusedAt = async (changed: object) => {
      const response = await coach.send(changeMeasuringSettings, { body: { changed, version: 3 } })
      expect(response.status).toBe(400)
      return (response.body as { error: { details: Record<string, string> } }).error.details
    }
    expect(await refusedAt({ eventForceN: 500 })).toEqual({ 'changed.eventForceN': 'Give 5 to 50 N' })
    expect(await refusedAt({ massCaution: 0.15 })).toHaveProperty(['changed.massCaution'])
    expect(await refusedAt({ coverage: 0.5 })).not.toEqual({})
  })

  it('are not overwritten by somebody who has not seen the newest', async () => {
    const body = { changed: {}, version: 1 }
    expect(await coach.refusal(changeMeasuringSettings, { body })).toEqual([409, 'stale-version'])
    const both = await Promise.all(
      [{ eventForceN: 15 }, { eventForceN: 25 }].map((changed) =>
        coach.send(changeMeasuringSettings, { body: { changed, version: 3 } }),
      ),
    )
    expect(both.map(({ status }) => status).sort()).toEqual([200, 409])
  })

  it('of another club are its own', async () => {
    const otherClub = await buildClub(harness.db)
    const other = await harness.signedIn(await buildMember(harness.db, otherClub, ['admin']))
    expect(await other.call(getMeasuringSettings)).toEqual({ changed: {}, version: 1, change: null })
    expect((await other.call(getPlateCalibration)).version).toBe(1)
  })
})

describe('the plate calibration', () => {
  const half = { left: 0.005, right: 0.005, single: 0.005, total: 0.005 }

  it('is half a percent and standard gravity where nothing is known', async () => {
    expect(await coach.call(getPlateCalibration)).toEqual({
      calibrationU: half,
      place: null,
      gravity: standardGravity,
      version: 1,
      change: null,
    })
  })

  it('gives gravity by the place where the plates stand', async () => {
    const place = { latitudeDeg: -0.18, altitudeM: 2850 }
    const calibrationU = { ...half, left: 0.002 }
    const saved = await coach.call(changePlateCalibration, { body: { calibrationU, place, version: 1 } })
    expect(saved).toMatchObject({ calibrationU, place, gravity: gravityAt(-0.18, 2850), version: 2 })
    expect(await coach.call(getPlateCalibration)).toEqual(saved)
  })

  it('is refused where it is of no plate or of no place', async () => {
    const place = { latitudeDeg: 91, altitudeM: 0 }
    for (const body of [
      { calibrationU: { ...half, left: 0.2 }, place: null, version: 2 },
      { calibrationU: half, place, version: 2 },
    ])
      expect(await coach.refusal(changePlateCalibration, { body })).toEqual([400, 'invalid-request'])
  })
})
