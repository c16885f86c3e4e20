import type { Billing } from '../../../shared/contracts/billing.ts'
import { limits } from '../../../shared/contracts/limits.ts'
import type { CustomerTruth } from '../../integrations/payments/payments.ts'

export interface Standing {
  state: Billing['state']
  /** From when the club only reads; null: never, as things stand. */
  readsOnlyFrom: Date | null
  /** Seats that are paid for; null where no subscription says. */
  seats: number | null
}

const dayMs = 24 * 3600 * 1000

/**
 * What the service's state means for a club. Days of grace are counted from the oldest invoice that is open: a
 * charge that fails again does not begin them anew.
 * @param now of the reading; a period that the service says is over is over at once, whatever its clock shows
 */
export function standingOf(truth: CustomerTruth | null, trialEndsAt: Date | null, now: Date): Standing {
  const subscription = truth?.subscription
  if (!subscription || subscription.status === 'incomplete') {
    return { state: trialEndsAt ? 'trial' : 'granted', readsOnlyFrom: trialEndsAt, seats: null }
  }
  const { status, seats, endedAt, periodEnd } = subscription
  if (status === 'active') return { state: 'active', readsOnlyFrom: null, seats }
  if (status === 'canceled') {
    return { state: 'ended', readsOnlyFrom: earlier(new Date(endedAt ?? periodEnd), now), seats: 0 }
  }
  const graceEnds = new Date(oldestOpenAt(truth, periodEnd) + limits.graceDays * dayMs)
  if (status === 'past-due') return { state: 'past-due', readsOnlyFrom: graceEnds, seats }
  return { state: 'unpaid', readsOnlyFrom: earlier(graceEnds, now), seats }
}

function oldestOpenAt({ invoices }: CustomerTruth, otherwise: string): number {
  const open = invoices.filter(({ status }) => status === 'open').map(({ at }) => Date.parse(at))
  return open.length > 0 ? Math.min(...open) : Date.parse(otherwise)
}

const earlier = (a: Date, b: Date) => (a < b ? a : b)
