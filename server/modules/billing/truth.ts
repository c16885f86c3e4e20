import { z } from 'zod'
import { Money } from '../../../shared/contracts/money.ts'
import { Interval } from '../../../shared/contracts/billing.ts'
import type { CustomerTruth } from '../../integrations/payments/payments.ts'

const SubscriptionTruth = z.object({
  id: z.string(),
  itemId: z.string(),
  priceId: z.string(),
  scheduleId: z.string().nullable(),
  status: z.enum(['active', 'past-due', 'unpaid', 'canceled', 'incomplete']),
  interval: Interval,
  seats: z.int(),
  nextSeats: z.int().nullable(),
  periodStart: z.string(),
  periodEnd: z.string(),
  endsWithPeriod: z.boolean(),
  endedAt: z.string().nullable(),
})
const Truth = z.object({
  subscription: SubscriptionTruth.nullable(),
  invoices: z.array(
    z.object({
      id: z.string(),
      number: z.string().nullable(),
      at: z.string(),
      total: Money,
      status: z.enum(['open', 'paid', 'other']),
      url: z.string().nullable(),
      nextTryAt: z.string().nullable(),
    }),
  ),
  nextInvoice: z.object({ at: z.string(), total: Money }).nullable(),
})

/** The copy as it was kept; null where the club never bought anything. */
export const readTruth = (kept: unknown): CustomerTruth | null => (kept === null ? null : Truth.parse(kept))
