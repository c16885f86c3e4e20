import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import {
  changeSeats,
  endSubscription,
  getBilling,
  listPlans,
  openPortal,
  previewSeats,
  refreshBilling,
  startCheckout,
} from '../../shared/contracts/billing.ts'
import { getSeats } from '../../shared/contracts/clubs.ts'
import { createSquad, listSquads } from '../../shared/contracts/squads.ts'
import { buildClub } from '../../seed/builders/club.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { buy, giveNewCard } from '../../server/fakes/payments/visitor.ts'
import type { ApiClient } from './harness/api-client.ts'
import { catchMail, deliverMail } from './harness/mail.ts'
import type { MailCatcher } from '../../server/fakes/mail-catcher.ts'
import { startPayingHarness, type PayingHarness } from './harness/payments.ts'

let harness: PayingHarness
let admin: ApiClient
let email: string
let catcher: MailCatcher
beforeAll(async () => {
  catcher = await catchMail()
  harness = await startPayingHarness({ SMTP_URL: catcher.smtpUrl })
})
afterAll(async () => {
  await harness.stop()
  await catcher.stop()
})
beforeEach(async () => {
  const clubId = await buildClub(harness.db, { seats: 0 })
  const person = await buildMember(harness.db, clubId, ['admin', 'coach'])
  email = person.email
  admin = await harness.signedIn(person)
})

async function subscribe(seats: number, number = '4242424242424242', interval: 'month' | 'year' = 'month') {
  const { url } = await admin.call(startCheckout, { body: { interval, seats } })
  await buy(url, { number, second: 'yes' })
  await harness.workOff()
  return admin.call(getBilling)
}

const now = () => admin.call(getBilling)
const newestCustomer = () => Object.keys(harness.payments.books.state.customers).at(-1) ?? ''
const squad = () => ({ body: { name: `Squad ${Math.random()}`, athleteIds: [] } })

describe('buying seats', () => {
  it('shows the prices of the service, and a club that has bought nothing', async () => {
    expect(await admin.call(listPlans)).toEqual({
      plans: [
        { interval: 'month', seat: { amount: 450, currency: 'eur' } },
        { interval: 'year', seat: { amount: 4500, currency: 'eur' } },
      ],
    })
    expect(await now()).toMatchObject({ state: 'granted', sells: true, subscription: null, version: 0 })
    expect(await admin.refusal(openPortal)).toEqual([409, 'subscription-missing'])
  })

  it('gives 20 seats for a card that needs a second step, and the receipt by mail', async () => {
    const bought = await subscribe(20, '4000002500003155')
    expect(bought).toMatchObject({
      state: 'active',
      readsOnly: false,
      subscription: {
        interval: 'month',
        seats: 20,
        periodEnd: '2027-04-01T10:00:00.000Z',
        endsWithPeriod: false,
      },
      nextInvoice: { total: { amount: 9000, currency: 'eur' } },
      invoices: [{ status: 'paid', total: { amount: 9000, currency: 'eur' } }],
    })
    expect(await admin.call(getSeats)).toMatchObject({ paid: 20 })
    const mails = await deliverMail(harness, catcher)
    expect(mails.filter(({ to }) => to === email).map(({ subject }) => subject)).toEqual([
      expect.stringContaining('Receipt'),
    ])
    expect(mails.at(-1)?.text).toContain('€90.00')
  })

  it('sells a year', async () => {
    expect(await subscribe(10, '4242424242424242', 'year')).toMatchObject({
      subscription: { interval: 'year', seats: 10 },
      nextInvoice: { at: expect.stringMatching(/^2028-/), total: { amount: 45_000 } },
    })
  })

  it('sells no second subscription beside a running one', async () => {
    await subscribe(5)
    const body = { interval: 'month', seats: 5 }
    expect(await admin.refusal(startCheckout, { body })).toEqual([409, 'subscription-running'])
  })

  it('shows what was bought also where no event ever came', async () => {
    harness.payments.delivery.hold = true
    const { url } = await admin.call(startCheckout, { body: { interval: 'month', seats: 7 } })
    await buy(url, { number: '4242424242424242' })
    expect(await admin.call(refreshBilling)).toMatchObject({ state: 'active', subscription: { seats: 7 } })
    harness.payments.delivery.hold = false
  })
})

