import { once } from 'node:events'
import { get, type IncomingMessage } from 'node:http'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import type { ClubEvent } from '../../shared/contracts/events.ts'
import { changeSession, getSession } from '../../shared/contracts/sessions.ts'
import { workerContext } from '../../server/db/database.ts'
import { notify } from '../../server/modules/events/notify.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { builtPassword, buildMember } from '../../seed/builders/person.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import { startTestingDay, type TestingDay } from './harness/testing-day.ts'
import { until } from './harness/until.ts'

let harness: Harness
let day: TestingDay
const open: IncomingMessage[] = []

beforeAll(async () => {
  harness = await startHarness()
  day = await startTestingDay(harness, ['Mara Ostrow'])
})
afterEach(() => open.splice(0).forEach((stream) => stream.destroy()))
afterAll(() => harness.stop())

interface Stream {
  headers: IncomingMessage['headers']
  events: ClubEvent[]
  ended: boolean
}

async function cookieOf(email: string): Promise<string> {
  const answer = await harness.client().agent.post('/api/sign-in').send({ email, password: builtPassword })
  return (answer.headers['set-cookie'] as unknown as string[]).map((line) => line.split(';')[0]).join('; ')
}

/** Opens the stream as a browser that this person signed in with; the server hears when the answer begins. */
async function listen({ email }: { email: string }): Promise<Stream> {
  const cookie = await cookieOf(email)
  const request = get(`${harness.url}/api/events`, { headers: { cookie, 'accept-encoding': 'gzip' } })
  const [response] = (await once(request, 'response')) as [IncomingMessage]
  open.push(response)
  const stream: Stream = { headers: response.headers, events: [], ended: false }
  response.setEncoding('utf8')
  response.on('data', (text: string) => {
    for (const [, data] of text.matchAll(/^data: (.*)$/gm)) stream.events.push(JSON.parse(data) as ClubEvent)
  })
  response.on('end', () => (stream.ended = true)).on('error', () => undefined)
  return stream
}

const rows = (query: string) =>
  onDatabase(harness.database.adminUrl, async (admin) => (await admin.query(query)).rows as unknown[])
const noConnection = () =>
  until(
    () =>
      rows(
        `select 1 from pg_stat_activity where datname = current_database() and application_name = 'underfoot-events'`,
      ),
    (connections) => connections.length === 0,
    { what: 'no listening connection' },
  )
const tell = (clubId: string, event: ClubEvent, audience?: 'staff' | 'everybody') =>
  harness.db.inClub(workerContext(clubId), (tx) => notify(tx, clubId, event, audience))
const reached = (stream: Stream, count: number) =>
  until(
    () => Promise.resolve(stream.events),
    (events) => events.length >= count,
    { what: `${count} events` },
  )
/** Told last: whoever hears of it heard of everything before. */
const last: ClubEvent = { kind: 'athletes', id: null }

describe('the stream of events', () => {
  it('tells what changed in the club, by ids, and is not compressed', async () => {
    const stream = await listen(await buildMember(harness.db, day.clubId, ['coach']))
    expect(stream.headers).toMatchObject({ 'content-type': 'text/event-stream' })
    expect(stream.headers['content-encoding']).toBeUndefined()
    const params = { sessionId: day.session.id }
    const { version } = (await day.coach.call(getSession, { params })).session
    await day.coach.call(changeSession, { params, body: { version, title: 'Another title' } })
    expect(await reached(stream, 1)).toEqual([{ kind: 'session', id: day.session.id }])
  })

  it('tells many changes of one thing at once as one', async () => {
    const stream = await listen(await buildMember(harness.db, day.clubId, ['physio']))
    await harness.db.inClub(workerContext(day.clubId), async (tx) => {
      // One transaction: its notices go out together.
      for (let n = 0; n < 40; n++) {
        await notify(tx, day.clubId, { kind: 'session', id: day.session.id }, n % 2 ? 'staff' : 'everybody')
      }
      await notify(tx, day.clubId, last)
    })
    await reached(stream, 2)
    expect(stream.events).toEqual([{ kind: 'session', id: day.session.id }, last])
  })

  it('tells athletes only of what is published, and nobody of another club', async () => {
    const athlete = await listen(await buildMember(harness.db, day.clubId, ['athlete']))
    const elsewhere = await startTestingDay(harness, [])
    const stranger = await listen(await buildMember(harness.db, elsewhere.clubId, ['coach']))
    await tell(day.clubId, { kind: 'session', id: day.session.id })
    await tell(day.clubId, last, 'everybody')
    await tell(elsewhere.clubId, { kind: 'session', id: elsewhere.session.id })
    expect(await reached(athlete, 1)).toEqual([last])
    expect(await reached(stranger, 1)).toEqual([{ kind: 'session', id: elsewhere.session.id }])
  })

  it('ends when the database connection was lost, and the next one hears again', async () => {
    const coach = await buildMember(harness.db, day.clubId, ['coach'])
    const stream = await listen(coach)
    await rows(`select pg_terminate_backend(pid) from pg_stat_activity
      where datname = current_database() and query like 'listen %'`)
    await until(() => Promise.resolve(stream.ended), Boolean, { what: 'the end of the stream' })
    const again = await listen(coach)
    await tell(day.clubId, last)
    expect(await reached(again, 1)).toEqual([last])
  })

  it('keeps no connection when nobody listens any more', async () => {
    await listen(await buildMember(harness.db, day.clubId, ['coach']))
    open.splice(0).forEach((response) => response.destroy())
    await noConnection()
  })

  it('listens for nobody whose browser went away before the answer began', async () => {
    const { email } = await buildMember(harness.db, day.clubId, ['coach'])
    const cookie = await cookieOf(email)
    for (let n = 0; n < 10; n++) {
      const request = get(`${harness.url}/api/events`, { headers: { cookie } }).on('error', () => undefined)
      await once(request, 'finish')
      request.destroy()
    }
    const answered = () =>
      harness.log.filter((line) => line.includes('/api/events') && line.includes('aborted'))
    await until(
      () => Promise.resolve(answered()),
      (lines) => lines.length >= 10,
      { what: 'ten requests let go' },
    )
    await noConnection()
  })

  it('is not there for somebody signed out', async () => {
    await harness.client().agent.get('/api/events').expect(401)
  })
})
