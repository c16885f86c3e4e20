import { randomUUID } from 'node:crypto'
import { sql } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { getMe, signIn, signOut } from '../../shared/contracts/account.ts'
import { createAthlete, listAthletes } from '../../shared/contracts/athletes.ts'
import { ErrorBody } from '../../shared/contracts/errors.ts'
import { listSessions } from '../../shared/contracts/sessions.ts'
import { changeSquad, createSquad } from '../../shared/contracts/squads.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember } from '../../seed/builders/person.ts'
import type { ApiClient } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'

let harness: Harness
let coach: ApiClient

beforeAll(async () => {
  harness = await startHarness({ APP_URL: 'https://underfoot.example.org' })
  const clubId = await buildClub(harness.db)
  coach = await harness.signedIn(await buildMember(harness.db, clubId, ['coach']))
})
afterAll(() => harness.stop())

const squad = () => ({ name: `Squad ${randomUUID()}`, athleteIds: [] })

describe('a change', () => {
  it.each([
    ['another site, as browsers say', { 'Sec-Fetch-Site': 'cross-site' }],
    ['another host of the same site', { 'Sec-Fetch-Site': 'same-site' }],
    ['another origin, from a browser that says no more', { Origin: 'https://evil.example.com' }],
    ['a sandboxed page', { Origin: 'null' }],
  ])('that comes from %s is refused', async (_, headers) => {
    expect(await coach.refusal(createSquad, { body: squad(), headers })).toEqual([403, 'cross-site-request'])
    expect(await coach.refusal(signOut, { headers })).toEqual([403, 'cross-site-request'])
    expect((await coach.send(getMe)).status).toBe(200)
  })

  it.each([
    ['our own pages', { 'Sec-Fetch-Site': 'same-origin', Origin: 'https://underfoot.example.org' }],
    ['our own address, from a browser that says no more', { Origin: 'https://underfoot.example.org' }],
    ['a program that is no browser', {}],
  ])('that comes from %s is done', async (_, headers) => {
    await coach.call(createSquad, { body: squad(), headers })
  })

  it('that comes from the host it is sent to is done, whatever the product’s own address', async () => {
    await coach.call(createSquad, { body: squad(), headers: { Origin: harness.url } })
  })
})

describe('every answer', () => {
  it('carries a content policy that lets nothing in from elsewhere, and nothing inline', async () => {
    const { headers } = await harness.client().agent.get('/')
    const policy = headers['content-security-policy'] as string
    expect(policy).toContain("default-src 'none'")
    expect(policy).toContain("script-src 'self'")
    expect(policy).toContain("frame-ancestors 'none'")
    expect(policy).not.toMatch(/unsafe|\*|https?:/)
    expect(headers).toMatchObject({
      'x-content-type-options': 'nosniff',
      'x-frame-options': 'DENY',
      'referrer-policy': 'no-referrer',
    })
    expect(headers).not.toHaveProperty('x-powered-by')
  })

  it('of the API is kept by nobody, and has an id', async () => {
    const { headers } = await coach.send(getMe)
    expect(headers['cache-control']).toBe('no-store')
    expect(headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/)
  })
})

