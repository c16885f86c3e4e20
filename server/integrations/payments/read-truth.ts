import type Stripe from 'stripe'
import type { InvoiceTruth, SubscriptionTruth } from './payments.ts'

export const isoOf = (seconds: number): string => new Date(seconds * 1000).toISOString()

const statuses: Record<string, SubscriptionTruth['status']> = {
  active: 'active',
  trialing: 'active',
  past_due: 'past-due',
  unpaid: 'unpaid',
  paused: 'unpaid',
  canceled: 'canceled',
  incomplete: 'incomplete',
  incomplete_expired: 'incomplete',
}

/** The service's subscription in our own words; `schedule` is the one attached to it, if any. */
export function readSubscription(
  one: Stripe.Subscription,
  schedule: Stripe.SubscriptionSchedule | null,
): SubscriptionTruth {
  const item = one.items.data[0]
  if (!item) throw new Error(`the subscription ${one.id} has no item`)
  const seats = item.quantity ?? 0
  const next = schedule?.phases.find((phase) => phase.start_date >= item.current_period_end)?.items[0]
    ?.quantity
  return {
    id: one.id,
    itemId: item.id,
    priceId: item.price.id,
    scheduleId: schedule?.id ?? null,
    status: statuses[one.status] ?? 'incomplete',
    interval: item.price.recurring?.interval === 'year' ? 'year' : 'month',
    seats,
    nextSeats: next === undefined || next === seats ? null : next,
    periodStart: isoOf(item.current_period_start),
    periodEnd: isoOf(item.current_period_end),
    endsWithPeriod: one.cancel_at_period_end,
    endedAt: one.ended_at === null ? null : isoOf(one.ended_at),
  }
}

const statusOf = ({ status }: Stripe.Invoice): InvoiceTruth['status'] => {
  if (status === 'open') return 'open'
  return status === 'paid' ? 'paid' : 'other'
}

export function readInvoice(invoice: Stripe.Invoice): InvoiceTruth {
  return {
    id: invoice.id,
    number: invoice.number,
    at: isoOf(invoice.created),
    total: { amount: invoice.total, currency: invoice.currency },
    status: statusOf(invoice),
    url: invoice.hosted_invoice_url ?? null,
    nextTryAt: invoice.next_payment_attempt === null ? null : isoOf(invoice.next_payment_attempt),
  }
}

/** Of several subscriptions the one that runs, newest first; else the last that ended. */
export function chooseSubscription(all: readonly Stripe.Subscription[]): Stripe.Subscription | null {
  const newestFirst = [...all].sort((a, b) => b.created - a.created)
  const runs = ({ status }: Stripe.Subscription) =>
    !['canceled', 'incomplete', 'incomplete_expired'].includes(status)
  return newestFirst.find(runs) ?? newestFirst[0] ?? null
}
