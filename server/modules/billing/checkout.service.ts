import type { listPlans, startCheckout } from '../../../shared/contracts/billing.ts'
import type { BodyOf, ResponseOf } from '../../../shared/contracts/endpoint.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { paymentsOff } from '../../integrations/payments/payment-errors.ts'
import type { Payments } from '../../integrations/payments/payments.ts'
import { record } from '../audit/audit.service.ts'
import { subscriptionRunning } from './billing.errors.ts'
import { findBuyer, findCopy, findCustomer, insertCustomer } from './billing.queries.ts'
import { requireCustomer, requirePayments, type BillingDeps } from './billing.service.ts'
import { syncClub } from './sync.service.ts'

/** What a seat costs, asked of the service each time: the price shown is the price charged. */
export async function readPlans(deps: Pick<Deps, 'config'>): Promise<ResponseOf<typeof listPlans>> {
  const plans = await requirePayments(deps).plans()
  return { plans: plans.map(({ interval, seat }) => ({ interval, seat })) }
}

/**
 * Opens the service's own page for a purchase. Whether a subscription runs is asked of the service itself, so that
 * a copy that is behind does not sell a second one.
 */
export async function openCheckout(
  deps: BillingDeps,
  ctx: Caller,
  { interval, seats }: BodyOf<typeof startCheckout>,
  key: string,
): Promise<{ url: string }> {
  const payments = requirePayments(deps)
  const customerId = await ensureCustomer(deps, payments, ctx)
  await syncClub(deps, ctx.clubId)
  const { truth } = await deps.db.inClub(ctx, (tx) => findCopy(tx, ctx.clubId))
  const status = truth?.subscription?.status
  if (status && status !== 'canceled' && status !== 'incomplete') throw subscriptionRunning()
  const plan = (await payments.plans()).find((one) => one.interval === interval)
  if (!plan) throw paymentsOff()
  const page = `${deps.config.appUrl}/club/billing`
  const order = { customerId, clubId: ctx.clubId, priceId: plan.priceId, seats }
  const url = await payments.openCheckout({ ...order, doneUrl: `${page}?checkout=done`, backUrl: page }, key)
  await deps.db.inClub(ctx, (tx) =>
    record(tx, ctx, 'billing.checkout', 'club', ctx.clubId, { interval, seats }),
  )
  return { url }
}

export async function openPortal(deps: BillingDeps, ctx: Caller): Promise<{ url: string }> {
  const payments = requirePayments(deps)
  const customerId = await requireCustomer(deps, ctx)
  return { url: await payments.openPortal(customerId, `${deps.config.appUrl}/club/billing?portal=back`) }
}

/** The club as a customer of the service: made once, whoever asks first. */
async function ensureCustomer({ db }: BillingDeps, payments: Payments, ctx: Caller): Promise<string> {
  const { clubId } = ctx
  const known = await db.inIdentity((tx) => findCustomer(tx, clubId))
  if (known) return known
  const buyer = await db.inClub(ctx, (tx) => findBuyer(tx, clubId, ctx.personId))
  const made = await payments.createCustomer({ clubId, ...buyer }, `customer-${clubId}-${ctx.personId}`)
  return db.inIdentity(async (tx) => {
    await insertCustomer(tx, clubId, made)
    return (await findCustomer(tx, clubId)) ?? made
  })
}
