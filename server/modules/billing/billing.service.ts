import type { Billing } from '../../../shared/contracts/billing.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { staleVersion } from '../../http/errors.ts'
import { paymentsOff } from '../../integrations/payments/payment-errors.ts'
import type { Payments, SubscriptionTruth } from '../../integrations/payments/payments.ts'
import { paymentsOf } from '../../integrations/payments/payments-of.ts'
import { subscriptionMissing } from './billing.errors.ts'
import { findCopy, findCustomer, type Copy } from './billing.queries.ts'
import { standingOf } from './standing.ts'
import { syncClub } from './sync.service.ts'

export type BillingDeps = Pick<Deps, 'config' | 'db' | 'clock'>

/** How the club stands with its seats and its money, from the copy. */
export async function readBilling(deps: BillingDeps, ctx: Caller): Promise<Billing> {
  const copy = await deps.db.inClub(ctx, (tx) => findCopy(tx, ctx.clubId))
  return describe(copy, deps)
}

/** The same, after asking the payment service. */
export async function refresh(deps: BillingDeps, ctx: Caller): Promise<Billing> {
  await syncClub(deps, ctx.clubId)
  return readBilling(deps, ctx)
}

function describe({ truth, trialEndsAt, syncedAt, version }: Copy, { config, clock }: BillingDeps): Billing {
  const now = clock()
  const { state, readsOnlyFrom } = standingOf(truth, trialEndsAt, now)
  const runs = state === 'active' || state === 'past-due' || state === 'unpaid'
  return {
    state,
    readsOnlyFrom: readsOnlyFrom?.toISOString() ?? null,
    readsOnly: readsOnlyFrom !== null && readsOnlyFrom <= now,
    sells: paymentsOf(config) !== null,
    subscription: runs && truth?.subscription ? shown(truth.subscription) : null,
    nextInvoice: truth?.nextInvoice ?? null,
    invoices: (truth?.invoices ?? []).map(({ nextTryAt: _, ...invoice }) => invoice),
    syncedAt: syncedAt?.toISOString() ?? null,
    version,
  }
}

const shown = ({ interval, seats, nextSeats, periodEnd, endsWithPeriod }: SubscriptionTruth) => ({
  interval,
  seats,
  nextSeats,
  periodEnd,
  endsWithPeriod,
})

/** The payment service; a 503 where none is set up. */
export function requirePayments({ config }: Pick<Deps, 'config'>): Payments {
  const payments = paymentsOf(config)
  if (!payments) throw paymentsOff()
  return payments
}

/** The running subscription as it stands in the copy, for whoever changes it; 409 where they saw an older one. */
export async function requireRunning(
  deps: BillingDeps,
  ctx: Caller,
  version: number | null,
): Promise<SubscriptionTruth> {
  const copy = await deps.db.inClub(ctx, (tx) => findCopy(tx, ctx.clubId))
  if (version !== null && copy.version !== version) throw staleVersion(describe(copy, deps))
  const subscription = copy.truth?.subscription
  if (!subscription || subscription.status === 'canceled' || subscription.status === 'incomplete') {
    throw subscriptionMissing()
  }
  return subscription
}

/** The club as a customer of the service; a 409 where it never bought anything. */
export async function requireCustomer({ db }: Pick<Deps, 'db'>, ctx: Caller): Promise<string> {
  const customerId = await db.inIdentity((tx) => findCustomer(tx, ctx.clubId))
  if (!customerId) throw subscriptionMissing()
  return customerId
}
