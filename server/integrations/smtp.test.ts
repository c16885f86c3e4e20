import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startMailCatcher, type MailCatcher } from '../fakes/mail-catcher.ts'
import { sendBySmtp } from './smtp.ts'

let catcher: MailCatcher
/** The same server, which offers no TLS, by a name that is not told from one across the network. */
let remoteUrl: string

beforeAll(async () => {
  catcher = await startMailCatcher({ smtp: 0, inbox: 0 })
  remoteUrl = catcher.smtpUrl.replace('127.0.0.1', 'localhost')
})
afterAll(() => catcher.stop())

const mail = { id: 'a', to: 'someone@example.org', subject: 'Subject', text: 'Text', html: '<p>Text</p>' }
const sender = { mailFrom: 'no-reply@example.org', appUrl: 'https://underfoot.example.org' }
const send = (mode: 'production' | 'development', smtpUrl: string) =>
  sendBySmtp({ mode, smtpUrl, ...sender }, mail)

describe('sendBySmtp(config, mail)', () => {
  it('hands no mail over in the clear in production', async () => {
    await expect(send('production', remoteUrl)).rejects.toThrow(/STARTTLS/)
    expect(catcher.mails).toEqual([])
  })

  it('does so where the URL itself says that it may', async () => {
    await send('production', `${remoteUrl}/?requireTLS=false`)
    expect(catcher.mails).toHaveLength(1)
  })

  it('does so in development, and to a server on this machine', async () => {
    await send('development', remoteUrl)
    await send('production', catcher.smtpUrl)
    expect(catcher.mails).toHaveLength(3)
  })
})
