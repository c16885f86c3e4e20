import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import type {
  Card,
  CheckoutSession,
  Customer,
  Invoice,
  Price,
  Product,
  PromotionCode,
  Schedule,
  ServiceEvent,
  Subscription,
} from './shapes.ts'

type Rows<T> = Record<string, T>

/** Everything the local payment service knows; kept in one file, so that a new start goes on from there. */
export interface PaymentState {
  /** Seconds that its clock was moved on beyond the wall's. */
  aheadS: number
  /** The last number given; ids count up, so that the same acts make the same ids. */
  counter: number
  customers: Rows<Customer>
  cards: Rows<Card>
  products: Rows<Product>
  prices: Rows<Price>
  promotions: PromotionCode[]
  sessions: Rows<CheckoutSession>
  portals: Rows<{ customer: string; returnUrl: string }>
  subscriptions: Rows<Subscription>
  schedules: Rows<Schedule>
  invoices: Rows<Invoice>
  /** Not delivered yet, oldest first. */
  undelivered: ServiceEvent[]
  /** Idempotency key → the request it came with and the answer it got. */
  answers: Rows<{ request: string; status: number; body: unknown }>
}

const empty = (): PaymentState => ({
  aheadS: 0,
  counter: 0,
  customers: {},
  cards: {},
  products: {},
  prices: {},
  promotions: [],
  sessions: {},
  portals: {},
  subscriptions: {},
  schedules: {},
  invoices: {},
  undelivered: [],
  answers: {},
})

export interface StateFile {
  state: PaymentState
  save(): void
}

/** Reads the file, where there is one; `save` replaces it whole, so that a crash leaves the old or the new. */
export function openState(file: string | undefined): StateFile {
  const kept = file && existsSync(file) ? (JSON.parse(readFileSync(file, 'utf8')) as PaymentState) : {}
  const state = { ...empty(), ...kept }
  return {
    state,
    save() {
      if (!file) return
      writeFileSync(`${file}.new`, JSON.stringify(state), { mode: 0o600 })
      renameSync(`${file}.new`, file)
    },
  }
}
