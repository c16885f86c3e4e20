import { and, eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { changePassword, getMe, signIn, signOut } from '../../shared/contracts/account.ts'
import { memberships } from '../../server/db/schema/identity.ts'
import { buildAthlete } from '../../seed/builders/athlete.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember, buildMembership, buildPerson, builtPassword } from '../../seed/builders/person.ts'
import { startHarness, type Harness } from './harness/harness.ts'

let harness: Harness
let clubId: string

beforeAll(async () => {
  harness = await startHarness()
  clubId = await buildClub(harness.db, { name: 'Marsh Lane Athletics (invented)', demo: true })
})
afterAll(() => harness.stop())

const wrong = (email: string) => ({ body: { email, password: 'not the password at all' } })
const setActive = (personId: string, active: boolean) =>
  harness.db.inIdentity((tx) =>
    tx
      .update(memberships)
      .set({ active })
      .where(and(eq(memberships.clubId, clubId), eq(memberships.personId, personId))),
  )

describe('signing in', () => {
  it('answers who is signed in, to which club, as what', async () => {
    const person = await buildMember(harness.db, clubId, ['athlete', 'coach'])
    const athleteId = await buildAthlete(harness.db, clubId, { personId: person.id })
    const browser = harness.client()
    const body = { email: ` ${person.email.toUpperCase()} `, password: builtPassword }
    const me = await browser.call(signIn, { body })
    expect(me).toEqual({
      person: { id: person.id, name: person.name, email: person.email },
      club: { id: clubId, name: 'Marsh Lane Athletics (invented)', timeZone: 'Europe/Vienna', demo: true },
      roles: ['athlete', 'coach'],
      athleteId,
    })
    expect(await browser.call(getMe)).toEqual(me)
  })

  it('refuses a wrong password, an unknown address and one without an account in the same words', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'])
    const answers = await Promise.all(
      [person.email, 'nobody@example.org'].map((email) => harness.client().send(signIn, wrong(email))),
    )
    expect(answers.map(({ status }) => status)).toEqual([401, 401])
    expect(answers[0]?.body).toEqual(answers[1]?.body)
    expect(answers[0]?.body).toMatchObject({ error: { code: 'wrong-credentials' } })
  })

  it('sets a cookie that scripts cannot read and other sites do not send', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'])
    const response = await harness
      .client()
      .send(signIn, { body: { email: person.email, password: builtPassword } })
    const cookie = String(response.headers['set-cookie'])
    expect(cookie).toMatch(/^underfoot=/)
    expect(cookie).toContain('HttpOnly')
    expect(cookie).toContain('SameSite=Lax')
  })

  it('in production sends the cookie over https alone, and tells browsers to keep to https', async () => {
    const production = await startHarness({
      NODE_ENV: 'production',
      SESSION_SECRET: 'a secret of forty characters, only here.',
      APP_URL: 'https://underfoot.example.org',
      SMTP_URL: 'smtp://127.0.0.1:9',
      TRUSTED_PROXIES: '1',
    })
    const person = await buildMember(production.db, await buildClub(production.db), ['coach'])
    const { headers } = await production.client().send(signIn, {
      body: { email: person.email, password: builtPassword },
      headers: { 'X-Forwarded-Proto': 'https' },
    })
    await production.stop()
    expect(String(headers['set-cookie'])).toContain('Secure')
    expect(headers['strict-transport-security']).toMatch(/max-age=\d{8}/)
  })

  it('gives the session a new id, so that one planted before is worth nothing', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'])
    const browser = await harness.signedIn(person)
    const before = await sessionIds(person.id)
    await browser.signIn(person.email)
    const after = await sessionIds(person.id)
    expect(after).toHaveLength(1)
    expect(after).not.toEqual(before)
  })

  it('keeps a session in the database, so that any web process knows it', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'])
    await harness.signedIn(person)
    expect(await sessionIds(person.id)).toHaveLength(1)
  })

  it('leads to the first club that the person is active in', async () => {
    const person = await buildPerson(harness.db)
    const closed = await buildClub(harness.db)
    await buildMembership(harness.db, closed, person.id, ['admin'], false)
    await buildMembership(harness.db, clubId, person.id, ['coach'])
    const browser = await harness.signedIn(person)
    expect((await browser.call(getMe))?.club.id).toBe(clubId)
  })

  it('tells a person whose place was closed, and only with the right password', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'], { active: false })
    const body = { email: person.email, password: builtPassword }
    expect(await harness.client().refusal(signIn, { body })).toEqual([403, 'not-allowed'])
    expect(await harness.client().refusal(signIn, wrong(person.email))).toEqual([401, 'wrong-credentials'])
  })

  it('is refused for a while after ten wrong passwords for one address, right password or not', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'])
    for (let i = 0; i < 10; i++) await harness.client().send(signIn, wrong(person.email))
    const right = { body: { email: person.email, password: builtPassword } }
    const response = await harness.client().send(signIn, right)
    expect([response.status, response.headers['retry-after']]).toEqual([429, expect.stringMatching(/^\d+$/)])
    expect(response.body).toMatchObject({
      error: { code: 'too-many-requests', message: expect.stringContaining('15 minutes') as string },
    })
    const somebodyElse = await buildMember(harness.db, clubId, ['coach'])
    await harness.signedIn(somebodyElse)
  })

  it('forgets the wrong tries of an address once the right password came', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'])
    for (let round = 0; round < 2; round++) {
      for (let i = 0; i < 8; i++) await harness.client().send(signIn, wrong(person.email))
      await harness.signedIn(person)
    }
  })
})

