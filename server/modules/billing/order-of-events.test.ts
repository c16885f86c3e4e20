import { beforeAll, describe, expect, it } from 'vitest'
import { seededRandom } from '../../../seed/synthetic/random.ts'
import type { PaymentService } from '../../fakes/payments/payment-service.ts'
import { startPaymentService } from '../../fakes/payments/service.ts'
import { buy, giveNewCard } from '../../fakes/payments/visitor.ts'
import { payInvoice } from '../../fakes/payments/portal.ts'
import type { CustomerTruth, Payments } from '../../integrations/payments/payments.ts'
import { connectStripe, stripePayments } from '../../integrations/payments/stripe-payments.ts'
import { keepNewest } from './keep-newest.ts'
import { standingOf } from './standing.ts'

/** What the service's state was when it told of each event of the month, in the order of the events. */
let month: CustomerTruth[]
beforeAll(async () => {
  month = await recordMonth()
})

/** A month and a half of a club: bought, grown, to shrink, declined, tried again, paid, to end, going on. */
async function recordMonth(): Promise<CustomerTruth[]> {
  const startsAtS = Date.parse('2027-03-01T10:00:00Z') / 1000
  const service = await startPaymentService({ port: 0, webhookSecret: 'whsec_recorded', startsAtS })
  const config = { stripeKey: 'sk_test_recorded', stripeWebhookSecret: 'x', paymentServiceUrl: service.url }
  const payments = stripePayments(config, connectStripe(config))
  const customerId = await payments.createCustomer(
    { clubId: 'c', name: 'Club', email: 'a@example.org' },
    'k0-customer',
  )
  const states: CustomerTruth[] = []
  for (const act of story(service, payments, customerId)) {
    await act()
    const told = service.books.state.undelivered.splice(0).length
    const state = await payments.readCustomer(customerId)
    for (let n = 0; n < told; n++) states.push(state)
  }
  await service.stop()
  return states
}

function story(service: PaymentService, payments: Payments, customerId: string): (() => Promise<unknown>)[] {
  const running = async () => {
    const { subscription } = await payments.readCustomer(customerId)
    if (!subscription) throw new Error('nothing runs')
    return subscription
  }
  const atS = () => service.books.now()
  return [
    async () => {
      const [plan] = await payments.plans()
      const order = { customerId, clubId: 'c', priceId: plan?.priceId ?? '', seats: 20 }
      const url = await payments.openCheckout(
        { ...order, doneUrl: 'http://d', backUrl: 'http://b' },
        'k1-checkout',
      )
      await buy(url, { number: '4242424242424242' })
    },
    () => service.advance(10),
    async () => payments.addSeats({ subscription: await running(), seats: 25 }, atS(), 'k2-more'),
    async () => payments.scheduleSeats({ subscription: await running(), seats: 22 }, 'k3-fewer'),
    async () => giveNewCard(service, customerId, '4000000000000341'),
    () => service.advance(21),
    () => service.advance(3),
    () => service.advance(5),
    async () => giveNewCard(service, customerId, '4242424242424242'),
    async () => payInvoice(service.books, (await payments.readCustomer(customerId)).invoices[0]?.id ?? ''),
    async () => payments.endWithPeriod((await running()).id, true, 'k4-end'),
    async () => payments.endWithPeriod((await running()).id, false, 'k5-on'),
  ]
}

interface Kept {
  version: number
  state: CustomerTruth | null
}

/** One copy, and what a sync does to it; `turn` waits until this step may go on. */
function copyOf(truthNow: () => CustomerTruth, fenced = true) {
  const copy: Kept = { version: 0, state: null }
  const sync = (turn: () => Promise<void>) =>
    keepNewest<Kept, CustomerTruth>({
      read: async () => (await turn(), { ...copy }),
      fetch: async () => (await turn(), truthNow()),
      write: async ({ version }, state) => {
        await turn()
        if (fenced && copy.version !== version) return false
        Object.assign(copy, { version: copy.version + 1, state })
        return true
      },
    })
  return { copy, sync }
}

/** Workers that sync at once. */
const mostAtWork = 3

/**
 * The month as it might have gone: events are delivered late, some twice or three times, and the syncs that they
 * cause are at work at once. At each step chance says what happens next. Returns the copy at the end.
 */
async function live(seed: number, fenced = true): Promise<CustomerTruth | null> {
  const { next: random } = seededRandom(seed)
  const pick = (n: number) => Math.floor(random() * n)
  // Whoever has waited long is on a slow machine, and is likely to wait on.
  const newestFirst = (n: number) => Math.floor(random() ** 0.3 * n)
  let told = 0
  const { copy, sync } = copyOf(() => month[Math.max(0, told - 1)] as CustomerTruth, fenced)
  const undelivered: number[] = []
  const waiting: (() => void)[] = []
  const atWork = new Set<Promise<void>>()
  const turn = () => new Promise<void>((go) => void waiting.push(go))
  while (told < month.length || undelivered.length > 0 || atWork.size > 0) {
    const chance = random()
    if (told < month.length && chance < 0.08) {
      undelivered.push(...Array<number>(1 + pick(3)).fill(told))
      told += 1
    } else if (undelivered.length > 0 && atWork.size < mostAtWork && chance < 0.5) {
      undelivered.splice(pick(undelivered.length), 1)
      const running = sync(turn).finally(() => atWork.delete(running))
      atWork.add(running)
    } else if (waiting.length > 0) waiting.splice(newestFirst(waiting.length), 1)[0]?.()
    // What was let go on goes on to its next turn, or to its end.
    for (let n = 0; n < 6; n++) await Promise.resolve()
  }
  return copy.state
}

const permutations = (items: number[]): number[][] =>
  items.length < 2
    ? [items]
    : items.flatMap((item, i) => permutations(items.toSpliced(i, 1)).map((rest) => [item, ...rest]))

describe('a month of events', () => {
  it('is one with something of everything in it', () => {
    const met = new Set(month.map((truth) => standingOf(truth, null, new Date('2027-04-10')).state))
    expect([...met]).toEqual(['active', 'past-due'])
    expect(month.length).toBeGreaterThan(20)
    expect(month.at(-1)?.subscription).toMatchObject({ status: 'active', seats: 22, endsWithPeriod: false })
  })

  it('ends in the same state in 1,000 orders, with repeats and syncs at work at once', async () => {
    for (let seed = 1; seed <= 1000; seed++) {
      expect(await live(seed), `order ${seed}`).toBe(month.at(-1))
    }
  })

  it('would end in an older state in some of them, were older states not thrown away', async () => {
    let older = 0
    for (let seed = 1; seed <= 200; seed++) if ((await live(seed, false)) !== month.at(-1)) older += 1
    expect(older).toBeGreaterThan(0)
  })

  it('ends in the same state in every order of any five neighbours', async () => {
    const atOnce = () => Promise.resolve()
    for (let first = 0; first + 5 <= month.length; first++) {
      const five = [first, first + 1, first + 2, first + 3, first + 4]
      for (const order of permutations(five)) {
        let told = 0
        const { copy, sync } = copyOf(() => month[told] as CustomerTruth)
        for (const event of order) {
          // The service is at least as far as the event that it tells of.
          told = Math.max(told, event)
          await sync(atOnce)
        }
        expect(copy.state, order.join()).toBe(month[first + 4])
      }
    }
  })
})
