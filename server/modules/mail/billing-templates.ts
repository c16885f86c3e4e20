import { formatMoney } from '../../../shared/contracts/money.ts'
import type { MailText } from './mail-text.ts'
import { mailPayloads } from './templates.ts'

const dateOf = (iso: string) =>
  new Date(iso).toLocaleDateString('en-GB', { dateStyle: 'long', timeZone: 'UTC' })
const closing = 'You get this mail because you are an admin of the club.'

/** What a mail about money says to an admin of a club; null for any other mail. `page`: the club's billing page. */
export function billingText(
  { template, payload }: { template: string; payload: unknown },
  club: string,
  page: string,
): MailText | null {
  const link = { label: 'Open Billing', url: page }
  if (template === 'payment-receipt') {
    const { number, url, ...paid } = mailPayloads[template].parse(payload)
    return {
      subject: `Receipt for ${club}`,
      paragraphs: [
        `${club} has paid ${formatMoney(paid, 'en-GB')} for its seats in Underfoot, invoice ${number}.`,
      ],
      link: url ? { label: 'Open the invoice', url } : link,
      closing,
    }
  }
  if (template === 'payment-failed') {
    const { until } = mailPayloads[template].parse(payload)
    return {
      subject: `A payment of ${club} was declined`,
      paragraphs: [
        'The charge for the club’s seats in Underfoot did not go through. It is tried again by itself; another card may help.',
        `Everything works as before until ${dateOf(until)}. After that the club can read and not write, until the invoice is paid. Nothing is deleted.`,
      ],
      link,
      closing,
    }
  }
  if (template === 'trial-ends') {
    const { until } = mailPayloads[template].parse(payload)
    return {
      subject: `The trial of ${club} ends on ${dateOf(until)}`,
      paragraphs: [
        `Everything works until ${dateOf(until)}. After that the club can read and not write, until it buys seats. Nothing is deleted.`,
      ],
      link,
      closing,
    }
  }
  if (template !== 'club-reads-only') return null
  return {
    subject: `${club} can read and not write`,
    paragraphs: [
      'There is no paid subscription, so nothing new can be uploaded or changed in Underfoot. Everything that is there is kept, and can be read and taken along.',
      'As soon as the seats are paid, all of it works again.',
    ],
    link,
    closing,
  }
}
