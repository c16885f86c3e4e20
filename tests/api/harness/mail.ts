import { asc, isNull } from 'drizzle-orm'
import { outbox } from '../../../server/db/schema/identity.ts'
import type { CaughtMail } from '../../../server/fakes/caught-mail.ts'
import { startMailCatcher, type MailCatcher } from '../../../server/fakes/mail-catcher.ts'
import { sendOutboxMail } from '../../../server/modules/mail/mail.jobs.ts'
import type { Harness } from './harness.ts'

export const catchMail = () => startMailCatcher({ smtp: 0, inbox: 0 })

/** Sends, as the worker does, what is in the outbox; returns the mails that arrived, oldest first. */
export async function deliverMail({ workerDeps }: Harness, catcher: MailCatcher): Promise<CaughtMail[]> {
  const before = catcher.mails.length
  const waiting = await workerDeps.db.inIdentity((tx) =>
    tx.select({ id: outbox.id }).from(outbox).where(isNull(outbox.sentAt)).orderBy(asc(outbox.createdAt)),
  )
  for (const { id } of waiting) await sendOutboxMail(workerDeps, id)
  return catcher.mails.slice(before)
}

/** The secret of the link in a mail's text. */
export function tokenIn(mail: CaughtMail | undefined): string {
  const token = /\/(?:invite|reset)\/([\w-]+)/.exec(mail?.text ?? '')?.[1]
  if (!token) throw new Error(`no link in the mail: ${mail?.text}`)
  return token
}
