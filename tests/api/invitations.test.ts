import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { acceptInvitation, getInvitation, getMe } from '../../shared/contracts/account.ts'
import { listAthletes } from '../../shared/contracts/athletes.ts'
import {
  changePerson,
  invitePerson,
  listPeople,
  resendInvitation,
  withdrawInvitation,
} from '../../shared/contracts/people.ts'
import type { MailCatcher } from '../../server/fakes/mail-catcher.ts'
import { buildAthlete } from '../../seed/builders/athlete.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember, builtPassword } from '../../seed/builders/person.ts'
import type { ApiClient } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import { catchMail, deliverMail, tokenIn } from './harness/mail.ts'

let harness: Harness
let catcher: MailCatcher
let clubId: string
let admin: ApiClient

beforeAll(async () => {
  catcher = await catchMail()
  harness = await startHarness({ SMTP_URL: catcher.smtpUrl, APP_URL: 'https://underfoot.example.org' })
  clubId = await buildClub(harness.db, { name: 'Quarry <b>Club</b>' })
  admin = await harness.signedIn(await buildMember(harness.db, clubId, ['admin']))
})
afterAll(async () => {
  await harness.stop()
  await catcher.stop()
})

let people = 0
const newForm = (more: object = {}) => {
  const email = `guest-${++people}@example.org`
  return { name: 'Guest Example', email, roles: ['coach'], athleteId: null, ...more }
}
/** Invites, and returns the invitation and the secret that arrived by mail. */
async function invite(form = newForm()) {
  const invitation = await admin.call(invitePerson, { body: form })
  const mails = await deliverMail(harness, catcher)
  const mail = mails.find(({ to }) => to === form.email)
  return { invitation, mail, token: tokenIn(mail) }
}
const accept = (token: string, password = 'my own long password', name = 'Guest Chosen') =>
  harness.client().send(acceptInvitation, { params: { token }, body: { name, password } })

