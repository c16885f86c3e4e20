import { limits } from '../../../shared/contracts/limits.ts'
import { Money } from '../../../shared/contracts/money.ts'
import { z } from 'zod'
import type { MailText } from './mail-text.ts'

/** What the outbox keeps for each kind of mail, until it is sent. */
export const mailPayloads = {
  invitation: z.strictObject({ invitationId: z.uuid() }),
  'password-reset': z.strictObject({}),
  'results-published': z.strictObject({}),
  'payment-receipt': Money.extend({ number: z.string(), url: z.string().nullable() }),
  'payment-failed': z.strictObject({ until: z.string() }),
  'club-reads-only': z.strictObject({}),
  'trial-ends': z.strictObject({ until: z.string() }),
}
export type TemplateName = keyof typeof mailPayloads
export type MailPayloads = { [T in TemplateName]: z.output<(typeof mailPayloads)[T]> }

/** Mail says that something waits and where, never what it is. */
export const invitationText = (club: string, link: string): MailText => ({
  subject: `${club} invites you to Underfoot`,
  paragraphs: [
    `${club} keeps the results of its jump tests in Underfoot and has made a place for you there.`,
    `The link works once, for ${limits.invitationDays} days.`,
  ],
  link: { label: 'Accept the invitation', url: link },
  closing: 'If you do not know this club, leave this mail unanswered: nothing happens without the link.',
})

export const passwordResetText = (link: string): MailText => ({
  subject: 'Set a new password',
  paragraphs: [
    'Somebody, probably you, asked to set a new password for Underfoot at this address.',
    `The link works once, for ${limits.resetMinutes} minutes.`,
  ],
  link: { label: 'Set a new password', url: link },
  closing: 'If it was not you, leave this mail unanswered: your password stays as it is.',
})

export const resultsPublishedText = (club: string, link: string): MailText => ({
  subject: `Something new waits for you at ${club}`,
  paragraphs: ['There is something new for you in Underfoot. Sign in to see it.'],
  link: { label: 'Open Underfoot', url: link },
  closing: 'You get this mail because you are a member of the club.',
})
