import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { getBilling, startCheckout, takePaymentEvent } from '../../shared/contracts/billing.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { sign } from '../../server/fakes/payments/delivery.ts'
import { buy } from '../../server/fakes/payments/visitor.ts'
import { sendNightly } from '../../server/jobs/nightly.ts'
import type { ApiClient } from './harness/api-client.ts'
import { refusalOf } from './harness/api-client.ts'
import { startPayingHarness, type PayingHarness } from './harness/payments.ts'

let harness: PayingHarness
let admin: ApiClient
beforeAll(async () => {
  harness = await startPayingHarness()
})
afterAll(() => harness.stop())
beforeEach(async () => {
  const clubId = await buildClub(harness.db, { seats: 0 })
  admin = await harness.signedIn(await buildMember(harness.db, clubId, ['admin']))
})

const nowS = () => Math.floor(harness.time.now.getTime() / 1000)
const eventOf = (id: string, customer: string) =>
  JSON.stringify({
    id,
    object: 'event',
    type: 'invoice.paid',
    created: nowS(),
    data: { object: { object: 'invoice', id: 'in_1', customer } },
  })
const deliver = (body: string, signature: string) =>
  harness
    .client()
    .agent.post(takePaymentEvent.path)
    .set({ 'Content-Type': 'application/json', 'Stripe-Signature': signature })
    .send(body)

async function jobsWaiting(): Promise<number> {
  const { rows } = await harness.workerDeps.db.pool.query<{ n: number }>(
    `select count(*)::int as n from pgboss.job where name = 'sync-billing' and state = 'created'`,
  )
  return rows[0]?.n ?? 0
}

async function buySeats(seats: number): Promise<string> {
  const { url } = await admin.call(startCheckout, { body: { interval: 'month', seats } })
  await buy(url, { number: '4242424242424242' })
  return Object.keys(harness.payments.books.state.customers).at(-1) ?? ''
}

describe('an event of the payment service', () => {
  it('is refused with a signature that is wrong, of another body, or older than five minutes', async () => {
    const body = eventOf('evt_signed', 'cus_1')
    const { webhookSecret } = harness
    for (const [sent, signature] of [
      [body, 'nonsense'],
      [body, ''],
      [body, sign(body, 'another secret', nowS())],
      [body.replace('cus_1', 'cus_2'), sign(body, webhookSecret, nowS())],
      [body, sign(body, webhookSecret, nowS() - 301)],
    ] as const) {
      expect(refusalOf(await deliver(sent, signature))).toEqual([400, 'signature-invalid'])
    }
    await deliver(body, sign(body, webhookSecret, nowS() - 299)).expect(204)
  })

  it('about a customer that is nobody’s is taken, and logged', async () => {
    const body = eventOf('evt_nobody', 'cus_of_nobody')
    await deliver(body, sign(body, harness.webhookSecret, nowS())).expect(204)
    expect(harness.log.filter((line) => line.includes('evt_nobody'))).toHaveLength(1)
    expect(harness.log.at(-1)).not.toContain('"level":50')
  })

  it('that comes twice is stored once and worked once', async () => {
    const customer = await buySeats(5)
    await harness.workOff()
    const body = eventOf('evt_twice', customer)
    for (let n = 0; n < 3; n++) await deliver(body, sign(body, harness.webhookSecret, nowS())).expect(204)
    expect(await jobsWaiting()).toBe(1)
    await harness.workOff()
  })

  it('that never came is made up for at night, once a night', async () => {
    harness.payments.delivery.hold = true
    await buySeats(9)
    harness.payments.books.state.undelivered.length = 0
    harness.payments.delivery.hold = false
    expect(await admin.call(getBilling)).toMatchObject({ state: 'granted' })
    await sendNightly(harness.workerDeps)
    await harness.workOff()
    expect(await admin.call(getBilling)).toMatchObject({ state: 'active', subscription: { seats: 9 } })
    await sendNightly(harness.workerDeps)
    expect(await jobsWaiting()).toBe(0)
  })

  it('in reverse order and twice ends in the same state as in order', async () => {
    const { delivery } = harness.payments
    Object.assign(delivery, { hold: true })
    await buySeats(6)
    Object.assign(delivery, { hold: false, reversed: true, twice: true })
    await harness.workOff()
    Object.assign(delivery, { reversed: false, twice: false })
    expect(await admin.call(getBilling)).toMatchObject({ state: 'active', subscription: { seats: 6 } })
  })
})
