import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { checkReset, finishReset, getMe, requestReset, signIn } from '../../shared/contracts/account.ts'
import type { MailCatcher } from '../../server/fakes/mail-catcher.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import { catchMail, deliverMail, tokenIn } from './harness/mail.ts'

let harness: Harness
let catcher: MailCatcher
let clubId: string

beforeAll(async () => {
  catcher = await catchMail()
  harness = await startHarness({ SMTP_URL: catcher.smtpUrl, APP_URL: 'https://underfoot.example.org' })
  clubId = await buildClub(harness.db)
})
afterAll(async () => {
  await harness.stop()
  await catcher.stop()
})

const password = 'chosen after the reset'

async function askForLink(email: string): Promise<string> {
  await harness.client().call(requestReset, { body: { email } })
  const mails = await deliverMail(harness, catcher)
  return tokenIn(mails.find(({ to }) => to === email))
}

describe('a password reset', () => {
  it('is mailed as a link to the product’s own address, whatever Host the request named', async () => {
    const person = await buildMember(harness.db, clubId, ['athlete'])
    const headers = { Host: 'evil.example.com' }
    await harness.client().send(requestReset, { body: { email: person.email }, headers })
    const [mail] = await deliverMail(harness, catcher)
    expect(mail).toMatchObject({ to: person.email, subject: 'Set a new password' })
    expect(mail?.text).toMatch(/^https:\/\/underfoot\.example\.org\/reset\/[\w-]{43}$/m)
    expect(mail?.html).toContain(`href="https://underfoot.example.org/reset/${tokenIn(mail)}"`)
  })

  it('is answered alike for an unknown address, which gets no mail', async () => {
    const person = await buildMember(harness.db, clubId, ['athlete'])
    const known = await harness.client().send(requestReset, { body: { email: person.email } })
    const unknown = await harness.client().send(requestReset, { body: { email: 'unknown@example.org' } })
    expect([known.status, known.text]).toEqual([unknown.status, unknown.text])
    const mails = await deliverMail(harness, catcher)
    expect(mails.map(({ to }) => to)).toEqual([person.email])
  })

  it('sets the password, ends every sign-in and lets the person in again', async () => {
    const person = await buildMember(harness.db, clubId, ['athlete'])
    const before = await harness.signedIn(person)
    const params = { token: await askForLink(person.email) }
    expect(await harness.client().call(checkReset, { params })).toEqual({ email: person.email })
    await harness.client().call(finishReset, { params, body: { password } })
    expect(await before.call(getMe)).toBeNull()
    await harness.client().signIn(person.email, password)
  })

  it('opens an address that was locked after wrong passwords', async () => {
    const person = await buildMember(harness.db, clubId, ['athlete'])
    const wrong = { body: { email: person.email, password: 'wrong wrong wrong' } }
    for (let i = 0; i < 11; i++) await harness.client().send(signIn, wrong)
    expect(await harness.client().refusal(signIn, wrong)).toEqual([429, 'too-many-requests'])
    const params = { token: await askForLink(person.email) }
    await harness.client().call(finishReset, { params, body: { password } })
    await harness.client().signIn(person.email, password)
  })

  it('works once, also for two at the same moment', async () => {
    const person = await buildMember(harness.db, clubId, ['athlete'])
    const params = { token: await askForLink(person.email) }
    const both = await Promise.all(
      [1, 2].map((n) =>
        harness.client().send(finishReset, { params, body: { password: `${password} ${n}` } }),
      ),
    )
    expect(both.map(({ status }) => status).sort()).toEqual([204, 410])
    expect(await harness.client().refusal(checkReset, { params })).toEqual([410, 'token-invalid'])
  })

  it('ends with the hour', async () => {
    const person = await buildMember(harness.db, clubId, ['athlete'])
    const params = { token: await askForLink(person.email) }
    const start = harness.time.now
    harness.time.now = new Date(start.getTime() + 60 * 60_000)
    expect(await harness.client().refusal(finishReset, { params, body: { password } })).toEqual([
      410,
      'token-invalid',
    ])
    harness.time.now = start
    expect((await harness.client().send(checkReset, { params })).status).toBe(200)
  })

  it('makes older links worthless', async () => {
    const person = await buildMember(harness.db, clubId, ['athlete'])
    const older = { token: await askForLink(person.email) }
    const newer = { token: await askForLink(person.email) }
    await harness.client().call(finishReset, { params: newer, body: { password } })
    expect(await harness.client().refusal(checkReset, { params: older })).toEqual([410, 'token-invalid'])
  })

  it('keeps no link secret in the database, before or after', async () => {
    const person = await buildMember(harness.db, clubId, ['athlete'])
    const token = await askForLink(person.email)
    const { rows } = await harness.workerDeps.db.inIdentity((tx) =>
      tx.execute(`select outbox::text as row from identity.outbox union all
        select password_resets::text from identity.password_resets`),
    )
    expect(rows.length).toBeGreaterThan(1)
    expect(JSON.stringify(rows)).not.toContain(token)
  })

  it('is asked for five times an hour at most for one address', async () => {
    const body = { email: 'often@example.org' }
    for (let i = 0; i < 5; i++) await harness.client().call(requestReset, { body })
    expect(await harness.client().refusal(requestReset, { body })).toEqual([429, 'too-many-requests'])
  })
})
