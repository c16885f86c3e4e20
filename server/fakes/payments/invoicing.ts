import { type Books, defaultCard, invoiceOf, itemOf, subscriptionOf, tell } from './books.ts'
import { outcomeOf } from './cards.ts'
import type { Invoice, InvoiceLine, Subscription } from './shapes.ts'

const dayS = 24 * 3600
/** Pauses before the second, third and fourth try of a declined charge; after the fourth the subscription is unpaid. */
const retryPausesS = [3 * dayS, 5 * dayS, 7 * dayS]

export type LineDraft = Pick<InvoiceLine, 'description' | 'amount' | 'quantity'>

/** Takes a discount off, rounded as money is: half a minor unit goes up. */
export const discounted = (amount: number, discount: Subscription['discount']) =>
  discount ? Math.round((amount * (100 - discount.percentOff)) / 100) : amount

/** Seats at the price of the subscription for one whole period. */
export function periodLine(subscription: Subscription, quantity: number): LineDraft {
  const { price } = itemOf(subscription)
  const amount = price.unit_amount * quantity
  return { description: `${quantity} seats`, amount: discounted(amount, subscription.discount), quantity }
}

export function createInvoice(
  books: Books,
  subscription: Subscription,
  reason: string,
  drafts: LineDraft[],
): Invoice {
  const id = books.id('in')
  const url = `${books.baseUrl()}/invoices/${id}`
  const lines = drafts.map((draft) => ({ id: books.id('il'), object: 'line_item' as const, ...draft }))
  const total = lines.reduce((sum, { amount }) => sum + amount, 0)
  const { current_period_start, current_period_end } = itemOf(subscription)
  const invoice: Invoice = {
    id,
    object: 'invoice',
    customer: subscription.customer,
    number: `UF-${id.slice(-6)}`,
    status: 'open',
    created: books.now(),
    currency: subscription.currency,
    subtotal: total,
    total,
    amount_due: Math.max(0, total),
    amount_paid: 0,
    amount_remaining: Math.max(0, total),
    attempt_count: 0,
    next_payment_attempt: null,
    billing_reason: reason,
    hosted_invoice_url: url,
    invoice_pdf: url,
    period_start: current_period_start,
    period_end: current_period_end,
    parent: { type: 'subscription_details', subscription_details: { subscription: subscription.id } },
    lines: { object: 'list', data: lines, has_more: false, url: `/v1/invoices/${id}/lines` },
    status_transitions: { finalized_at: books.now(), paid_at: null },
  }
  books.state.invoices[id] = invoice
  subscription.latest_invoice = id
  if (subscription.discount?.once) subscription.discount = null
  tell(books, 'invoice.created', invoice)
  return invoice
}

/** Charges the customer's card; where it is declined, plans the next try or gives up. */
export function collect(books: Books, invoiceId: string): boolean {
  const invoice = invoiceOf(books, invoiceId)
  invoice.attempt_count += 1
  if (invoice.amount_due === 0 || chargeSucceeds(books, invoice.customer)) {
    settle(books, invoice)
    return true
  }
  const pause = retryPausesS[invoice.attempt_count - 1]
  invoice.next_payment_attempt = pause === undefined ? null : books.now() + pause
  tell(books, 'invoice.payment_failed', invoice)
  setStatus(books, subscriptionOfInvoice(books, invoice), pause === undefined ? 'unpaid' : 'past_due')
  return false
}

export function settle(books: Books, invoice: Invoice): void {
  Object.assign(invoice, { status: 'paid', amount_paid: invoice.amount_due, amount_remaining: 0 })
  invoice.next_payment_attempt = null
  invoice.status_transitions.paid_at = books.now()
  tell(books, 'invoice.paid', invoice)
  const subscription = subscriptionOfInvoice(books, invoice)
  const open = openInvoicesOf(books, subscription.id)
  if (open.length === 0) setStatus(books, subscription, 'active')
}

/** A charge without the customer there: a card that asked for its second step once is charged as agreed then. */
function chargeSucceeds(books: Books, customerId: string): boolean {
  const card = defaultCard(books, customerId)
  const outcome = card && outcomeOf(card.number)?.outcome
  return outcome === 'paid' || outcome === 'second-step'
}

function setStatus(books: Books, subscription: Subscription, status: Subscription['status']): void {
  if (subscription.status === status || subscription.status === 'canceled') return
  subscription.status = status
  tell(books, 'customer.subscription.updated', subscription)
}

const subscriptionOfInvoice = (books: Books, { parent }: Invoice) =>
  subscriptionOf(books, parent.subscription_details.subscription)

export const openInvoicesOf = ({ state }: Books, subscriptionId: string): Invoice[] =>
  Object.values(state.invoices).filter(
    ({ status, parent }) => status === 'open' && parent.subscription_details.subscription === subscriptionId,
  )
