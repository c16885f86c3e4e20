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
  { smtpUrl, mailFrom, appUrl }: Pick<Config, 'smtpUrl' | 'mailFrom' | 'appUrl'>,
  { id, ...mail }: Mail,
): Promise<void> {
  if (!smtpUrl) throw new Error('SMTP_URL is not set: there is no mail server to hand mail to.')
  const { hostname } = new URL(smtpUrl)
  const transport = nodemailer.createTransport({
    url: smtpUrl,
    // The mail catcher on this machine speaks no TLS.
    ignoreTLS: hostname === '127.0.0.1',
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
