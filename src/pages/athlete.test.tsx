import { screen, waitFor, within } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { getAthlete } from '../../shared/contracts/athletes.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { refuse } from '../../tests/setup/msw/answer.ts'
import { inventedClub } from '../../tests/setup/msw/club.ts'
import { anAthlete, aResult, aSquad } from '../../tests/setup/msw/club-rows.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'
import type { ResultPoint } from '../../shared/contracts/results.ts'

const armsFree: ResultPoint['test'] = {
  protocol: 'cmj',
  side: 'both',
  externalLoadKg: 0,
  boxHeightM: null,
  arms: 'free',
}

function open(results: ResultPoint[], search = '') {
  const made = inventedClub({
    athletes: [
      anAthlete(1, {
        name: 'Mara Ostrow',
        bornOn: '2004-03-12',
        recordedMassKg: 74.1,
        squadIds: [idOf('squad', 1)],
      }),
    ],
    squads: [aSquad(1, { name: 'Senior squad' })],
    results,
  })
  server.use(...made.handlers)
  return { ...made, ...renderApp(`/athletes/${idOf('athlete', 1)}${search}`, aMe(['coach'])) }
}

describe('an athlete’s profile', () => {
  test('heads with who it is and shows every session’s figures with their uncertainty', async () => {
    open([aResult(1), aResult(2)])
    await pageTitled('Mara Ostrow')
    await screen.findByText('Senior squad · born 12 March 2004 · 74.1 kg recorded')
    const table = screen.getByRole('table', { name: /results by session/ })
    const rows = within(table).getAllByRole('row')
    expect(rows[1]).toHaveTextContent('12 Feb 2026')
    expect(rows[1]).toHaveTextContent('33.8 ± 0.4')
    expect(within(rows[1]!).getByRole('link', { name: '12 Feb 2026' })).toHaveAttribute(
      'href',
      `/sessions/${idOf('session', 2)}`,
    )
    expect(screen.getByText(/A measurement, not a diagnosis/)).toBeVisible()
    await expectNoAxeFaults()
  })

  test('another metric is drawn when chosen, and stands in the address', async () => {
    const { user, address } = open([aResult(1), aResult(2)])
    await user.selectOptions(await screen.findByLabelText('Metric'), 'Takeoff velocity')
    await screen.findByRole('heading', { name: 'Takeoff velocity, m/s' })
    expect(address()).toContain('metric=takeoffVelocity')
  })

  test('results of different tests are never put in one line', async () => {
    open([aResult(1), aResult(2, { test: armsFree })])
    await screen.findByRole('heading', { name: /Countermovement jump, hands on hips/ })
    expect(screen.getByRole('heading', { name: /Countermovement jump, arms free/ })).toBeVisible()
    expect(screen.getAllByRole('table', { name: /results by session/ })).toHaveLength(2)
  })

  test('a metric that a session has not is said to be none, never zero', async () => {
    open([aResult(1, { means: {} })])
    const table = await screen.findByRole('table', { name: /results by session/ })
    expect(within(table).getAllByText('none').length).toBeGreaterThan(3)
    expect(within(table).queryByText('0.0')).not.toBeInTheDocument()
  })

  test('without results it says when one will appear', async () => {
    open([])
    expect(await screen.findByText('No results yet')).toBeVisible()
  })

  test('of another club or an unknown one is not here, and is not asked for again', async () => {
    const { handlers } = inventedClub()
    server.use(...handlers)
    renderApp(`/athletes/${idOf('athlete', 9)}`, aMe(['coach']))
    expect(await screen.findByRole('alert')).toHaveTextContent('There is nothing here')
    expect(screen.queryByRole('button', { name: 'Try again' })).not.toBeInTheDocument()
    await expectNoAxeFaults()
  })

  test('a failed reading can be tried again', async () => {
    const { user, handlers } = open([])
    server.use(refuse(getAthlete, 'internal', 500))
    await waitFor(() => screen.getByRole('alert'))
    server.use(...handlers)
    await user.click(screen.getByRole('button', { name: 'Try again' }))
    await pageTitled('Mara Ostrow')
  })
})
