import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import {
  changeSession,
  createSession,
  getSession,
  listSessions,
  type SessionSummary,
} from '../../shared/contracts/sessions.ts'
import { usualTest } from '../../shared/contracts/session-test.ts'
import { changeSquad, listSquads } from '../../shared/contracts/squads.ts'
import { workerContext } from '../../server/db/database.ts'
import { sessions } from '../../server/db/schema/sessions.ts'
import { buildAthlete, buildSquad } from '../../seed/builders/athlete.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember } from '../../seed/builders/person.ts'
import type { ApiClient } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'

let harness: Harness
let clubId: string
let coach: ApiClient
let sprint: string
let jumps: string

beforeAll(async () => {
  harness = await startHarness()
  clubId = await buildClub(harness.db)
  coach = await harness.signedIn(await buildMember(harness.db, clubId, ['coach']))
  sprint = await buildSquad(harness.db, clubId, { name: 'Sprint' })
  jumps = await buildSquad(harness.db, clubId, { name: 'Jumps' })
  await buildAthlete(harness.db, clubId, { name: 'Mara Ostrow', squadIds: [sprint, jumps] })
  await buildAthlete(harness.db, clubId, { name: 'Ada Berg', squadIds: [sprint] })
})
afterAll(() => harness.stop())

const form = (changes: Partial<Record<keyof SessionSummary | 'note' | 'squadIds', unknown>> = {}) => ({
  date: '2027-02-01',
  title: 'Monthly jumps',
  place: null,
  note: null,
  test: usualTest('cmj'),
  squadIds: [sprint],
  ...changes,
})
const make = (changes = {}) => coach.call(createSession, { body: form(changes) })
const titles = async (query: Record<string, string | number>) =>
  (await coach.call(listSessions, { query })).sessions.map(({ title }) => title)

describe('a session', () => {
  it('holds every athlete of its squads once, by name, from the start', async () => {
    const session = await make({ squadIds: [sprint, jumps, sprint] })
    expect(session).toMatchObject({
      athletes: 2,
      trials: 0,
      inTray: 0,
      squadNames: ['Jumps', 'Sprint'],
      version: 1,
    })
    const sheet = await coach.call(getSession, { params: { sessionId: session.id } })
    expect(sheet.athletes.map(({ name }) => name)).toEqual(['Ada Berg', 'Mara Ostrow'])
    expect(sheet).toMatchObject({ trials: [], uploads: [], changedSincePublished: false })
  })

  it('keeps its athletes when a squad changes later', async () => {
    const session = await make()
    const { squads } = await coach.call(listSquads)
    const { version } = squads.find(({ id }) => id === sprint) ?? { version: 0 }
    const late = await buildAthlete(harness.db, clubId, { name: 'Late Comer' })
    await coach.call(changeSquad, { params: { squadId: sprint }, body: { version, athleteIds: [late] } })
    const sheet = await coach.call(getSession, { params: { sessionId: session.id } })
    expect(sheet.athletes.map(({ name }) => name)).toEqual(['Ada Berg', 'Mara Ostrow'])
  })

  it('is made for squads of the club only', async () => {
    const elsewhere = await buildSquad(harness.db, await buildClub(harness.db))
    const refused = await coach.send(createSession, { body: form({ squadIds: [sprint, elsewhere] }) })
    expect(refused.status).toBe(400)
    expect(JSON.stringify(refused.body)).toContain('squadIds')
  })

  it('is changed at its present version only, and a stale one is answered with the newer', async () => {
    const session = await make({ title: 'First title' })
    const params = { sessionId: session.id }
    const changed = await coach.call(changeSession, {
      params,
      body: { version: 1, title: 'Second', note: 'Wind' },
    })
    expect(changed).toMatchObject({ title: 'Second', version: 2, date: '2027-02-01' })
    const stale = await coach.send(changeSession, { params, body: { version: 1, title: 'Third' } })
    expect(stale.status).toBe(409)
    expect(stale.body).toMatchObject({
      error: { code: 'stale-version', details: { newer: { title: 'Second', version: 2 } } },
    })
    expect((await coach.call(getSession, { params })).session).toMatchObject({
      title: 'Second',
      note: 'Wind',
    })
  })
})

describe('the list of sessions', () => {
  beforeAll(async () => {
    await make({ title: 'Alpha camp', date: '2026-05-04', place: 'North hall', squadIds: [jumps] })
    await make({ title: 'Beta camp', date: '2026-05-05' })
    await make({ title: '100 % effort', date: '2026-05-06' })
  })

  it('searches titles, places, dates and squads, each word somewhere', async () => {
    expect(await titles({ search: 'camp' })).toEqual(['Beta camp', 'Alpha camp'])
    expect(await titles({ search: 'north CAMP' })).toEqual(['Alpha camp'])
    expect(await titles({ search: '2026-05 sprint' })).toEqual(['100 % effort', 'Beta camp'])
    expect(await titles({ search: 'camp nowhere' })).toEqual([])
  })

  it('takes signs of a search literally', async () => {
    expect(await titles({ search: '%' })).toEqual(['100 % effort'])
    expect(await titles({ search: '_' })).toEqual([])
  })

  it('shows one squad’s', async () => {
    expect(await titles({ search: 'camp', squadId: jumps })).toEqual(['Alpha camp'])
  })

  it('comes in pages of twenty, newest first', async () => {
    for (let n = 1; n <= 25; n++)
      await make({ title: `Page ${n}`, date: `2025-01-${String(n).padStart(2, '0')}` })
    const first = await coach.call(listSessions, { query: { search: 'Page' } })
    expect(first).toMatchObject({ page: 1, pages: 2, total: 25 })
    expect(first.sessions.map(({ title }) => title).slice(0, 2)).toEqual(['Page 25', 'Page 24'])
    const second = await coach.call(listSessions, { query: { search: 'Page', page: 2 } })
    expect(second.sessions.map(({ title }) => title)).toEqual([
      'Page 5',
      'Page 4',
      'Page 3',
      'Page 2',
      'Page 1',
    ])
  })
})

describe('what is read at one moment', () => {
  it('does not change between two statements, whatever others write', async () => {
    const ctx = workerContext(clubId)
    const seen = await harness.db.atOneMoment(ctx, async (tx) => {
      const countNow = async () => (await tx.select({ id: sessions.id }).from(sessions)).length
      const before = await countNow()
      await make({ title: 'Meanwhile' })
      return [before, await countNow()]
    })
    expect(seen[1]).toBe(seen[0])
    expect(await titles({ search: 'Meanwhile' })).toHaveLength(1)
  })
})
