/**
 * What the local payment service keeps and answers: the fields that this product reads or writes of the hosted
 * service's objects, named as they are on its wire. Moments are whole seconds since 1970, amounts minor units.
 */
export interface Customer {
  id: string
  object: 'customer'
  created: number
  email: string | null
  name: string | null
  metadata: Record<string, string>
  invoice_settings: { default_payment_method: string | null }
  tax_ids: string[]
}

export interface Card {
  id: string
  object: 'payment_method'
  type: 'card'
  customer: string
  card: { brand: string; last4: string; exp_month: number; exp_year: number }
  /** The whole test number: it decides how a charge ends. */
  number: string
}

export type Interval = 'month' | 'year'

export interface Price {
  id: string
  object: 'price'
  active: boolean
  currency: string
  unit_amount: number
  lookup_key: string | null
  product: string
  type: 'recurring'
  recurring: { interval: Interval; interval_count: 1 }
}

export interface Product {
  id: string
  object: 'product'
  name: string
  active: boolean
}

export interface PromotionCode {
  code: string
  percentOff: number
  /** Whether it takes something off the first invoice alone. */
  once: boolean
}

export interface CheckoutSession {
  id: string
  object: 'checkout.session'
  customer: string
  mode: 'subscription'
  status: 'open' | 'complete' | 'expired'
  url: string
  success_url: string
  cancel_url: string
  subscription: string | null
  created: number
  price: string
  quantity: number
  metadata: Record<string, string>
  /** A card that has been given and asks for its second step. */
  waiting: { number: string; promotion: string; taxId: string } | null
}

export interface SubscriptionItem {
  id: string
  object: 'subscription_item'
  price: Price
  quantity: number
  current_period_start: number
  current_period_end: number
}

export interface Subscription {
  id: string
  object: 'subscription'
  customer: string
  status: 'active' | 'past_due' | 'unpaid' | 'canceled'
  created: number
  currency: string
  cancel_at_period_end: boolean
  cancel_at: number | null
  canceled_at: number | null
  ended_at: number | null
  schedule: string | null
  latest_invoice: string | null
  metadata: Record<string, string>
  items: { object: 'list'; data: SubscriptionItem[]; has_more: false; url: string }
  discount: { percentOff: number; once: boolean } | null
}

export interface Phase {
  start_date: number
  end_date: number | null
  items: { price: string; quantity: number }[]
}

export interface Schedule {
  id: string
  object: 'subscription_schedule'
  customer: string
  subscription: string | null
  status: 'active' | 'released'
  end_behavior: 'release'
  phases: Phase[]
}

export interface Invoice {
  id: string
  object: 'invoice'
  customer: string
  number: string
  status: 'open' | 'paid' | 'void'
  created: number
  currency: string
  subtotal: number
  total: number
  amount_due: number
  amount_paid: number
  amount_remaining: number
  attempt_count: number
  next_payment_attempt: number | null
  billing_reason: string
  hosted_invoice_url: string
  invoice_pdf: string
  period_start: number
  period_end: number
  parent: { type: 'subscription_details'; subscription_details: { subscription: string } }
  lines: { object: 'list'; data: InvoiceLine[]; has_more: false; url: string }
  status_transitions: { finalized_at: number; paid_at: number | null }
}

export interface InvoiceLine {
  id: string
  object: 'line_item'
  description: string
  amount: number
  quantity: number
}

export interface ServiceEvent {
  id: string
  object: 'event'
  api_version: string
  created: number
  type: string
  livemode: false
  data: { object: unknown }
}
