import { screen, within } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { listHighLandings, type HighLanding } from '../../shared/contracts/landing-watch.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer } from '../../tests/setup/msw/answer.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { cmj } from '../../tests/setup/msw/measured.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

function aLanding(n: number, change: Partial<HighLanding> = {}): HighLanding {
  return {
    trialId: idOf('trial', n),
    sessionId: idOf('session', 1),
    sessionTitle: 'November jumps',
    date: '2026-11-12',
    athlete: { id: idOf('athlete', n), name: `Athlete ${n}` },
    test: cmj,
    peak: 4.5,
    U: 0.03,
    limit: 4,
    unverified: false,
    ...change,
  }
}

function open(landings: HighLanding[], limits: { cmj?: number } = { cmj: 4 }) {
  const asked: number[] = []
  server.use(
    answer(listHighLandings, ({ query }) => {
      asked.push(query.days)
      return { limits, landings }
    }),
  )
  return { asked, ...renderApp('/landing-watch', aMe(['physio'])) }
}

describe('the Landing watch', () => {
  test('lists landings above the limit as they come, each against the limit and with its trial to open', async () => {
    open([aLanding(1, { peak: 5.21 }), aLanding(2)])
    const table = await screen.findByRole('table', { name: 'Above the limit, heaviest first' })
    const [, first, second] = within(table).getAllByRole('row')
    expect(first).toHaveTextContent(/Athlete 15\.21 ±\s0\.034\.00Countermovement jump/)
    expect(second).toHaveTextContent('Athlete 2')
    expect(within(first!).getByRole('link', { name: /Open the trial of Athlete 1/ })).toHaveAttribute(
      'href',
      `/trials/${idOf('trial', 1)}`,
    )
    expect(screen.getByText(/A measurement, not a diagnosis; thresholds are the club’s/)).toBeVisible()
    await expectNoAxeFaults()
  })

  test('keeps landings that a failed check leaves in doubt apart, as no flag', async () => {
    open([aLanding(1), aLanding(2, { unverified: true })])
    const apart = await screen.findByRole('region', { name: /^Unverified/ })
    expect(within(apart).getAllByRole('row')).toHaveLength(2)
    expect(apart).toHaveTextContent('no flag')
    expect(screen.getByRole('region', { name: /^Above the limit/ })).not.toHaveTextContent('Athlete 2')
  })

  test('says that nothing is listed while no limit is set, and where to set one', async () => {
    open([], {})
    expect(await screen.findByText('No limit is set')).toBeVisible()
    expect(screen.getByRole('link', { name: 'Set a limit' })).toHaveAttribute('href', '/club/settings')
    await expectNoAxeFaults()
  })

  test('says that none is above the limit, for how long back, and the period is held in the address', async () => {
    const { user, asked, address } = open([])
    expect(await screen.findByText('No landing of the last 90 days is above the club’s limits')).toBeVisible()
    await user.selectOptions(screen.getByLabelText('Tests of the last'), '365 days')
    expect(
      await screen.findByText('No landing of the last 365 days is above the club’s limits'),
    ).toBeVisible()
    expect(address()).toBe('/landing-watch?days=365')
    expect(asked).toContain(365)
  })

  test('is the physio’s alone', async () => {
    renderApp('/landing-watch', aMe(['coach']))
    await pageTitled('Your role does not allow this')
  })
})
