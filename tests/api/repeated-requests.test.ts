import { createHash, randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createAthlete, listAthletes } from '../../shared/contracts/athletes.ts'
import { createSquad, listSquads } from '../../shared/contracts/squads.ts'
import { claimKey } from '../../server/http/idempotency.queries.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember, type BuiltPerson } from '../../seed/builders/person.ts'
import { refusalOf, type ApiClient } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'

let harness: Harness
let clubId: string
let person: BuiltPerson
let coach: ApiClient

beforeAll(async () => {
  harness = await startHarness()
  clubId = await buildClub(harness.db)
  person = await buildMember(harness.db, clubId, ['coach'])
  coach = await harness.signedIn(person)
})
afterAll(() => harness.stop())

const athlete = (name: string) => ({ name, bornOn: null, recordedMassKg: null, squadIds: [] })
const countOf = async (name: string) =>
  (await coach.call(listAthletes)).athletes.filter((one) => one.name === name).length

describe('a change sent again', () => {
  it('with the same key is done once and gets the same answer', async () => {
    const options = { key: randomUUID(), body: athlete('Once Only') }
    const first = await coach.call(createAthlete, options)
    expect(await coach.call(createAthlete, options)).toEqual(first)
    expect(await countOf('Once Only')).toBe(1)
  })

  it('with the same key and another body is refused', async () => {
    const key = randomUUID()
    await coach.call(createAthlete, { key, body: athlete('First Body') })
    expect(await coach.refusal(createAthlete, { key, body: athlete('Second Body') })).toEqual([
      422,
      'idempotency-key-reused',
    ])
    expect(await countOf('Second Body')).toBe(0)
  })

  it('with the same key to another endpoint is refused', async () => {
    const key = randomUUID()
    await coach.call(createAthlete, { key, body: athlete('One Endpoint') })
    expect(await coach.refusal(createSquad, { key, body: { name: 'Another', athleteIds: [] } })).toEqual([
      422,
      'idempotency-key-reused',
    ])
  })

  it('at the same moment is done once', async () => {
    const options = { key: randomUUID(), body: athlete('Ten At Once') }
    const answers = await Promise.all(Array.from({ length: 10 }, () => coach.send(createAthlete, options)))
    const outcomes = answers.map((answer) => (answer.status === 200 ? 'done' : refusalOf(answer)[1]))
    expect(outcomes).toContain('done')
    expect(outcomes.filter((outcome) => outcome !== 'done' && outcome !== 'still-running')).toEqual([])
    expect(await countOf('Ten At Once')).toBe(1)
  })

  it('after it was refused is tried anew with the same key', async () => {
    const key = randomUUID()
    const taken = await coach.call(createSquad, { body: { name: 'Taken', athleteIds: [] } })
    const options = { key, body: { name: 'taken', athleteIds: [] } }
    expect(await coach.refusal(createSquad, options)).toEqual([409, 'name-taken'])
    expect(await coach.refusal(createSquad, options)).toEqual([409, 'name-taken'])
    const { squads } = await coach.call(listSquads)
    expect(squads.filter(({ name }) => name.toLowerCase() === 'taken').map(({ id }) => id)).toEqual([
      taken.id,
    ])
  })

  it('after the server was cut off is not done a second time', async () => {
    const key = randomUUID()
    const caller = { clubId, personId: person.id, athleteId: null, roles: [], capabilities: [] }
    const body = athlete('Cut Off')
    const requestHash = createHash('sha256')
      .update(JSON.stringify([{}, body]))
      .digest()
    await harness.db.inClub(caller, (tx) =>
      claimKey(tx, caller, { key, route: 'POST /api/athletes', requestHash }),
    )
    expect(await coach.refusal(createAthlete, { key, body })).toEqual([409, 'still-running'])
    expect(await countOf('Cut Off')).toBe(0)
  })

  it('needs a key of its own', async () => {
    for (const key of [null, 'short', 'has blanks and is long enough']) {
      expect(await coach.refusal(createAthlete, { key, body: athlete('No Key') })).toEqual([
        400,
        'idempotency-key-missing',
      ])
    }
    expect(await countOf('No Key')).toBe(0)
  })

  it('by somebody else with the same key is another change', async () => {
    const key = randomUUID()
    const colleague = await harness.signedIn(await buildMember(harness.db, clubId, ['coach']))
    await coach.call(createAthlete, { key, body: athlete('Shared Key') })
    await colleague.call(createAthlete, { key, body: athlete('Shared Key') })
    expect(await countOf('Shared Key')).toBe(2)
  })
})