describe('changing the number of seats', () => {
  it('charges more seats at once, as previewed', async () => {
    const { version } = await subscribe(20)
    const shown = await admin.call(previewSeats, { query: { seats: 25 } })
    expect(shown.due.amount).toBeGreaterThan(0)
    const changed = await admin.call(changeSeats, { body: { version, seats: 25, at: shown.at } })
    expect(changed.subscription?.seats).toBe(25)
    expect(changed.invoices[0]).toMatchObject({ status: 'paid', total: shown.due })
    expect(await admin.call(getSeats)).toMatchObject({ paid: 25 })
  })

  it('wants to have shown the amount first, and the newest state', async () => {
    const { version } = await subscribe(20)
    const old = new Date(harness.time.now.getTime() - 2 * 3600 * 1000).toISOString()
    for (const at of [null, old]) {
      const body = { version, seats: 21, at }
      expect(await admin.refusal(changeSeats, { body })).toEqual([400, 'invalid-request'])
    }
    const stale = { version: version + 7, seats: 21, at: harness.time.now.toISOString() }
    expect(await admin.refusal(changeSeats, { body: stale })).toEqual([409, 'stale-version'])
  })

  it('changes nothing where the card is declined', async () => {
    const { version } = await subscribe(20)
    giveNewCard(harness.payments, newestCustomer(), '4000000000000341')
    const body = { version, seats: 30, at: harness.time.now.toISOString() }
    expect(await admin.refusal(changeSeats, { body })).toEqual([402, 'payment-declined'])
    expect((await admin.call(refreshBilling)).subscription?.seats).toBe(20)
  })

  it('takes seats away when the period ends, unless that is taken back', async () => {
    const { version } = await subscribe(20)
    const fewer = await admin.call(changeSeats, { body: { version, seats: 12, at: null } })
    expect(fewer).toMatchObject({
      subscription: { seats: 20, nextSeats: 12 },
      nextInvoice: { total: { amount: 5400 } },
    })
    const back = await admin.call(changeSeats, { body: { version: fewer.version, seats: 20, at: null } })
    expect(back.subscription).toMatchObject({ seats: 20, nextSeats: null })
    await admin.call(changeSeats, { body: { version: back.version, seats: 12, at: null } })
    await harness.advance(31)
    expect((await now()).subscription).toMatchObject({ seats: 12, nextSeats: null })
    expect(await admin.call(getSeats)).toMatchObject({ paid: 12 })
  })
})

describe('a subscription', () => {
  it('ends with its period, and goes on where that is taken back', async () => {
    const { version } = await subscribe(20)
    const ending = await admin.call(endSubscription, { body: { version, ends: true } })
    expect(ending).toMatchObject({
      state: 'active',
      subscription: { endsWithPeriod: true },
      nextInvoice: null,
    })
    const going = await admin.call(endSubscription, { body: { version: ending.version, ends: false } })
    expect(going).toMatchObject({ subscription: { endsWithPeriod: false } })
    await harness.advance(32)
    const renewed = await now()
    expect(renewed).toMatchObject({ state: 'active', invoices: [{ status: 'paid' }, { status: 'paid' }] })
    await admin.call(endSubscription, { body: { version: renewed.version, ends: true } })
    await harness.advance(31)
    expect(await now()).toMatchObject({ state: 'ended', readsOnly: true, subscription: null })
    expect(await admin.refusal(createSquad, squad())).toEqual([402, 'club-reads-only'])
    expect(await subscribe(15)).toMatchObject({
      state: 'active',
      readsOnly: false,
      subscription: { seats: 15 },
    })
    await admin.call(createSquad, squad())
  })

  it('whose renewal is declined has its days of grace, then only reads, and is whole again once it is paid', async () => {
    await subscribe(20, '4000000000000341')
    await admin.call(createSquad, squad())
    await harness.advance(32)
    const late = await now()
    expect(late).toMatchObject({ state: 'past-due', readsOnly: false })
    await admin.call(createSquad, squad())
    await harness.advance(14)
    expect(await now()).toMatchObject({ readsOnly: true, readsOnlyFrom: late.readsOnlyFrom })
    expect(await admin.refusal(createSquad, squad())).toEqual([402, 'club-reads-only'])
    expect((await admin.call(listSquads)).squads).toHaveLength(2)
    const { url } = await admin.call(openPortal)
    await fetch(url, { method: 'POST', body: new URLSearchParams({ number: '4242424242424242' }) })
    await fetch((await now()).invoices[0]?.url ?? '', { method: 'POST' })
    await harness.workOff()
    expect(await now()).toMatchObject({ state: 'active', readsOnly: false, subscription: { seats: 20 } })
    await admin.call(createSquad, squad())
    expect((await admin.call(listSquads)).squads).toHaveLength(3)
  })

  it('that could not be charged is told of at once, before the grace ends, and when it has ended, once each', async () => {
    await subscribe(20, '4000000000000341')
    await deliverMail(harness, catcher)
    const told: string[] = []
    let day = 0
    for (const days of [31, 1, 6, 5, 2, 1]) {
      await harness.advance(days)
      await admin.call(refreshBilling)
      const mails = (await deliverMail(harness, catcher)).filter(({ to }) => to === email)
      day += days
      told.push(...mails.map(({ subject }) => `${day} ${subject.split(' ').at(-1)}`))
    }
    expect(told).toEqual(['31 declined', '38 declined', '43 declined', '45 write'])
  })
})