describe('an invitation', () => {
  it('is sent to one address five times an hour at most, by whichever club', async () => {
    const form = newForm()
    const { invitation } = await invite(form)
    const params = { invitationId: invitation.id }
    for (let version = 1; version <= 4; version++) {
      await admin.call(resendInvitation, { params, body: { version } })
    }
    const sixth = await admin.send(resendInvitation, { params, body: { version: 5 } })
    expect([sixth.status, sixth.headers['retry-after']]).toEqual([429, expect.stringMatching(/^\d+$/)])
    const otherClub = await buildClub(harness.db)
    const otherAdmin = await harness.signedIn(await buildMember(harness.db, otherClub, ['admin']))
    expect(await otherAdmin.refusal(invitePerson, { body: form })).toEqual([429, 'too-many-requests'])
    await invite()
  })

  it('names no role twice', async () => {
    const body = newForm({ roles: ['coach', 'coach'] })
    const refused = await admin.send(invitePerson, { body })
    expect(refused.status).toBe(400)
    expect(JSON.stringify(refused.body)).toContain('A role is named twice')
  })

  it('comes by mail with a link, in text and in HTML, from names that cannot break the mail', async () => {
    const { mail, token } = await invite()
    expect(mail?.subject).toBe('Quarry <b>Club</b> invites you to Underfoot')
    expect(mail?.text).toContain(`https://underfoot.example.org/invite/${token}`)
    expect(mail?.html).toContain('Quarry &lt;b&gt;Club&lt;/b&gt;')
    expect(mail?.html).not.toContain('<b>')
  })

  it('shows what it is for, makes the account and signs the person in', async () => {
    const form = newForm({ roles: ['coach', 'physio'] })
    const { token } = await invite(form)
    expect(await harness.client().call(getInvitation, { params: { token } })).toEqual({
      clubName: 'Quarry <b>Club</b>',
      name: form.name,
      email: form.email,
      roles: ['coach', 'physio'],
      hasAccount: false,
    })
    const browser = harness.client()
    const body = { name: 'Guest Chosen', password: 'my own long password' }
    const me = await browser.call(acceptInvitation, { params: { token }, body })
    expect(me).toMatchObject({
      person: { name: 'Guest Chosen', email: form.email },
      roles: ['coach', 'physio'],
    })
    expect((await browser.call(getMe))?.person.id).toBe(me.person.id)
    await harness.client().signIn(form.email, body.password)
    expect((await admin.call(listPeople)).invitations.map(({ email }) => email)).not.toContain(form.email)
  })

  it('links the athlete record it names', async () => {
    const athleteId = await buildAthlete(harness.db, clubId)
    const { token } = await invite(newForm({ roles: ['athlete'], athleteId }))
    expect((await accept(token)).body).toMatchObject({ athleteId, roles: ['athlete'] })
    const coach = await harness.signedIn(await buildMember(harness.db, clubId, ['coach']))
    const { athletes } = await coach.call(listAthletes)
    expect(athletes.find(({ id }) => id === athleteId)).toMatchObject({ linked: true, version: 2 })
  })

  it('to an address with an account asks for its password, and keeps its name', async () => {
    const elsewhere = await buildClub(harness.db)
    const person = await buildMember(harness.db, elsewhere, ['athlete'])
    const { token } = await invite(newForm({ email: person.email }))
    expect(await harness.client().call(getInvitation, { params: { token } })).toMatchObject({
      hasAccount: true,
    })
    expect((await accept(token, 'not that password')).status).toBe(401)
    const accepted = await accept(token, builtPassword)
    expect(accepted.body).toMatchObject({
      person: { id: person.id, name: person.name },
      club: { id: clubId },
    })
  })

  it('opens a closed membership again, with the new roles', async () => {
    const person = await buildMember(harness.db, clubId, ['coach'], { active: false })
    const { token } = await invite(newForm({ email: person.email, roles: ['physio'] }))
    expect((await accept(token, builtPassword)).body).toMatchObject({ roles: ['physio'] })
  })

  it('works once, also for two at the same moment', async () => {
    const { token } = await invite()
    const both = await Promise.all([accept(token), accept(token)])
    expect(both.filter(({ status }) => status === 200)).toHaveLength(1)
    expect((await accept(token)).status).toBe(410)
  })

  it('ends after 14 days, and is listed as expired', async () => {
    const { token, invitation } = await invite()
    const start = harness.time.now
    harness.time.now = new Date(start.getTime() + 14 * 24 * 3600 * 1000)
    expect((await accept(token)).body).toMatchObject({ error: { code: 'token-invalid' } })
    const listed = (await admin.call(listPeople)).invitations.find(({ id }) => id === invitation.id)
    expect(listed).toMatchObject({ expired: true })
    harness.time.now = start
  })

  it('sent again carries a new link, and the one before stops working', async () => {
    const { token, invitation } = await invite()
    const again = { params: { invitationId: invitation.id }, body: { version: invitation.version } }
    await admin.call(resendInvitation, again)
    const [mail] = await deliverMail(harness, catcher)
    expect((await accept(token)).status).toBe(410)
    expect((await accept(tokenIn(mail))).status).toBe(200)
  })

  it('that was withdrawn leads nowhere, even when its mail goes out late', async () => {
    const invitation = await admin.call(invitePerson, { body: newForm() })
    const params = { invitationId: invitation.id }
    await admin.call(withdrawInvitation, { params, body: { version: invitation.version } })
    expect(await deliverMail(harness, catcher)).toEqual([])
    expect(await admin.refusal(resendInvitation, { params, body: { version: 2 } })).toEqual([
      404,
      'not-found',
    ])
  })

  it('is refused where one is open, and where the person is in the club already', async () => {
    const { invitation } = await invite()
    const again = { body: newForm({ email: invitation.email.toUpperCase() }) }
    expect(await admin.refusal(invitePerson, again)).toEqual([409, 'already-invited'])
    const member = await buildMember(harness.db, clubId, ['coach'])
    expect(await admin.refusal(invitePerson, { body: newForm({ email: member.email }) })).toEqual([
      409,
      'already-invited',
    ])
  })

  it('cannot give an athlete to a second person', async () => {
    const athleteId = await buildAthlete(harness.db, clubId)
    const forAthlete = () => newForm({ roles: ['athlete'], athleteId })
    const [first, second] = [await invite(forAthlete()), await invite(forAthlete())]
    expect((await accept(first.token)).status).toBe(200)
    expect((await accept(second.token)).body).toMatchObject({ error: { code: 'athlete-already-linked' } })
    expect(await admin.refusal(invitePerson, { body: forAthlete() })).toEqual([409, 'athlete-already-linked'])
    // The refused one was not used up, and made no account.
    const view = await harness.client().call(getInvitation, { params: { token: second.token } })
    expect(view.hasAccount).toBe(false)
  })

  it('names an athlete only together with the role athlete', async () => {
    const athleteId = await buildAthlete(harness.db, clubId)
    const response = await admin.send(invitePerson, { body: newForm({ athleteId }) })
    expect(response.body).toMatchObject({
      error: { code: 'invalid-request', details: { athleteId: expect.any(String) as string } },
    })
  })
})

