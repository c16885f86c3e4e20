import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { changeAthlete, createAthlete, listAthletes } from '../../shared/contracts/athletes.ts'
import { changeSquad, createSquad, listSquads } from '../../shared/contracts/squads.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember } from '../../seed/builders/person.ts'
import type { ApiClient } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'

let harness: Harness
let coach: ApiClient

beforeAll(async () => {
  harness = await startHarness()
  const clubId = await buildClub(harness.db)
  coach = await harness.signedIn(await buildMember(harness.db, clubId, ['coach']))
})
afterAll(() => harness.stop())

const athleteForm = (name: string, squadIds: string[] = []) => ({
  name,
  bornOn: '2004-05-06',
  recordedMassKg: 71.5,
  squadIds,
})

describe('squads and athletes', () => {
  it('are made by hand and listed by name', async () => {
    const squad = await coach.call(createSquad, { body: { name: 'Juniors', athleteIds: [] } })
    const zoe = await coach.call(createAthlete, { body: athleteForm('Zoë Arne', [squad.id]) })
    const ada = await coach.call(createAthlete, { body: athleteForm('  Ada Berg ', [squad.id]) })
    expect(ada).toMatchObject({ name: 'Ada Berg', linked: false, archived: false, version: 1 })
    const { squads } = await coach.call(listSquads)
    expect(squads.find(({ id }) => id === squad.id)?.athleteIds).toEqual([ada.id, zoe.id])
    const { athletes } = await coach.call(listAthletes)
    expect(athletes.map(({ name }) => name)).toEqual(['Ada Berg', 'Zoë Arne'])
  })

  it('may not share a name with another squad in use, whatever its case', async () => {
    const first = await coach.call(createSquad, { body: { name: 'Seniors', athleteIds: [] } })
    expect(await coach.refusal(createSquad, { body: { name: 'SENIORS', athleteIds: [] } })).toEqual([
      409,
      'name-taken',
    ])
    await coach.call(changeSquad, {
      params: { squadId: first.id },
      body: { version: first.version, archived: true },
    })
    await coach.call(createSquad, { body: { name: 'SENIORS', athleteIds: [] } })
  })

  it('keeps the whole list of a squad as it was sent', async () => {
    const a = await coach.call(createAthlete, { body: athleteForm('List One') })
    const b = await coach.call(createAthlete, { body: athleteForm('List Two') })
    const squad = await coach.call(createSquad, { body: { name: 'Lists', athleteIds: [a.id] } })
    const params = { squadId: squad.id }
    const changed = await coach.call(changeSquad, {
      params,
      body: { version: squad.version, athleteIds: [b.id, b.id] },
    })
    expect(changed.athleteIds).toEqual([b.id])
  })

  it('refuses a change of a row that somebody changed in between, and shows the newer row', async () => {
    const athlete = await coach.call(createAthlete, { body: athleteForm('Stale Example') })
    const params = { athleteId: athlete.id }
    await coach.call(changeAthlete, { params, body: { version: athlete.version, recordedMassKg: 80 } })
    const response = await coach.send(changeAthlete, {
      params,
      body: { version: athlete.version, recordedMassKg: 60 },
    })
    expect(response.status).toBe(409)
    expect(response.body).toMatchObject({
      error: {
        code: 'stale-version',
        details: { newer: { id: athlete.id, recordedMassKg: 80, version: 2 } },
      },
    })
  })

  it('counts up an athlete’s version when a squad takes them in', async () => {
    const athlete = await coach.call(createAthlete, { body: athleteForm('Taken In') })
    await coach.call(createSquad, { body: { name: 'Takers', athleteIds: [athlete.id] } })
    const stale = { params: { athleteId: athlete.id }, body: { version: athlete.version, squadIds: [] } }
    expect(await coach.refusal(changeAthlete, stale)).toEqual([409, 'stale-version'])
  })

  it('let a squad and an athlete of it be changed at the same moment: one is done, the other told', async () => {
    const squad = await coach.call(createSquad, { body: { name: 'Crossing', athleteIds: [] } })
    const athlete = await coach.call(createAthlete, { body: athleteForm('Crossing Example') })
    for (let round = 0; round < 8; round++) {
      const squadNow = (await coach.call(listSquads)).squads.find(({ id }) => id === squad.id)
      const athleteNow = (await coach.call(listAthletes)).athletes.find(({ id }) => id === athlete.id)
      const isIn = squadNow?.athleteIds.length === 1
      const both = await Promise.all([
        coach.send(changeSquad, {
          params: { squadId: squad.id },
          body: { version: squadNow?.version, athleteIds: isIn ? [] : [athlete.id] },
        }),
        coach.send(changeAthlete, {
          params: { athleteId: athlete.id },
          body: { version: athleteNow?.version, squadIds: isIn ? [] : [squad.id] },
        }),
      ])
      expect(both.map(({ status }) => status).sort()).toEqual([200, 409])
    }
  })

  it('answers 404 for an athlete that the club does not have', async () => {
    const nobody = '00000000-0000-4000-8000-000000000000'
    expect(await coach.refusal(createSquad, { body: { name: 'Ghosts', athleteIds: [nobody] } })).toEqual([
      404,
      'not-found',
    ])
    expect(
      await coach.refusal(changeAthlete, { params: { athleteId: nobody }, body: { version: 1 } }),
    ).toEqual([404, 'not-found'])
    const { squads } = await coach.call(listSquads)
    expect(squads.map(({ name }) => name)).not.toContain('Ghosts')
  })
})
