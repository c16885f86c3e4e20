import {
  type Books,
  customerOf,
  defaultCard,
  itemOf,
  listed,
  priceOf,
  scheduleOf,
  subscriptionOf,
  tell,
} from './books.ts'
import { outcomeOf } from './cards.ts'
import { groupOf, listOf, textOf, wholeOf, type Form } from './form-body.ts'
import { collect, createInvoice, periodLine, settle } from './invoicing.ts'
import { periodEnd } from './period.ts'
import { prorate } from './proration.ts'
import { cardDeclined, invalidRequest } from './service-error.ts'
import type { CheckoutSession, Subscription } from './shapes.ts'

/** Starts the subscription that a Checkout bought; its first invoice was paid on the page. */
export function startSubscription(
  books: Books,
  { customer, price: priceId, quantity, metadata }: CheckoutSession,
  discount: Subscription['discount'],
): Subscription {
  const price = priceOf(books, priceId)
  const now = books.now()
  const item = { id: books.id('si'), object: 'subscription_item' as const, price, quantity }
  const period = {
    current_period_start: now,
    current_period_end: periodEnd(now, now, price.recurring.interval),
  }
  const subscription: Subscription = {
    id: books.id('sub'),
    object: 'subscription',
    customer,
    status: 'active',
    created: now,
    currency: price.currency,
    cancel_at_period_end: false,
    cancel_at: null,
    canceled_at: null,
    ended_at: null,
    schedule: null,
    latest_invoice: null,
    metadata,
    items: { object: 'list', data: [{ ...item, ...period }], has_more: false, url: '/v1/subscription_items' },
    discount,
  }
  books.state.subscriptions[subscription.id] = subscription
  tell(books, 'customer.subscription.created', subscription)
  const invoice = createInvoice(books, subscription, 'subscription_create', [
    periodLine(subscription, quantity),
  ])
  invoice.attempt_count = 1
  settle(books, invoice)
  return subscription
}

export function listSubscriptions(books: Books, form: Form) {
  const customer = textOf(form, 'customer')
  if (customer) customerOf(books, customer)
  const all = textOf(form, 'status') === 'all'
  const found = Object.values(books.state.subscriptions).filter(
    (one) => (!customer || one.customer === customer) && (all || one.status !== 'canceled'),
  )
  return listed('/v1/subscriptions', found.reverse())
}

/** Changes the number of seats, or whether the subscription ends with its period. */
export function updateSubscription(books: Books, id: string, form: Form): Subscription {
  const subscription = subscriptionOf(books, id)
  if (subscription.status === 'canceled')
    throw invalidRequest('A canceled subscription can only update its metadata.')
  const [change] = listOf(form, 'items')
  const quantity = change && wholeOf(change, 'quantity')
  if (quantity !== undefined) changeQuantity(books, subscription, quantity, form)
  const ends = textOf(form, 'cancel_at_period_end')
  if (ends !== undefined) {
    subscription.cancel_at_period_end = ends === 'true'
    subscription.cancel_at = ends === 'true' ? itemOf(subscription).current_period_end : null
    subscription.canceled_at = ends === 'true' ? books.now() : null
  }
  tell(books, 'customer.subscription.updated', subscription)
  return subscription
}

function changeQuantity(books: Books, subscription: Subscription, quantity: number, form: Form): void {
  const item = itemOf(subscription)
  if (!Number.isInteger(quantity) || quantity < 1)
    throw invalidRequest('Invalid quantity', 'items[0][quantity]')
  if (textOf(form, 'proration_behavior') !== 'always_invoice') {
    throw invalidRequest('The local service knows proration_behavior=always_invoice alone.')
  }
  const drafts = prorate(
    item,
    quantity,
    wholeOf(form, 'proration_date') ?? books.now(),
    subscription.discount,
  )
  const due = drafts.reduce((sum, { amount }) => sum + amount, 0)
  if (due > 0) refuseUnpayable(books, subscription, textOf(form, 'payment_behavior'))
  item.quantity = quantity
  collect(books, createInvoice(books, subscription, 'subscription_update', drafts).id)
}

/** With `error_if_incomplete` nothing changes where the card does not pay at once. */
function refuseUnpayable(books: Books, { customer }: Subscription, behaviour: string | undefined): void {
  if (behaviour !== 'error_if_incomplete') {
    throw invalidRequest('The local service knows payment_behavior=error_if_incomplete alone.')
  }
  const card = defaultCard(books, customer)
  const found = card && outcomeOf(card.number)
  if (found?.outcome !== 'paid' && found?.outcome !== 'second-step')
    throw cardDeclined(found?.reason ?? 'no_card')
}

/** What the next invoice, or the change of seats that is asked about, comes to. */
export function previewInvoice(books: Books, form: Form) {
  const schedule = textOf(form, 'schedule')
  const asked = schedule ? scheduleOf(books, schedule).subscription : textOf(form, 'subscription')
  const subscription = subscriptionOf(books, asked ?? '')
  const item = itemOf(subscription)
  const details = groupOf(form, 'subscription_details')
  const [change] = listOf(details, 'items')
  const next = change && wholeOf(change, 'quantity')
  const at = wholeOf(details, 'proration_date') ?? books.now()
  const lines = next
    ? prorate(item, next, at, subscription.discount)
    : [periodLine(subscription, nextQuantity(books, subscription))]
  const total = lines.reduce((sum, { amount }) => sum + amount, 0)
  return {
    object: 'invoice',
    customer: subscription.customer,
    created: next ? at : item.current_period_end,
    next_payment_attempt: next ? null : item.current_period_end,
    currency: subscription.currency,
    total,
    amount_due: Math.max(0, total),
    lines: listed('/v1/invoices/upcoming/lines', lines),
  }
}

/** Seats from the next period on: as many as now, unless a schedule says otherwise. */
export function nextQuantity({ state }: Books, subscription: Subscription): number {
  const item = itemOf(subscription)
  const schedule = subscription.schedule ? state.schedules[subscription.schedule] : undefined
  const phase = schedule?.phases.find(({ start_date }) => start_date >= item.current_period_end)
  return phase?.items[0]?.quantity ?? item.quantity
}
