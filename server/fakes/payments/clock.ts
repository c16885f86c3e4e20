import { type Books, itemOf, tell } from './books.ts'
import { collect, createInvoice, periodLine } from './invoicing.ts'
import { periodEnd } from './period.ts'
import { releaseSchedule } from './schedules.ts'
import type { Subscription } from './shapes.ts'
import { nextQuantity } from './subscriptions.ts'

/** Does what fell due by now, in the order of its moments; `setNow` puts the clock to each of them. */
export function runDue(books: Books, setNow: (s: number) => void): void {
  const until = books.now()
  for (;;) {
    const next = dueActs(books).sort((a, b) => a.at - b.at)[0]
    if (!next || next.at > until) break
    setNow(next.at)
    next.act()
  }
  setNow(until)
}

function dueActs(books: Books): { at: number; act: () => void }[] {
  const running = Object.values(books.state.subscriptions).filter(({ status }) => status !== 'canceled')
  const retries = Object.values(books.state.invoices).flatMap(({ id, status, next_payment_attempt: at }) =>
    status === 'open' && at !== null ? [{ at, act: () => void collect(books, id) }] : [],
  )
  const renewals = running.map((subscription) => ({
    at: itemOf(subscription).current_period_end,
    act: () => endPeriod(books, subscription),
  }))
  return [...retries, ...renewals]
}

function endPeriod(books: Books, subscription: Subscription): void {
  if (subscription.cancel_at_period_end) {
    Object.assign(subscription, { status: 'canceled', ended_at: books.now() })
    tell(books, 'customer.subscription.deleted', subscription)
    return
  }
  const item = itemOf(subscription)
  item.quantity = nextQuantity(books, subscription)
  if (subscription.schedule) releaseSchedule(books, subscription.schedule)
  item.current_period_start = item.current_period_end
  item.current_period_end = periodEnd(
    subscription.created,
    item.current_period_start,
    item.price.recurring.interval,
  )
  tell(books, 'customer.subscription.updated', subscription)
  // An unpaid subscription runs on without new charges until the old one is paid.
  if (subscription.status === 'unpaid') return
  collect(
    books,
    createInvoice(books, subscription, 'subscription_cycle', [periodLine(subscription, item.quantity)]).id,
  )
}
