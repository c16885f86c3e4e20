import type { Deps } from '../../deps.ts'
import type { Tx } from '../../db/database.ts'
import { scrub } from '../../integrations/log.ts'
import { sendBySmtp } from '../../integrations/smtp.ts'
import { defineJob } from '../../jobs/define-job.ts'
import { openReset } from '../account/resets.service.ts'
import { openInvitationLink } from '../people/invitations.service.ts'
import { billingText } from './billing-templates.ts'
import { asHtml, asPlainText, type MailText } from './mail-text.ts'
import { beginTry, findClubName, markFailed, markSent } from './mail.queries.ts'
import { invitationText, mailPayloads, passwordResetText, resultsPublishedText } from './templates.ts'

type MailDeps = Pick<Deps, 'config' | 'db' | 'clock'>
type OutboxMail = NonNullable<Awaited<ReturnType<typeof beginTry>>>

/**
 * Sends one mail of the outbox. What it says is made in the transaction that counts the try, the sending is
 * outside; a mail that could not be sent says why in the outbox, and the queue tries again up to its ceiling.
 */
export async function sendOutboxMail(deps: MailDeps, mailId: string): Promise<void> {
  const { config, db, clock } = deps
  const prepared = await db.inIdentity(async (tx) => {
    const mail = await beginTry(tx, mailId)
    return mail && { mail, text: await compose(tx, deps, mail) }
  })
  if (!prepared) return
  const { mail, text } = prepared
  try {
    if (text) {
      const { subject } = text
      const parts = { text: asPlainText(text), html: asHtml(text) }
      await sendBySmtp(config, { id: mail.id, to: mail.toAddress, subject, ...parts })
    }
  } catch (error) {
    const reason = scrub(error instanceof Error ? error.message : String(error)).slice(0, 500)
    await db.inIdentity((tx) => markFailed(tx, mailId, reason))
    throw error
  }
  await db.inIdentity((tx) => markSent(tx, mailId, clock()))
}

/** What the mail says now; null where there is nothing to say any more. */
async function compose(
  tx: Tx,
  { config: { appUrl }, clock }: MailDeps,
  mail: OutboxMail,
): Promise<MailText | null> {
  if (mail.template === 'password-reset') {
    const token = await openReset(tx, mail.toAddress, clock())
    return token ? passwordResetText(`${appUrl}/reset/${token}`) : null
  }
  const club = mail.clubId && (await findClubName(tx, mail.clubId))
  if (!club) return null
  if (mail.template === 'invitation') {
    const { invitationId } = mailPayloads.invitation.parse(mail.payload)
    const token = await openInvitationLink(tx, invitationId)
    return token ? invitationText(club, `${appUrl}/invite/${token}`) : null
  }
  return mail.template === 'results-published'
    ? resultsPublishedText(club, `${appUrl}/`)
    : billingText(mail, club, `${appUrl}/club/billing`)
}

export const sendMailJob = defineJob('send-mail', (deps, { mailId }) => sendOutboxMail(deps, mailId))
