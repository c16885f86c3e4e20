import { z } from 'zod'
import { endpoint, noContent } from './endpoint.ts'
import { Moment, Version } from './fields.ts'
import { limits } from './limits.ts'
import { Money } from './money.ts'

export const Interval = z.enum(['month', 'year'])
export type Interval = z.infer<typeof Interval>

const { min: fewest, max: most } = limits.seats
const seatsSentence = `Give a whole number of seats, ${fewest} to ${most}`
export const SeatCount = z
  .number(seatsSentence)
  .int(seatsSentence)
  .min(fewest, seatsSentence)
  .max(most, seatsSentence)

export const Invoice = z.strictObject({
  id: z.string(),
  number: z.string().nullable(),
  at: Moment,
  total: Money,
  status: z.enum(['open', 'paid', 'other']),
  /** The service's own page of it. */
  url: z.url().nullable(),
})
export type Invoice = z.infer<typeof Invoice>

export const Billing = z.strictObject({
  /** `granted`: seats given by whoever runs this installation, without a subscription. */
  state: z.enum(['granted', 'trial', 'active', 'past-due', 'unpaid', 'ended']),
  /** From this moment on the club only reads, as things stand; null: never. */
  readsOnlyFrom: Moment.nullable(),
  readsOnly: z.boolean(),
  /** Whether there is a payment service to buy from. */
  sells: z.boolean(),
  subscription: z
    .strictObject({
      interval: Interval,
      seats: z.int(),
      /** Seats from the next period on, where they are other than now. */
      nextSeats: z.int().nullable(),
      periodEnd: Moment,
      endsWithPeriod: z.boolean(),
    })
    .nullable(),
  nextInvoice: z.strictObject({ at: Moment, total: Money }).nullable(),
  /** Newest first. */
  invoices: z.array(Invoice),
  /** When this was last read from the payment service. */
  syncedAt: Moment.nullable(),
  version: z.int32().nonnegative(),
})
export type Billing = z.infer<typeof Billing>

const access = ['admin'] as const
/** Money is put in order while a club only reads: that is how it gets out of there. */
const whileReadingOnly = 'allowed' as const
const Address = z.strictObject({ url: z.url() })

export const getBilling = endpoint({ method: 'GET', path: '/api/club/billing', access, response: Billing })

/** What a seat costs, by the service's word. */
export const listPlans = endpoint({
  method: 'GET',
  path: '/api/club/billing/plans',
  access,
  response: z.strictObject({
    plans: z.array(z.strictObject({ interval: Interval, seat: Money })),
  }),
})

/** The first purchase, or a new one after the last has ended: leads to the service's own page. */
export const startCheckout = endpoint({
  method: 'POST',
  path: '/api/club/billing/checkout',
  access,
  whileReadingOnly,
  body: z.strictObject({ interval: Interval, seats: SeatCount }),
  response: Address,
})

/** What more seats cost now, by the service's word, valid for the moment `at`. */
export const previewSeats = endpoint({
  method: 'GET',
  path: '/api/club/billing/preview',
  access,
  query: z.strictObject({ seats: z.coerce.number().pipe(SeatCount) }),
  response: z.strictObject({ seats: z.int(), due: Money, at: Moment }),
})

/** More seats at once, charged as previewed at `at`; fewer from the next period on; the present number takes that back. */
export const changeSeats = endpoint({
  method: 'POST',
  path: '/api/club/billing/seats',
  access,
  whileReadingOnly,
  body: z.strictObject({ version: Version, seats: SeatCount, at: Moment.nullable() }),
  response: Billing,
})

/** Lets the subscription end with its period, or takes that back. */
export const endSubscription = endpoint({
  method: 'POST',
  path: '/api/club/billing/end',
  access,
  whileReadingOnly,
  body: z.strictObject({ version: Version, ends: z.boolean() }),
  response: Billing,
})

/** Cards and invoices, on the service's own page. */
export const openPortal = endpoint({
  method: 'POST',
  path: '/api/club/billing/portal',
  access,
  whileReadingOnly,
  response: Address,
})

/** Reads the state anew from the service, as after coming back from its page. */
export const refreshBilling = endpoint({
  method: 'POST',
  path: '/api/club/billing/refresh',
  access,
  whileReadingOnly,
  response: Billing,
  repeat: 'natural',
})

/** Events of the payment service; the body is taken as it came, because its bytes are signed. */
export const takePaymentEvent = endpoint({
  method: 'POST',
  path: '/api/payments/events',
  access: 'public',
  body: z.unknown(),
  response: noContent,
  repeat: 'natural',
})
