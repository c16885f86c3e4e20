import { screen, within } from '@testing-library/react'
import { afterEach, describe, expect, test, vi } from 'vitest'
import {
  changeSeats,
  endSubscription,
  getBilling,
  listPlans,
  openPortal,
  previewSeats,
  refreshBilling,
  startCheckout,
  type Billing,
} from '../../shared/contracts/billing.ts'
import { getSeats } from '../../shared/contracts/clubs.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer, neverAnswers, refuse, Refusal } from '../../tests/setup/msw/answer.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

const goTo = vi.hoisted(() => vi.fn<(url: string) => void>())
vi.mock('../lib/go-to.ts', () => ({ goTo }))
afterEach(() => goTo.mockClear())

const eur = (amount: number) => ({ amount, currency: 'eur' })
const aBilling = (change: Partial<Billing> = {}): Billing => ({
  state: 'active',
  readsOnlyFrom: null,
  readsOnly: false,
  sells: true,
  subscription: {
    interval: 'month',
    seats: 20,
    nextSeats: null,
    periodEnd: '2027-04-01T10:00:00.000Z',
    endsWithPeriod: false,
  },
  nextInvoice: { at: '2027-04-01T10:00:00.000Z', total: eur(9000) },
  invoices: [
    {
      id: 'in_1',
      number: 'UF-1',
      at: '2027-03-01T10:00:00.000Z',
      total: eur(9000),
      status: 'paid',
      url: 'http://p/1',
    },
  ],
  syncedAt: '2027-03-01T10:00:00.000Z',
  version: 3,
  ...change,
})

/** The page of a club whose billing the server keeps. */
function openPage(start: Billing, address = '/club/billing') {
  const kept = { billing: start }
  server.use(
    answer(getBilling, () => kept.billing),
    answer(getSeats, () => ({ used: 18, paid: 20, staff: 4 })),
    answer(listPlans, () => ({
      plans: [
        { interval: 'month' as const, seat: eur(450) },
        { interval: 'year' as const, seat: eur(4500) },
      ],
    })),
    answer(previewSeats, ({ query }) => ({
      seats: query.seats,
      due: eur(1161),
      at: '2027-03-16T10:00:00.000Z',
    })),
    answer(openPortal, () => ({ url: 'http://payments.example/portal' })),
  )
  return { kept, ...renderApp(address, aMe(['admin'])) }
}

