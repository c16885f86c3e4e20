import Stripe from 'stripe'
import type { Config } from '../../config/config.ts'
import { ask, signatureInvalid } from './payment-errors.ts'
import type { Interval, PaymentEvent, Payments, Plan } from './payments.ts'
import { chooseSubscription, isoOf, readInvoice, readSubscription } from './read-truth.ts'

/** Keys under which the operator files the two prices of a seat with the service. */
export const priceKeys: Record<Interval, string> = {
  month: 'underfoot_seat_month',
  year: 'underfoot_seat_year',
}

/** As many as a page of ours shows; older ones are in the service's own portal. */
const invoicesKept = 24
/** Older events are refused, so that one that was overheard cannot be played again. The service's own default. */
const toleranceS = 300

type PaymentConfig = Pick<Config, 'stripeKey' | 'stripeWebhookSecret' | 'paymentServiceUrl'>

/** The service's SDK, at the hosted service or, in development and tests, at an address of this machine. */
export function connectStripe(
  { stripeKey, paymentServiceUrl }: PaymentConfig,
  { timeoutMs = 8000 }: { timeoutMs?: number } = {},
): Stripe {
  const local = paymentServiceUrl ? new URL(paymentServiceUrl) : null
  return new Stripe(stripeKey ?? '', {
    maxNetworkRetries: 1,
    timeout: timeoutMs,
    telemetry: false,
    ...(local && { host: local.hostname, port: local.port, protocol: 'http' as const }),
  })
}

/** The payments of the product, through the service's SDK. */
export function stripePayments(config: PaymentConfig, stripe = connectStripe(config)): Payments {
  return {
    async createCustomer({ clubId, name, email }, key) {
      const customer = await ask(
        stripe.customers.create({ name, email, metadata: { club: clubId } }, { idempotencyKey: key }),
      )
      return customer.id
    },

    async plans() {
      const { data } = await ask(stripe.prices.list({ lookup_keys: Object.values(priceKeys), active: true }))
      return data.flatMap(readPlan).sort((a, b) => a.interval.localeCompare(b.interval))
    },

    async openCheckout({ customerId, clubId, priceId, seats, doneUrl, backUrl }, key) {
      const session = await ask(
        stripe.checkout.sessions.create(
          {
            mode: 'subscription',
            customer: customerId,
            line_items: [{ price: priceId, quantity: seats }],
            allow_promotion_codes: true,
            tax_id_collection: { enabled: true },
            // The service asks for both before it lets a known customer give a tax id.
            customer_update: { name: 'auto', address: 'auto' },
            subscription_data: { metadata: { club: clubId } },
            success_url: doneUrl,
            cancel_url: backUrl,
          },
          { idempotencyKey: key },
        ),
      )
      if (!session.url) throw new Error('the service opened a checkout without an address')
      return session.url
    },

    async readCustomer(customerId) {
      const [all, invoices] = await ask(
        Promise.all([
          stripe.subscriptions.list({ customer: customerId, status: 'all', limit: 20 }),
          stripe.invoices.list({ customer: customerId, limit: invoicesKept }),
        ]),
      )
      const one = chooseSubscription(all.data)
      const schedule = one?.schedule
        ? await ask(stripe.subscriptionSchedules.retrieve(idOf(one.schedule)))
        : null
      const subscription = one && readSubscription(one, schedule)
      const renews = subscription?.status === 'active' && !subscription.endsWithPeriod
      return {
        subscription,
        // Drafts have no number yet and may still change.
        invoices: invoices.data.filter(({ status }) => status !== 'draft').map(readInvoice),
        nextInvoice: renews ? await nextInvoice(subscription.id, subscription.scheduleId) : null,
      }
    },

    async previewSeats({ subscription, seats }, atS) {
      const { total, currency } = await ask(
        stripe.invoices.createPreview({
          subscription: subscription.id,
          subscription_details: {
            items: [{ id: subscription.itemId, quantity: seats }],
            proration_behavior: 'always_invoice',
            proration_date: atS,
          },
        }),
      )
      return { amount: total, currency }
    },

    async addSeats({ subscription, seats }, atS, key) {
      await ask(
        stripe.subscriptions.update(
          subscription.id,
          {
            items: [{ id: subscription.itemId, quantity: seats }],
            proration_behavior: 'always_invoice',
            proration_date: atS,
            payment_behavior: 'error_if_incomplete',
          },
          { idempotencyKey: key },
        ),
      )
    },

    async scheduleSeats({ subscription, seats }, key) {
      const id =
        subscription.scheduleId ??
        (
          await ask(
            stripe.subscriptionSchedules.create(
              { from_subscription: subscription.id },
              { idempotencyKey: `${key}-schedule` },
            ),
          )
        ).id
      const [start, end] = [subscription.periodStart, subscription.periodEnd].map(
        (at) => Date.parse(at) / 1000,
      )
      const items = (quantity: number) => [{ price: subscription.priceId, quantity }]
      await ask(
        stripe.subscriptionSchedules.update(
          id,
          {
            end_behavior: 'release',
            proration_behavior: 'none',
            phases: [
              { start_date: start, end_date: end, items: items(subscription.seats) },
              {
                items: items(seats),
                duration: { interval: subscription.interval, interval_count: 1 },
                proration_behavior: 'none',
              },
            ],
          },
          { idempotencyKey: key },
        ),
      )
    },

    async dropSchedule(scheduleId, key) {
      await ask(stripe.subscriptionSchedules.release(scheduleId, {}, { idempotencyKey: key }))
    },

    async endWithPeriod(subscriptionId, ends, key) {
      await ask(
        stripe.subscriptions.update(subscriptionId, { cancel_at_period_end: ends }, { idempotencyKey: key }),
      )
    },

    async openPortal(customerId, returnUrl) {
      return (
        await ask(stripe.billingPortal.sessions.create({ customer: customerId, return_url: returnUrl }))
      ).url
    },

    readEvent(raw, signature, now) {
      try {
        const secret = config.stripeWebhookSecret ?? ''
        return readEvent(
          stripe.webhooks.constructEvent(raw, signature, secret, toleranceS, undefined, now.getTime()),
        )
      } catch (error) {
        if (error instanceof Stripe.errors.StripeSignatureVerificationError) throw signatureInvalid()
        throw error
      }
    },
  }

  async function nextInvoice(subscriptionId: string, scheduleId: string | null) {
    const { created, next_payment_attempt, total, currency } = await ask(
      stripe.invoices.createPreview(scheduleId ? { schedule: scheduleId } : { subscription: subscriptionId }),
    )
    return { at: isoOf(next_payment_attempt ?? created), total: { amount: total, currency } }
  }
}

const idOf = (value: string | { id: string }) => (typeof value === 'string' ? value : value.id)

function readPlan({ id, unit_amount, currency, recurring }: Stripe.Price): Plan[] {
  const interval = recurring?.interval
  if (unit_amount === null || (interval !== 'month' && interval !== 'year')) return []
  return [
    {
      priceId: id,
      interval: interval === 'year' ? 'year' : 'month',
      seat: { amount: unit_amount, currency },
    },
  ]
}

/** Whom an event is about: the customer that its object is, or names. */
function readEvent({ id, type, created, data }: Stripe.Event): PaymentEvent {
  const object = data.object as { id?: string; object: string; customer?: string | { id: string } | null }
  const named = object.object === 'customer' ? object.id : object.customer && idOf(object.customer)
  return { id, type, createdAt: isoOf(created), customerId: named ?? null }
}
