import type {
  Billing,
  changeSeats,
  endSubscription,
  previewSeats,
} from '../../../shared/contracts/billing.ts'
import type { BodyOf, ResponseOf } from '../../../shared/contracts/endpoint.ts'
import type { Caller } from '../../http/caller.ts'
import { invalidRequest } from '../../http/errors.ts'
import type { Payments, SubscriptionTruth } from '../../integrations/payments/payments.ts'
import { record } from '../audit/audit.service.ts'
import { endsSoon, invoiceOpen } from './billing.errors.ts'
import { refresh, requirePayments, requireRunning, type BillingDeps } from './billing.service.ts'

/** An amount that was shown holds for so long; then it is shown anew. */
const previewHoldsMs = 60 * 60 * 1000

/** What more seats cost for the rest of the period, if they are taken as from this moment. */
export async function preview(
  deps: BillingDeps,
  ctx: Caller,
  seats: number,
): Promise<ResponseOf<typeof previewSeats>> {
  const payments = requirePayments(deps)
  const subscription = await requireRunning(deps, ctx, null)
  const atS = Math.floor(deps.clock().getTime() / 1000)
  const due = await payments.previewSeats({ subscription, seats }, atS)
  return { seats, due, at: new Date(atS * 1000).toISOString() }
}

/** More seats now, fewer from the next period on, or, with the present number, no scheduled change any more. */
export async function setSeats(
  deps: BillingDeps,
  ctx: Caller,
  { version, seats, at }: BodyOf<typeof changeSeats>,
  key: string,
): Promise<Billing> {
  const payments = requirePayments(deps)
  const subscription = await requireRunning(deps, ctx, version)
  if (subscription.status !== 'active') throw invoiceOpen()
  if (subscription.endsWithPeriod) throw endsSoon()
  if (seats > subscription.seats) await addSeats(deps, payments, subscription, seats, at, key)
  else if (seats < subscription.seats) await payments.scheduleSeats({ subscription, seats }, key)
  else await dropSchedule(payments, subscription, key)
  await note(deps, ctx, 'billing.seats', { from: subscription.seats, to: seats })
  return refresh(deps, ctx)
}

async function addSeats(
  { clock }: BillingDeps,
  payments: Payments,
  subscription: SubscriptionTruth,
  seats: number,
  at: string | null,
  key: string,
): Promise<void> {
  const age = at === null ? Number.NaN : clock().getTime() - Date.parse(at)
  if (!(age > -60_000 && age < previewHoldsMs)) {
    throw invalidRequest('Look at the amount due first; what was shown is too old.', {
      at: 'Show the amount anew',
    })
  }
  await dropSchedule(payments, subscription, `${key}-drop`)
  await payments.addSeats({ subscription, seats }, Date.parse(at ?? '') / 1000, key)
}

/** Lets the subscription end with its period, or takes that back. */
export async function setEnding(
  deps: BillingDeps,
  ctx: Caller,
  { version, ends }: BodyOf<typeof endSubscription>,
  key: string,
): Promise<Billing> {
  const payments = requirePayments(deps)
  const subscription = await requireRunning(deps, ctx, version)
  if (ends) await dropSchedule(payments, subscription, `${key}-drop`)
  await payments.endWithPeriod(subscription.id, ends, key)
  await note(deps, ctx, ends ? 'billing.end' : 'billing.resume')
  return refresh(deps, ctx)
}

async function dropSchedule(
  payments: Payments,
  { scheduleId }: SubscriptionTruth,
  key: string,
): Promise<void> {
  if (scheduleId) await payments.dropSchedule(scheduleId, key)
}

const note = ({ db }: BillingDeps, ctx: Caller, action: string, detail: Record<string, unknown> = {}) =>
  db.inClub(ctx, (tx) => record(tx, ctx, action, 'club', ctx.clubId, detail))
