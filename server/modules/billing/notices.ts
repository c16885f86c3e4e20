import { limits } from '../../../shared/contracts/limits.ts'
import type { CustomerTruth } from '../../integrations/payments/payments.ts'
import type { MailPayloads } from '../mail/templates.ts'
import type { Standing } from './standing.ts'

type Template = 'payment-receipt' | 'payment-failed' | 'club-reads-only' | 'trial-ends'

/** A mail to the club's admins. Of one key only one is ever sent. */
export type Notice = { [T in Template]: { key: string; template: T; payload: MailPayloads[T] } }[Template]

const dayMs = 24 * 3600 * 1000

/** What the admins are to be told, as things stand; what they were told before is among it. */
export function noticesDue(
  truth: CustomerTruth | null,
  { state, readsOnlyFrom }: Standing,
  now: Date,
): Notice[] {
  const notices: Notice[] = receipts(truth)
  if (!readsOnlyFrom) return notices
  const until = readsOnlyFrom.toISOString()
  const daysLeft = (readsOnlyFrom.getTime() - now.getTime()) / dayMs
  if (daysLeft <= 0)
    return [...notices, { key: `reads-only:${until}`, template: 'club-reads-only', payload: {} }]
  // The latest of the days to remind on that has come; the earlier ones are not made up for.
  const reminder = limits.remindDaysBefore.findLast((days) => daysLeft <= days)
  if (state === 'trial' && reminder !== undefined) {
    notices.push({ key: `trial-ends:${until}:${reminder}`, template: 'trial-ends', payload: { until } })
  }
  if (state === 'past-due' || state === 'unpaid') {
    const invoice = truth?.invoices.findLast(({ status }) => status === 'open')?.id ?? until
    const key = `failed:${invoice}:${reminder ?? 'first'}`
    notices.push({ key, template: 'payment-failed', payload: { until } })
  }
  return notices
}

const receipts = (truth: CustomerTruth | null): Notice[] =>
  (truth?.invoices ?? [])
    .filter(({ status, total }) => status === 'paid' && total.amount > 0)
    .map(({ id, number, total, url }) => ({
      key: `receipt:${id}`,
      template: 'payment-receipt' as const,
      payload: { number: number ?? id, ...total, url },
    }))
