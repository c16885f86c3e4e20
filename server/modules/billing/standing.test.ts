import { describe, expect, it } from 'vitest'
import type { CustomerTruth, InvoiceTruth, SubscriptionTruth } from '../../integrations/payments/payments.ts'
import { noticesDue } from './notices.ts'
import { standingOf } from './standing.ts'

const now = new Date('2027-04-10T00:00:00Z')
const subscription: SubscriptionTruth = {
  id: 'sub',
  itemId: 'si',
  priceId: 'price',
  scheduleId: null,
  status: 'active',
  interval: 'month',
  seats: 20,
  nextSeats: null,
  periodStart: '2027-04-01T00:00:00Z',
  periodEnd: '2027-05-01T00:00:00Z',
  endsWithPeriod: false,
  endedAt: null,
}
const invoice = (id: string, at: string, status: InvoiceTruth['status'], amount = 9000): InvoiceTruth => ({
  id,
  number: id,
  at,
  total: { amount, currency: 'eur' },
  status,
  url: null,
  nextTryAt: null,
})
const truth = (change: Partial<SubscriptionTruth>, invoices: InvoiceTruth[] = []): CustomerTruth => ({
  subscription: { ...subscription, ...change },
  invoices,
  nextInvoice: null,
})
const isoOf = (...args: Parameters<typeof standingOf>) => {
  const { state, readsOnlyFrom, seats } = standingOf(...args)
  return [state, readsOnlyFrom?.toISOString().slice(0, 10) ?? null, seats]
}

describe('what the state of the subscription means for a club', () => {
  const open = [
    invoice('in_2', '2027-04-04T00:00:00Z', 'open'),
    invoice('in_1', '2027-04-01T00:00:00Z', 'open'),
  ]
  it.each([
    ['without one and without a trial it is as it was founded', null, null, ['granted', null, null]],
    ['a trial ends when it ends', null, new Date('2027-05-01'), ['trial', '2027-05-01', null]],
    [
      'one that was begun and never paid is none',
      truth({ status: 'incomplete' }),
      null,
      ['granted', null, null],
    ],
    ['one that runs says how many seats there are', truth({}), new Date('2027-01-01'), ['active', null, 20]],
    [
      'grace counts from the oldest open invoice',
      truth({ status: 'past-due' }, open),
      null,
      ['past-due', '2027-04-15', 20],
    ],
    [
      'when all tries have failed it only reads',
      truth({ status: 'unpaid' }, open),
      null,
      ['unpaid', '2027-04-10', 20],
    ],
    [
      'one that ended has no seats',
      truth({ status: 'canceled', endedAt: '2027-04-02T00:00:00Z' }),
      null,
      ['ended', '2027-04-02', 0],
    ],
  ] as const)('%s', (_, state, trial, expected) => {
    expect(isoOf(state, trial, now)).toEqual(expected)
  })
})

describe('what its admins are told', () => {
  const keys = (state: CustomerTruth | null, trial: Date | null, at = now) =>
    noticesDue(state, standingOf(state, trial, at), at).map(({ key }) => key.replace(/:2027.*?Z/u, ''))

  it('a receipt for every invoice that is paid and not free', () => {
    const paid = [invoice('in_1', '2027-04-01', 'paid'), invoice('in_0', '2027-03-01', 'paid', 0)]
    expect(keys(truth({}, paid), null)).toEqual(['receipt:in_1'])
  })

  it.each([
    ['2027-04-02', ['failed:in_1:first']],
    ['2027-04-08', ['failed:in_1:7']],
    ['2027-04-14', ['failed:in_1:2']],
    ['2027-04-15', ['reads-only']],
  ])('on %s of an invoice of 1 April that is open: %j', (day, expected) => {
    const state = truth({ status: 'past-due' }, [invoice('in_1', '2027-04-01T00:00:00Z', 'open')])
    expect(keys(state, null, new Date(`${day}T00:00:00Z`))).toEqual(expected)
  })

  it('that a trial ends, a week and two days before', () => {
    const ends = new Date('2027-04-20')
    expect(['12', '13', '18', '20'].flatMap((day) => keys(null, ends, new Date(`2027-04-${day}`)))).toEqual([
      'trial-ends:7',
      'trial-ends:2',
      'reads-only',
    ])
  })
})
