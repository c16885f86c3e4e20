import { sql } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import { sendJobs } from '../../jobs/queue.ts'
import { insertMail } from './mail.queries.ts'
import type { MailPayloads, TemplateName } from './templates.ts'

export interface MailOrder<T extends TemplateName> {
  clubId: string | null
  to: string
  template: T
  /** Ids only: what a mail says, and the secret of its link, are made when it is sent. */
  payload: MailPayloads[T]
}

/**
 * Orders a mail within the transaction of what it tells. The last thing of that transaction: it steps out of
 * the identity role, which has nothing to do with the queue.
 */
export async function sendMail<T extends TemplateName>(tx: Tx, mail: MailOrder<T>): Promise<void> {
  await tx.execute(sql`set local role none`)
  const mailId = await insertMail(tx, mail)
  await sendJobs(tx, 'send-mail', { version: 1, mailId })
}
