import { eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { workerContext } from '../../server/db/database.ts'
import { outbox } from '../../server/db/schema/identity.ts'
import type { MailCatcher } from '../../server/fakes/mail-catcher.ts'
import { sendOutboxMail } from '../../server/modules/mail/mail.jobs.ts'
import { sendMail } from '../../server/modules/mail/mail.service.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import { catchMail, deliverMail } from './harness/mail.ts'

let harness: Harness
let catcher: MailCatcher
let clubId: string

beforeAll(async () => {
  catcher = await catchMail()
  harness = await startHarness({ SMTP_URL: catcher.smtpUrl, APP_URL: 'https://underfoot.example.org' })
  clubId = await buildClub(harness.db, { name: 'Ferry Road Club' })
})
afterAll(async () => {
  await harness.stop()
  await catcher.stop()
})

/** Orders a mail as a publication does, and returns its id. */
async function order(to: string): Promise<string> {
  await harness.db.inClub(workerContext(clubId), (tx) =>
    sendMail(tx, { clubId, to, template: 'results-published', payload: {} }),
  )
  const [row] = await rowsTo(to)
  if (!row) throw new Error('no mail in the outbox')
  return row.id
}
const rowsTo = (to: string) =>
  harness.db.inIdentity((tx) => tx.select().from(outbox).where(eq(outbox.toAddress, to)))

describe('a mail', () => {
  it('says that something waits and where, and not what it is', async () => {
    await order('athlete@example.org')
    const [mail] = await deliverMail(harness, catcher)
    expect(mail).toMatchObject({
      to: 'athlete@example.org',
      from: expect.stringContaining('no-reply@localhost') as string,
      subject: 'Something new waits for you at Ferry Road Club',
    })
    expect(mail?.text).toContain('https://underfoot.example.org/')
    expect(mail?.text).not.toMatch(/jump|height|force|landing|result/i)
    expect(mail?.html).not.toMatch(/jump|force|landing|result/i)
  })

  it('is not there when the transaction that ordered it fails', async () => {
    const ordering = harness.db.inClub(workerContext(clubId), async (tx) => {
      await sendMail(tx, { clubId, to: 'undone@example.org', template: 'results-published', payload: {} })
      throw new Error('something else failed')
    })
    await expect(ordering).rejects.toThrow('something else failed')
    expect(await rowsTo('undone@example.org')).toEqual([])
    expect(await jobsOf()).not.toContain('undone@example.org')
  })

  it('has one job that names it, and nothing of the person', async () => {
    const id = await order('job@example.org')
    const jobs = await jobsOf()
    expect(jobs).toContain(id)
    expect(jobs).not.toContain('job@example.org')
    await sendOutboxMail(harness.workerDeps, id)
  })

  it('is sent once, however often its job runs', async () => {
    const id = await order('once@example.org')
    const before = catcher.mails.length
    for (let i = 0; i < 3; i++) await sendOutboxMail(harness.workerDeps, id)
    expect(catcher.mails.length - before).toBe(1)
    expect(await rowsTo('once@example.org')).toMatchObject([{ attempts: 1, lastError: null }])
    expect(catcher.mails.at(-1)?.messageId).toBe(`<${id}@underfoot.example.org>`)
  })

  it('that the server refuses keeps the reason, and is sent when it takes mail again', async () => {
    const id = await order('full@example.org')
    catcher.refuse = true
    await expect(sendOutboxMail(harness.workerDeps, id)).rejects.toThrow()
    await expect(sendOutboxMail(harness.workerDeps, id)).rejects.toThrow()
    const [waiting] = await rowsTo('full@example.org')
    expect(waiting).toMatchObject({ attempts: 2, sentAt: null })
    expect(waiting?.lastError).toContain('The mailbox is full')
    catcher.refuse = false
    await sendOutboxMail(harness.workerDeps, id)
    expect(await rowsTo('full@example.org')).toMatchObject([{ attempts: 3, sentAt: harness.time.now }])
  })

  it('cannot be read by the role that orders it', async () => {
    const read = harness.db.inClub(workerContext(clubId), (tx) => tx.select().from(outbox))
    await expect(read).rejects.toMatchObject({ cause: { code: '42501' } })
  })
})

describe('the mail catcher', () => {
  it('shows what it caught on a page, with links that work and markup that does not', async () => {
    catcher.mails.push({
      to: 'page@example.org',
      from: 'x',
      subject: '<script>alert(1)</script>',
      text: 'see https://underfoot.example.org/invite/abc now',
      html: '',
      messageId: '',
      receivedAt: new Date('2027-01-01T00:00:00Z'),
    })
    const response = await fetch(catcher.inboxUrl)
    const page = await response.text()
    expect(response.headers.get('content-security-policy')).toContain("default-src 'none'")
    expect(page).toContain('<a href="https://underfoot.example.org/invite/abc">')
    expect(page).not.toContain('<script>')
  })
})

/** What the queue holds for the mail job. */
async function jobsOf(): Promise<string> {
  const { rows } = await harness.workerDeps.db.pool.query<{ data: unknown }>(
    `select data from pgboss.job where name = 'send-mail'`,
  )
  return JSON.stringify(rows)
}