describe('a refused request', () => {
  it('is answered with a code and a sentence, and per field what is wrong', async () => {
    const body = { name: '', bornOn: '2004-02-31', recordedMassKg: 5, squadIds: [] }
    const response = await coach.send(createAthlete, { body })
    expect(response.status).toBe(400)
    const { error } = ErrorBody.parse(response.body)
    expect(error.code).toBe('invalid-request')
    expect(Object.keys(error.details ?? {}).sort()).toEqual(['bornOn', 'name', 'recordedMassKg'])
  })

  it('may not hold keys that nobody asked for, in body or query', async () => {
    expect(await coach.refusal(createSquad, { body: { ...squad(), clubId: randomUUID() } })).toEqual([
      400,
      'invalid-request',
    ])
    expect(await coach.refusal(listSessions, { query: { page: 1, club: 'x' } })).toEqual([
      400,
      'invalid-request',
    ])
  })

  it('may not be broken JSON, nor larger than the server takes', async () => {
    const post = (text: string) =>
      harness.client().agent.post('/api/sign-in').set('Content-Type', 'application/json').send(text)
    expect(ErrorBody.parse((await post('{"email":')).body).error.code).toBe('invalid-request')
    const large = await post(JSON.stringify({ email: 'x'.repeat(300_000), password: 'x' }))
    expect([large.status, ErrorBody.parse(large.body).error.code]).toEqual([413, 'invalid-request'])
  })

  it.each([
    ['a null character', { name: 'Mara\0Ostrow' }, 'name'],
    ['half a character', { name: 'Mara\ud83d' }, 'name'],
    ['a year that no calendar has', { bornOn: '0000-01-01' }, 'bornOn'],
  ])('may not hold %s, which the database would choke on', async (_, wrong, field) => {
    const body = { name: 'Mara Ostrow', bornOn: null, recordedMassKg: null, squadIds: [], ...wrong }
    const response = await coach.send(createAthlete, { body })
    expect(response.status).toBe(400)
    expect(Object.keys(ErrorBody.parse(response.body).error.details ?? {})).toEqual([field])
  })

  it('may not name a version past all counting, nor search for a null character', async () => {
    const { id } = await coach.call(createSquad, { body: squad() })
    const options = { params: { squadId: id }, body: { version: 2 ** 31 } }
    expect(await coach.refusal(changeSquad, options)).toEqual([400, 'invalid-request'])
    expect(await coach.refusal(listSessions, { query: { search: 'a\0b' } })).toEqual([400, 'invalid-request'])
  })

  it('to a path that the API does not have is a 404 with a code', async () => {
    const response = await coach.agent.get('/api/no-such-thing')
    expect([response.status, ErrorBody.parse(response.body).error.code]).toEqual([404, 'not-found'])
  })

  it('to a session whose path is no id is refused before the database is asked', async () => {
    const response = await coach.agent.get('/api/sessions/1%20or%201=1')
    expect([response.status, ErrorBody.parse(response.body).error.code]).toEqual([400, 'invalid-request'])
  })
})

describe('a fault of ours', () => {
  it('is a plain 500 without internals, told in the log with the request’s id', async () => {
    const rename = (from: string, to: string) =>
      onDatabase(harness.database.adminUrl, async (admin) => {
        await admin.query(`alter table club.athletes rename column ${from} to ${to}`)
      })
    await rename('born_on', 'moved_away')
    const response = await coach.send(listAthletes)
    await rename('moved_away', 'born_on')
    expect(response.status).toBe(500)
    expect(ErrorBody.parse(response.body).error.code).toBe('internal')
    expect(response.text).not.toMatch(/born_on|select|at /)
    const id = String(response.headers['x-request-id'])
    const line = harness.log.find((text) => text.includes(id) && text.includes('request failed'))
    expect(line).toContain('born_on')
  })
})

describe('health', () => {
  it('says that the process is there', async () => {
    expect((await harness.client().agent.get('/healthz')).body).toEqual({ ok: true })
  })

  it('says that the database is there and as new as the program', async () => {
    expect((await harness.client().agent.get('/readyz')).status).toBe(200)
    await onDatabase(harness.database.adminUrl, async (admin) => {
      await admin.query('update drizzle.__drizzle_migrations set created_at = created_at - 1000000000000')
    })
    const behind = await harness.client().agent.get('/readyz')
    expect([behind.status, behind.body]).toEqual([
      503,
      { ok: false, problem: 'The database has not been migrated.' },
    ])
    await onDatabase(harness.database.adminUrl, async (admin) => {
      await admin.query('update drizzle.__drizzle_migrations set created_at = created_at + 1000000000000')
    })
  })
})

describe('the log', () => {
  it('holds no password, address, cookie, link secret or search', async () => {
    const secrets = {
      password: 'very secret words 42',
      email: 'secret.person@example.org',
      token: 'SecretTokenOfSomeMailedLink_0123456789',
      search: 'SecretSearch',
    }
    const browser = harness.client()
    await browser.send(signIn, { body: { email: secrets.email, password: secrets.password } })
    await browser.agent.get(`/api/invitations/${secrets.token}`)
    await browser.agent.get(`/api/resets/${secrets.token}`)
    await browser.agent.get(`/invite/${secrets.token}`)
    await browser.agent.get(`/reset/${secrets.token}?email=${secrets.email}`)
    await coach.send(listSessions, { query: { search: secrets.search } })
    const log = harness.log.join('\n')
    expect(log).toContain('/api/invitations/[token]')
    for (const [name, secret] of Object.entries(secrets)) expect(log.includes(secret), name).toBe(false)
    expect(log).not.toMatch(/underfoot=s%3A|set-cookie/i)
  })

  it('tells a failed statement without the values it was run with', async () => {
    const statement = harness.db.inIdentity((tx) =>
      tx.execute(sql`select ${'secret.value@example.org'}::uuid`),
    )
    await statement.catch((error: unknown) => harness.deps.log.error({ err: error }, 'probe'))
    const line = harness.log.find((text) => text.includes('probe')) ?? ''
    expect(line).toContain('22P02')
    expect(line).not.toContain('secret.value')
  })
})
