import { once } from 'node:events'
import type { Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { simpleParser } from 'mailparser'
import { SMTPServer } from 'smtp-server'
import type { CaughtMail } from './caught-mail.ts'
import { createInbox } from './inbox-page.ts'

export interface MailCatcher {
  smtpUrl: string
  inboxUrl: string
  /** Newest last; the oldest go when there are more than `keep`. */
  mails: CaughtMail[]
  /** Refuses mail as long as it is set, as a server that is full does. */
  refuse: boolean
  stop(): Promise<void>
}

const loopback = '127.0.0.1'
const keep = 500

/** Takes every mail on loopback, delivers none, and shows them on a page. For development and tests only. */
export async function startMailCatcher(ports: { smtp: number; inbox: number }): Promise<MailCatcher> {
  const mails: CaughtMail[] = []
  const smtp = createSmtp(mails, () => catcher.refuse)
  smtp.listen(ports.smtp, loopback)
  await once(smtp.server, 'listening')
  const inbox = createInbox(mails).listen(ports.inbox, loopback)
  await once(inbox, 'listening')
  const catcher: MailCatcher = {
    smtpUrl: `smtp://${loopback}:${portOf(smtp.server)}`,
    inboxUrl: `http://${loopback}:${portOf(inbox)}`,
    mails,
    refuse: false,
    async stop() {
      await Promise.all([new Promise<void>((done) => smtp.close(done)), closeServer(inbox)])
    },
  }
  return catcher
}

function createSmtp(mails: CaughtMail[], refuses: () => boolean): SMTPServer {
  return new SMTPServer({
    disabledCommands: ['STARTTLS', 'AUTH'],
    disableReverseLookup: true,
    onData(stream, session, callback) {
      simpleParser(stream).then(({ from, subject, text, html, messageId }) => {
        if (refuses()) return callback(new Error('The mailbox is full'))
        mails.push({
          to: session.envelope.rcptTo.map(({ address }) => address).join(', '),
          from: from?.text ?? '',
          subject: subject ?? '',
          text: text ?? '',
          html: html || '',
          messageId: messageId ?? '',
          receivedAt: new Date(),
        })
        if (mails.length > keep) mails.shift()
        callback()
      }, callback)
    },
  })
}

const portOf = (server: { address(): AddressInfo | string | null }) => {
  const address = server.address()
  return address !== null && typeof address === 'object' ? address.port : 0
}

async function closeServer(server: Server): Promise<void> {
  const closed = once(server, 'close')
  server.close()
  server.closeAllConnections()
  await closed
}
