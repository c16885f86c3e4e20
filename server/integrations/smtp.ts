import nodemailer from 'nodemailer'
import type { Config } from '../config/config.ts'

export interface Mail {
  /** Of the outbox; a mail sent twice after a crash bears the same Message-ID, and programs show it once. */
  id: string
  to: string
  subject: string
  text: string
  html: string
}

/** Well under the time after which a job counts as lost, so that one mail is never under way twice. */
const timeoutMs = 10_000

/** Hands a mail to the server of `SMTP_URL`; rejects where the server refuses it or cannot be reached. */
export async function sendBySmtp(
  { mode, smtpUrl, mailFrom, appUrl }: Pick<Config, 'mode' | 'smtpUrl' | 'mailFrom' | 'appUrl'>,
  { id, ...mail }: Mail,
): Promise<void> {
  if (!smtpUrl) throw new Error('SMTP_URL is not set: there is no mail server to hand mail to.')
  const isHere = new URL(smtpUrl).hostname === '127.0.0.1'
  const transport = nodemailer.createTransport({
    url: smtpUrl,
    // A server on this machine, such as the mail catcher, may speak no TLS: nobody is in between.
    ignoreTLS: isHere,
    // Links that sign people in are not sent in the clear; what the URL itself says comes before this.
    requireTLS: mode === 'production' && !isHere,
    connectionTimeout: timeoutMs,
    greetingTimeout: timeoutMs,
    socketTimeout: timeoutMs,
  })
  try {
    await transport.sendMail({
      from: mailFrom,
      messageId: `<${id}@${new URL(appUrl).hostname}>`,
      disableFileAccess: true,
      disableUrlAccess: true,
      ...mail,
    })
  } finally {
    transport.close()
  }
}