describe('the people of a club', () => {
  it('are listed to an admin with their roles', async () => {
    const person = await buildMember(harness.db, clubId, ['physio'], { name: 'Listed Example' })
    const { people } = await admin.call(listPeople)
    expect(people.find(({ id }) => id === person.id)).toEqual({
      ...person,
      roles: ['physio'],
      active: true,
      version: 1,
      athleteId: null,
    })
  })

  it('get other roles, and lose and regain their place', async () => {
    const person = await buildMember(harness.db, clubId, ['physio'])
    const params = { personId: person.id }
    const coach = await admin.call(changePerson, { params, body: { version: 1, roles: ['coach', 'admin'] } })
    expect(coach).toMatchObject({ roles: ['coach', 'admin'], active: true, version: 2 })
    const closed = await admin.call(changePerson, { params, body: { version: 2, active: false } })
    expect(closed).toMatchObject({ roles: ['coach', 'admin'], active: false })
    expect(await admin.refusal(changePerson, { params, body: { version: 2, active: true } })).toEqual([
      409,
      'stale-version',
    ])
  })

  it('always include one active admin, whichever way the last one would go', async () => {
    const club = await buildClub(harness.db)
    const last = await buildMember(harness.db, club, ['admin', 'coach'])
    await buildMember(harness.db, club, ['admin'], { active: false })
    const browser = await harness.signedIn(last)
    const params = { personId: last.id }
    for (const personId of [last.id, last.id.toUpperCase()]) {
      for (const change of [{ roles: ['coach'] }, { active: false }]) {
        const body = { version: 1, ...change }
        expect(await browser.refusal(changePerson, { params: { personId }, body })).toEqual([
          409,
          'last-admin',
        ])
      }
    }
    await browser.call(changePerson, { params, body: { version: 1, roles: ['admin'] } })
  })

  it('keep an admin when two admins remove each other at the same moment', async () => {
    for (let round = 0; round < 5; round++) {
      const club = await buildClub(harness.db)
      const [a, b] = [
        await buildMember(harness.db, club, ['admin']),
        await buildMember(harness.db, club, ['admin']),
      ]
      const [browserA, browserB] = [await harness.signedIn(a), await harness.signedIn(b)]
      const body = { version: 1, active: false }
      const both = await Promise.all([
        browserA.send(changePerson, { params: { personId: b.id }, body }),
        browserB.send(changePerson, { params: { personId: a.id }, body }),
      ])
      expect(both.filter(({ status }) => status === 200)).toHaveLength(1)
    }
  })
})