describe('a signed-in person', () => {
  it('is signed out by signing out, and the old cookie does not bring them back', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'])
    const browser = await harness.signedIn(person)
    const { headers } = await harness.client().send(signIn, {
      body: { email: person.email, password: builtPassword },
    })
    const cookie = String(headers['set-cookie']).split(';')[0] ?? ''
    await browser.call(signOut)
    expect(await browser.call(getMe)).toBeNull()
    expect((await harness.client().send(getMe, { headers: { Cookie: cookie } })).status).toBe(200)
    await harness.client().send(signOut, { headers: { Cookie: cookie } })
    expect(await harness.client().call(getMe, { headers: { Cookie: cookie } })).toBeNull()
  })

  it('is signed out at the next request after the membership is closed', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'])
    const browser = await harness.signedIn(person)
    await setActive(person.id, false)
    expect(await browser.call(getMe)).toBeNull()
    await setActive(person.id, true)
    expect(await browser.call(getMe)).toBeNull()
  })

  it('has another role at the next request after it was changed', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'])
    const browser = await harness.signedIn(person)
    await harness.db.inIdentity((tx) =>
      tx
        .update(memberships)
        .set({ roles: ['athlete'] })
        .where(eq(memberships.personId, person.id)),
    )
    expect((await browser.call(getMe))?.roles).toEqual(['athlete'])
  })

  it('changes the password with the present one, and is signed out everywhere else', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'])
    const [here, elsewhere] = [await harness.signedIn(person), await harness.signedIn(person)]
    const next = 'another long password'
    expect(await here.refusal(changePassword, { body: { current: 'guess', next } })).toEqual([
      401,
      'wrong-credentials',
    ])
    await here.call(changePassword, { body: { current: builtPassword, next } })
    expect((await here.call(getMe))?.person.id).toBe(person.id)
    expect(await elsewhere.call(getMe)).toBeNull()
    await harness.client().signIn(person.email, next)
  })
})

async function sessionIds(personId: string): Promise<string[]> {
  const rows = await harness.db.pool.query<{ sid: string }>(
    `select sid from identity.sign_in_sessions where sess -> 'passport' -> 'user' ->> 'personId' = $1`,
    [personId],
  )
  return rows.rows.map(({ sid }) => sid)
}
