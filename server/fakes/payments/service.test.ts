import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { connectStripe, stripePayments } from '../../integrations/payments/stripe-payments.ts'
import type { Payments, SubscriptionTruth } from '../../integrations/payments/payments.ts'
import { buy, giveNewCard } from './visitor.ts'
import type { PaymentService } from './payment-service.ts'
import { startPaymentService } from './service.ts'

const webhookSecret = 'whsec_of_the_tests'
const startsAtS = Date.parse('2027-03-01T10:00:00Z') / 1000
let service: PaymentService
let payments: Payments
let customerId: string

const connect = () => {
  const config = {
    stripeKey: 'sk_test_local',
    stripeWebhookSecret: webhookSecret,
    paymentServiceUrl: service.url,
  }
  return { config, stripe: connectStripe(config, { timeoutMs: 300 }) }
}

beforeEach(async () => {
  service = await startPaymentService({ port: 0, webhookSecret, startsAtS })
  const { config, stripe } = connect()
  payments = stripePayments(config, stripe)
  customerId = await payments.createCustomer(
    { clubId: 'c', name: 'Club', email: 'a@example.org' },
    'key-of-customer',
  )
})
afterEach(() => service.stop())

async function checkout(seats: number, interval: 'month' | 'year' = 'month'): Promise<string> {
  const plan = (await payments.plans()).find((one) => one.interval === interval)
  const order = { customerId, clubId: 'c', priceId: plan?.priceId ?? '', seats }
  return payments.openCheckout(
    { ...order, doneUrl: 'http://127.0.0.1/done', backUrl: 'http://127.0.0.1/back' },
    `key-${seats}`,
  )
}

async function running(): Promise<SubscriptionTruth> {
  const { subscription } = await payments.readCustomer(customerId)
  if (!subscription) throw new Error('nothing runs')
  return subscription
}