describe('billing', () => {
  test('shows seats, period, next invoice and invoices, with no accessibility faults', async () => {
    openPage(aBilling())
    expect(await pageTitled('Billing')).toBeVisible()
    expect(await screen.findByText('€90.00 on 1 Apr 2027, 11:00')).toBeVisible()
    expect(screen.getByRole('link', { name: 'UF-1' })).toHaveAttribute('href', 'http://p/1')
    await expectNoAxeFaults()
  })

  test('buys seats: the price of each, then on to the payment service', async () => {
    const asked: unknown[] = []
    const { user } = openPage(
      aBilling({ state: 'granted', subscription: null, nextInvoice: null, invoices: [] }),
    )
    server.use(
      answer(startCheckout, ({ body }) => {
        asked.push(body)
        return { url: 'http://payments.example/checkout' }
      }),
    )
    await user.click(await screen.findByRole('radio', { name: 'Yearly: €45.00 a year for each seat' }))
    const seats = screen.getByRole('textbox', { name: 'Seats' })
    await vi.waitFor(() => expect(seats).toHaveValue('18'))
    await user.clear(seats)
    await user.click(screen.getByRole('button', { name: 'Go on to payment' }))
    expect(seats).toHaveAccessibleDescription(/Give a whole number of seats/)
    await user.type(seats, '20')
    await expectNoAxeFaults()
    await user.click(screen.getByRole('button', { name: 'Go on to payment' }))
    await vi.waitFor(() => expect(goTo).toHaveBeenCalledWith('http://payments.example/checkout'))
    expect(asked).toEqual([{ interval: 'year', seats: 20 }])
  })

  test('adds seats for the amount that was shown', async () => {
    const { user, kept } = openPage(aBilling())
    server.use(
      answer(changeSeats, ({ body }) => {
        expect(body).toEqual({ version: 3, seats: 25, at: '2027-03-16T10:00:00.000Z' })
        kept.billing = aBilling({ version: 4, subscription: { ...aBilling().subscription!, seats: 25 } })
        return kept.billing
      }),
    )
    await user.click(await screen.findByRole('button', { name: 'Change the seats' }))
    const dialog = within(screen.getByRole('dialog'))
    const seats = dialog.getByRole('textbox', { name: 'Seats' })
    await user.clear(seats)
    await user.type(seats, '25')
    await user.click(await dialog.findByRole('button', { name: 'Pay €11.61 and add 5 seats' }))
    expect(await screen.findByText('The club has 25 seats.')).toBeInTheDocument()
    expect(screen.queryByRole('dialog')).not.toBeInTheDocument()
    expect(screen.getByText('Seats', { selector: 'dt' }).nextElementSibling).toHaveTextContent('25')
  })

  test('a declined card is said, and what was typed stays', async () => {
    const { user } = openPage(aBilling())
    server.use(
      answer(changeSeats, () => {
        throw new Refusal('payment-declined', 402, 'The card was declined, and nothing was changed.')
      }),
    )
    await user.click(await screen.findByRole('button', { name: 'Change the seats' }))
    const seats = screen.getByRole('textbox', { name: 'Seats' })
    await user.clear(seats)
    await user.type(seats, '22')
    await user.click(await screen.findByRole('button', { name: /^Pay/ }))
    expect(await screen.findByRole('alert')).toHaveTextContent('The card was declined')
    expect(seats).toHaveValue('22')
  })

  test('takes seats away from the next period on', async () => {
    const { user } = openPage(aBilling())
    server.use(
      answer(changeSeats, ({ body }) => {
        expect(body).toEqual({ version: 3, seats: 12, at: null })
        return aBilling({ version: 4 })
      }),
    )
    await user.click(await screen.findByRole('button', { name: 'Change the seats' }))
    const seats = screen.getByRole('textbox', { name: 'Seats' })
    await user.clear(seats)
    await user.type(seats, '12')
    expect(
      screen.getByText('20 seats until 1 Apr 2027, 11:00, 12 after that. Nothing is paid back.'),
    ).toBeVisible()
    await user.click(screen.getByRole('button', { name: 'Have 12 seats from then on' }))
    expect(await screen.findByText('12 seats from 1 Apr 2027, 11:00 on.')).toBeInTheDocument()
  })

  test('ends with the period after asking, and goes on after all', async () => {
    const { user, kept } = openPage(aBilling())
    server.use(
      answer(endSubscription, ({ body }) => {
        const subscription = { ...aBilling().subscription!, endsWithPeriod: body.ends }
        kept.billing = aBilling({ version: body.version + 1, subscription, nextInvoice: null })
        return kept.billing
      }),
    )
    await user.click(await screen.findByRole('button', { name: 'End the subscription' }))
    await user.click(within(screen.getByRole('dialog')).getByRole('button', { name: 'End the subscription' }))
    expect(await screen.findByText('The subscription ends on 1 Apr 2027, 11:00')).toBeVisible()
    await user.click(screen.getByRole('button', { name: 'Go on after all' }))
    expect(await screen.findByRole('button', { name: 'End the subscription' })).toBeVisible()
  })

  test.each([
    [
      { state: 'trial', readsOnlyFrom: '2027-04-01T10:00:00.000Z', subscription: null },
      'Trial until 1 Apr 2027, 11:00',
    ],
    [{ state: 'past-due', readsOnlyFrom: '2027-04-15T10:00:00.000Z' }, 'A payment was declined'],
    [
      { state: 'unpaid', readsOnly: true, readsOnlyFrom: '2027-03-01T10:00:00.000Z' },
      'The club can only read',
    ],
  ] as [Partial<Billing>, string][])('says how a club stands: %j', async (change, title) => {
    openPage(aBilling(change))
    expect(await screen.findByText(title)).toBeVisible()
    await expectNoAxeFaults()
  })

  test('leads to card and invoices', async () => {
    const { user } = openPage(aBilling())
    await user.click(await screen.findByRole('button', { name: 'Card and invoices' }))
    await vi.waitFor(() => expect(goTo).toHaveBeenCalledWith('http://payments.example/portal'))
  })

  test('asks the payment service once on the way back from it', async () => {
    let asked = 0
    const { kept, address } = openPage(
      aBilling({ state: 'granted', subscription: null }),
      '/club/billing?checkout=done',
    )
    server.use(
      answer(refreshBilling, () => {
        asked += 1
        kept.billing = aBilling()
        return kept.billing
      }),
    )
    expect(await screen.findByRole('button', { name: 'Change the seats' })).toBeVisible()
    await vi.waitFor(() => expect(address()).toBe('/club/billing'))
    expect(asked).toBe(1)
  })

  test('says that it loads, and what happened where it cannot', async () => {
    server.use(
      answer(getSeats, () => ({ used: 1, paid: 1, staff: 1 })),
      neverAnswers(getBilling),
    )
    const { unmount } = renderApp('/club/billing', aMe(['admin']))
    expect(await screen.findByText(/Loading the billing/)).toBeVisible()
    unmount()
    server.use(refuse(getBilling, 'internal', 500))
    renderApp('/club/billing', aMe(['admin']))
    expect(await screen.findByRole('alert')).toHaveTextContent('Something went wrong on our side')
  })
})
