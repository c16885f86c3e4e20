import type { Card, Customer, Invoice, Price, ServiceEvent, Subscription } from './shapes.ts'
import { missing } from './service-error.ts'
import type { PaymentState } from './state.ts'

/** What every part of the local service works on. */
export interface Books {
  state: PaymentState
  /** Seconds since 1970 by the service's own clock. */
  now(): number
  /** A new id, as `sub_000012`. */
  id(prefix: string): string
  /** Address of the service itself, for its pages. */
  baseUrl(): string
}

/** Of the version that the SDK in use pins. */
export const apiVersion = '2026-10-28.endive'

/** Notes that something happened; the delivery takes it from there. The object is kept as it was at this moment. */
export function tell(books: Books, type: string, object: unknown): void {
  const event: ServiceEvent = {
    id: books.id('evt'),
    object: 'event',
    api_version: apiVersion,
    created: books.now(),
    type,
    livemode: false,
    data: { object: structuredClone(object) },
  }
  books.state.undelivered.push(event)
}

function take<T>(rows: Record<string, T>, what: string, id: string): T {
  const row = Object.hasOwn(rows, id) ? rows[id] : undefined
  if (!row) throw missing(what, id)
  return row
}

export const customerOf = ({ state }: Books, id: string): Customer => take(state.customers, 'customer', id)
export const priceOf = ({ state }: Books, id: string): Price => take(state.prices, 'price', id)
export const invoiceOf = ({ state }: Books, id: string): Invoice => take(state.invoices, 'invoice', id)
export const subscriptionOf = ({ state }: Books, id: string): Subscription =>
  take(state.subscriptions, 'subscription', id)
export const scheduleOf = ({ state }: Books, id: string) => take(state.schedules, 'subscription schedule', id)
export const checkoutOf = ({ state }: Books, id: string) => take(state.sessions, 'checkout.session', id)
export const portalOf = ({ state }: Books, id: string) => take(state.portals, 'portal session', id)

/** The card that the customer pays with, if any. */
export function defaultCard(books: Books, customerId: string): Card | null {
  const { default_payment_method: id } = customerOf(books, customerId).invoice_settings
  return id ? (books.state.cards[id] ?? null) : null
}

/** The one item of a subscription: seats at a price. */
export const itemOf = (subscription: Subscription) => subscription.items.data[0]

/** An answer that lists rows. */
export const listed = (url: string, data: unknown[]) => ({ object: 'list', url, has_more: false, data })
