import { screen, within } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { usualTest } from '../../shared/contracts/session-test.ts'
import { getMyResults, type ResultPoint } from '../../shared/contracts/results.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer, cutOff } from '../../tests/setup/msw/answer.ts'
import { aResult } from '../../tests/setup/msw/club-rows.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

const mara = { id: idOf('athlete', 1), name: 'Mara Ostrow' }
const means = (heightM: number): ResultPoint['means'] => ({
  jumpHeightImpulse: { value: heightM, U: 0.004, trials: 2 },
  landingPeakForcePerBodyWeight: { value: 3.1, U: 0.05, trials: 2 },
})
const year = [
  aResult(1, { date: '2024-03-01', means: means(0.29) }),
  aResult(2, { date: '2026-02-01', means: means(0.33) }),
  aResult(3, { date: '2026-11-12', means: means(0.35) }),
]

function open(results: ResultPoint[], athlete: typeof mara | null = mara) {
  server.use(answer(getMyResults, () => ({ athlete, results })))
  return renderApp('/me', aMe(['athlete'], { athleteId: mara.id }))
}

describe('the athlete’s own page', () => {
  test('begins with the newest result: what it is, when, and its give or take', async () => {
    open(year)
    expect(await screen.findByText('Countermovement jump, hands on hips · 12 November 2026')).toBeVisible()
    expect(screen.getByText('35.0', { selector: 'p > span' })).toBeVisible()
    expect(screen.getByText('cm, give or take 0.4')).toBeVisible()
    expect(screen.getByText(/The average of 2 jumps/)).toBeVisible()
    await expectNoAxeFaults()
  })

  test('shows the last year as points with their figures as a table, and passes no verdict', async () => {
    const { user } = open(year)
    const chart = await screen.findByRole('slider', { name: 'Jump height, result by result' })
    expect(chart).toHaveAccessibleDescription(
      /2 results from 1 February 2026 to 12 November 2026, between 33\.0 and 35\.0 cm\. The newest is 35\.0/,
    )
    await user.click(screen.getByText('The figures as a table'))
    const rows = within(screen.getByRole('table', { name: /Jump height by date/ })).getAllByRole('row')
    expect(rows.map((row) => row.textContent)).toEqual([
      'DateJump height, cmTrials',
      expect.stringMatching(/^12 Nov 202635\.0 ±\s0\.4/),
      expect.stringMatching(/^1 Feb 202633\.0 ±\s0\.4/),
    ])
    expect(document.body).not.toHaveTextContent(/real rise|within noise|real fall/)
  })

  test.each([
    ['dj', 'rsi', 1.42, 'Drop jump, hands on hips, 30 cm box', '1.42', /The average of 2 jumps/, 'Jump 1'],
    [
      'hops',
      'rsiBestFive',
      1.91,
      'Repeated hops, hands on hips',
      '1.91',
      /The average of 2 sets of hops/,
      'Set of hops 1',
    ],
    [
      'dropLanding',
      'landingPeakForcePerBodyWeight',
      3.4,
      'Drop landing, 30 cm box',
      '3.40',
      /The average of 2 landings/,
      'Landing 1',
    ],
  ] as const)(
    'of a %s begins with the figure that stands for it',
    async (protocol, key, value, words, shown, average, link) => {
      const done = { ...usualTest(protocol), boxHeightM: protocol === 'hops' ? null : 0.3 }
      open([
        ...year,
        aResult(4, { date: '2026-11-20', test: done, means: { [key]: { value, U: 0.05, trials: 2 } } }),
      ])
      expect(await screen.findByText(`${words} · 20 November 2026`)).toBeVisible()
      expect(screen.getByText(shown, { selector: 'p > span' })).toBeVisible()
      expect(screen.getByText(average)).toBeVisible()
      expect(screen.getByRole('link', { name: `${link} of 20 November 2026` })).toBeVisible()
      expect(screen.getByText('35.0', { selector: 'li span' })).toBeVisible()
    },
  )

  test('the points are read by keyboard, from the newest back', async () => {
    const { user } = open(year)
    const chart = await screen.findByRole('slider', { name: 'Jump height, result by result' })
    chart.focus()
    await user.keyboard('{ArrowLeft}{ArrowLeft}')
    expect(chart.getAttribute('aria-valuetext')).toMatch(/^1 February 2026: 33\.0/)
  })

  test('says the landing in plain words, with the caution', async () => {
    open(year)
    const landing = await screen.findByRole('region', { name: 'How you landed' })
    expect(landing).toHaveTextContent(
      '3.10 times your body weight at the hardest moment, on average over 2 landings, give or take 0.05.',
    )
    expect(landing).toHaveTextContent(/A measurement, not a diagnosis/)
  })

  test('lists every session, newest first, each with its jumps to open', async () => {
    open(year)
    const sessions = within(await screen.findByRole('region', { name: 'Your sessions' })).getAllByRole(
      'listitem',
    )
    expect(sessions.map((item) => item.textContent?.slice(0, 11))).toEqual([
      '12 November',
      '1 February ',
      '1 March 202',
    ])
    expect(within(sessions[0]!).getByRole('link', { name: 'Jump 1 of 12 November 2026' })).toHaveAttribute(
      'href',
      `/trials/${year[2]!.trialIds[0]}`,
    )
  })

  test('a test without a height to show says so and invents none', async () => {
    open([aResult(1, { means: {} })])
    expect(await screen.findByText('No jump of this test was sure enough to show a figure.')).toBeVisible()
    expect(screen.getByText('Jump height: no results yet.')).toBeVisible()
  })

  test('says what to wait for before the first publication, and whom to ask when not tied to an athlete', async () => {
    open([])
    expect(await screen.findByText('No results yet')).toBeVisible()
    await expectNoAxeFaults()
  })

  test('a person with the role who is not tied to an athlete reads whom to ask', async () => {
    open([], null)
    expect(await screen.findByText('You are not tied to an athlete of the club yet')).toBeVisible()
  })

  test('a lost connection is told and can be tried again', async () => {
    server.use(cutOff(getMyResults))
    const { user } = renderApp('/me', aMe(['athlete']))
    const again = await screen.findByRole('button', { name: 'Try again' }, { timeout: 5_000 })
    server.use(answer(getMyResults, () => ({ athlete: mara, results: year })))
    await user.click(again)
    expect(await screen.findByText('Countermovement jump, hands on hips · 12 November 2026')).toBeVisible()
    await pageTitled('My results')
  })
})