describe('the local payment service, spoken to by the SDK', () => {
  it('sells seats, renews them a month later and keeps the books', async () => {
    await buy(await checkout(20), { number: '4242 4242 4242 4242', taxId: 'ATU00000000' })
    expect(await running()).toMatchObject({
      status: 'active',
      seats: 20,
      periodEnd: '2027-04-01T10:00:00.000Z',
    })
    await service.advance(31)
    const { subscription, invoices, nextInvoice } = await payments.readCustomer(customerId)
    expect(subscription?.periodEnd).toBe('2027-05-01T10:00:00.000Z')
    expect(invoices.map(({ status, total }) => [status, total.amount])).toEqual([
      ['paid', 9000],
      ['paid', 9000],
    ])
    expect(nextInvoice).toEqual({ at: '2027-05-01T10:00:00.000Z', total: { amount: 9000, currency: 'eur' } })
  })

  it('sells a year, with a promotion code that takes something off the first invoice alone', async () => {
    await buy(await checkout(10, 'year'), { number: '4242424242424242', promotion: 'first20' })
    const { invoices, nextInvoice } = await payments.readCustomer(customerId)
    expect(invoices[0]?.total.amount).toBe(36_000)
    expect(nextInvoice).toMatchObject({ at: '2028-03-01T10:00:00.000Z', total: { amount: 45_000 } })
  })

  it('asks for a second step, and sells nothing where it is refused or the card is declined', async () => {
    const url = await checkout(5)
    expect(await buy(url, { number: '4000000000000002' })).toContain('declined')
    expect(await buy(url, { number: '4000002500003155', second: 'no' })).toContain('refused')
    expect((await payments.readCustomer(customerId)).subscription).toBeNull()
    await buy(url, { number: '4000002500003155', second: 'yes' })
    expect(await running()).toMatchObject({ status: 'active', seats: 5 })
  })

  it('charges more seats at once exactly as previewed, and refuses them whole with a declined card', async () => {
    await buy(await checkout(20), { number: '4242424242424242' })
    await service.advance(15)
    const subscription = await running()
    const atS = startsAtS + 15 * 24 * 3600
    const due = await payments.previewSeats({ subscription, seats: 30 }, atS)
    // 16 of the 31 days of March are left: 46.45 back for twenty seats, 69.68 for thirty.
    expect(due).toEqual({ amount: 6968 - 4645, currency: 'eur' })
    await payments.addSeats({ subscription, seats: 30 }, atS, 'key-of-more')
    const { invoices } = await payments.readCustomer(customerId)
    expect(invoices[0]).toMatchObject({ status: 'paid', total: due })
    giveNewCard(service, customerId, '4000000000000341')
    const more = payments.addSeats({ subscription: await running(), seats: 40 }, atS, 'key-of-too-many')
    await expect(more).rejects.toMatchObject({ code: 'payment-declined', status: 402 })
    expect((await running()).seats).toBe(30)
  })

  it('takes seats away when the period ends, unless that is taken back', async () => {
    await buy(await checkout(20), { number: '4242424242424242' })
    await payments.scheduleSeats({ subscription: await running(), seats: 12 }, 'key-of-fewer')
    const { subscription, nextInvoice } = await payments.readCustomer(customerId)
    expect(subscription).toMatchObject({ seats: 20, nextSeats: 12 })
    expect(nextInvoice?.total.amount).toBe(12 * 450)
    await payments.dropSchedule(subscription?.scheduleId ?? '', 'key-of-dropping')
    expect(await running()).toMatchObject({ seats: 20, nextSeats: null })
    await payments.scheduleSeats({ subscription: await running(), seats: 12 }, 'key-of-fewer-again')
    await service.advance(31)
    expect(await running()).toMatchObject({ seats: 12, nextSeats: null, scheduleId: null })
  })

  it('tries a declined renewal four times, gives up, and is active again once it is paid', async () => {
    await buy(await checkout(20), { number: '4000000000000341' })
    await service.advance(31)
    expect(await running()).toMatchObject({ status: 'past-due' })
    await service.advance(15)
    expect(await running()).toMatchObject({ status: 'unpaid' })
    const open = (await payments.readCustomer(customerId)).invoices[0]
    expect(open).toMatchObject({ status: 'open', nextTryAt: null })
    giveNewCard(service, customerId, '4242424242424242')
    await fetch(`${service.url}/invoices/${open?.id}`, { method: 'POST' })
    expect(await running()).toMatchObject({ status: 'active', seats: 20 })
  })

  it('ends with the period where asked to, or goes on where that is taken back', async () => {
    await buy(await checkout(20), { number: '4242424242424242' })
    const { id } = await running()
    await payments.endWithPeriod(id, true, 'key-of-ending')
    expect(await running()).toMatchObject({ status: 'active', endsWithPeriod: true })
    await payments.endWithPeriod(id, false, 'key-of-going-on')
    await service.advance(31)
    expect(await running()).toMatchObject({ status: 'active', endsWithPeriod: false })
    await payments.endWithPeriod(id, true, 'key-of-ending-again')
    await service.advance(31)
    expect(await running()).toMatchObject({ status: 'canceled', endedAt: '2027-05-01T10:00:00.000Z' })
  })

  it('does once what is sent twice with one key, also where the first answer never came', async () => {
    service.faults.push({ kind: 'time-out', of: 'POST /v1/customers' })
    const club = { clubId: 'd', name: 'Other', email: 'b@example.org' }
    const id = await payments.createCustomer(club, 'key-of-other')
    expect(await payments.createCustomer(club, 'key-of-other')).toBe(id)
    expect(Object.keys(service.books.state.customers)).toHaveLength(2)
    const another = payments.createCustomer({ ...club, name: 'Changed' }, 'key-of-other')
    await expect(another).rejects.toMatchObject({ code: 'payments-away' })
  })

  it('fails on demand, which is told apart from a refusal', async () => {
    service.faults.push({ kind: 'error', of: '/v1/prices' }, { kind: 'error', of: '/v1/prices' })
    await expect(payments.plans()).rejects.toMatchObject({ code: 'payments-away', status: 503 })
    expect(await payments.plans()).toHaveLength(2)
  })

  it('refuses calls that the product is not known to make, and wrong keys', async () => {
    const { stripe } = connect()
    await expect(stripe.refunds.list()).rejects.toMatchObject({ statusCode: 404 })
    const stranger = connectStripe({ ...connect().config, stripeKey: 'nobody at all' })
    await expect(stranger.prices.list()).rejects.toMatchObject({ statusCode: 401 })
  })
})

describe('what the local payment service keeps', () => {
  it('survives a new start', async () => {
    const folder = mkdtempSync(join(tmpdir(), 'payments-'))
    const options = { port: 0, webhookSecret, startsAtS, file: join(folder, 'payments.json') }
    const first = await startPaymentService(options)
    await first.advance(3)
    await first.stop()
    const second = await startPaymentService(options)
    expect(second.books.now()).toBe(startsAtS + 3 * 24 * 3600)
    expect(Object.keys(second.books.state.prices)).toHaveLength(2)
    await second.stop()
    rmSync(folder, { recursive: true })
  })
})
