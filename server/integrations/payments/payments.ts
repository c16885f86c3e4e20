import type { Money } from '../../../shared/contracts/money.ts'

export type Interval = 'month' | 'year'

/** A price of one seat for a month or a year. */
export interface Plan {
  priceId: string
  interval: Interval
  seat: Money
}

/** What the service says of a club's subscription. Moments are ISO 8601 in UTC. */
export interface SubscriptionTruth {
  id: string
  itemId: string
  priceId: string
  scheduleId: string | null
  /** `incomplete`: begun and never paid. `unpaid`: every try to charge has failed. */
  status: 'active' | 'past-due' | 'unpaid' | 'canceled' | 'incomplete'
  interval: Interval
  seats: number
  /** Seats from the next period on, where they are other than now. */
  nextSeats: number | null
  periodStart: string
  periodEnd: string
  endsWithPeriod: boolean
  endedAt: string | null
}

export interface InvoiceTruth {
  id: string
  number: string | null
  at: string
  total: Money
  status: 'open' | 'paid' | 'other'
  url: string | null
  nextTryAt: string | null
}

/** All that the product keeps a copy of. */
export interface CustomerTruth {
  /** The running one, or else the last that ended. */
  subscription: SubscriptionTruth | null
  /** Newest first. */
  invoices: InvoiceTruth[]
  nextInvoice: { at: string; total: Money } | null
}

export interface SeatChange {
  subscription: SubscriptionTruth
  seats: number
}

/** An event of the service: only whom it is about is read, since the state is always fetched anew. */
export interface PaymentEvent {
  id: string
  type: string
  createdAt: string
  customerId: string | null
}

/**
 * What the product asks of a payment service. `key` makes a repeated request one request. Refusals are named
 * errors: `payment-declined`, or `payments-away` where the service gave no usable answer.
 */
export interface Payments {
  createCustomer(club: { clubId: string; name: string; email: string }, key: string): Promise<string>
  plans(): Promise<Plan[]>
  /** Address of the service's own page, where the club buys. */
  openCheckout(
    order: {
      customerId: string
      clubId: string
      priceId: string
      seats: number
      doneUrl: string
      backUrl: string
    },
    key: string,
  ): Promise<string>
  readCustomer(customerId: string): Promise<CustomerTruth>
  /** What more seats cost for the rest of the period, computed at `atS` (seconds since 1970). */
  previewSeats(change: SeatChange, atS: number): Promise<Money>
  /** At once, charged at once as previewed for the same moment; nothing changes where the card is declined. */
  addSeats(change: SeatChange, atS: number, key: string): Promise<void>
  /** From the next period on. */
  scheduleSeats(change: SeatChange, key: string): Promise<void>
  /** Takes a scheduled change back. */
  dropSchedule(scheduleId: string, key: string): Promise<void>
  endWithPeriod(subscriptionId: string, ends: boolean, key: string): Promise<void>
  /** Address of the service's own page for cards and invoices. */
  openPortal(customerId: string, returnUrl: string): Promise<string>
  /** Reads a signed event; throws `signature-invalid` where it is not the service's, or older than five minutes. */
  readEvent(raw: Uint8Array, signature: string, now: Date): PaymentEvent
}
