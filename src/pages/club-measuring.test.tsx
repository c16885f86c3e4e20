import { screen, waitFor, within } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import type { RecomputeReport } from '../../shared/contracts/recomputes.ts'
import type { Role } from '../../shared/contracts/roles.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { anAthlete } from '../../tests/setup/msw/club-rows.ts'
import { inventedClub } from '../../tests/setup/msw/club.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { inventedMeasuring, type MeasuringState } from '../../tests/setup/msw/measuring.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { renderApp } from '../../tests/setup/render-app.tsx'

function open(start: Partial<MeasuringState> = {}, roles: Role[] = ['coach']) {
  const made = inventedMeasuring(start)
  server.use(...inventedClub().handlers, ...made.handlers)
  return { ...made, ...renderApp('/club/settings', aMe(roles)) }
}

const eventForce = () => screen.findByRole('textbox', { name: 'event force, N' })
const saveSettings = () => screen.getByRole('button', { name: 'Save the measuring settings' })

describe('the measuring settings', () => {
  test('stand with their defaults, and a changed one is marked, saved alone and can go back', async () => {
    const { user, measuring } = open()
    expect(await eventForce()).toHaveValue('10')
    await user.clear(await eventForce())
    await user.type(await eventForce(), '20')
    const head = screen.getByRole('rowheader', { name: /eventForceN/ })
    expect(within(head).getByText('changed')).toBeVisible()
    await user.click(saveSettings())
    await waitFor(() =>
      expect(measuring.settings).toMatchObject({ changed: { eventForceN: 20 }, version: 2 }),
    )
    // Under both forms that could be the reason.
    expect(await screen.findAllByText(/^12 of 12 analyses were made with other settings\./)).toHaveLength(3)
    await user.click(screen.getByRole('button', { name: 'event force back to default' }))
    expect(await eventForce()).toHaveValue('10')
    await user.click(saveSettings())
    await waitFor(() => expect(measuring.settings).toMatchObject({ changed: {}, version: 3 }))
  })

  test('are refused at their field beyond their bounds, and where they are no number', async () => {
    const { user, measuring } = open()
    await user.clear(await eventForce())
    await user.type(await eventForce(), '500')
    await user.click(saveSettings())
    await waitFor(async () => expect(await eventForce()).toHaveAccessibleDescription('Give 5 to 50 N'))
    expect(await eventForce()).toHaveFocus()
    expect(measuring.settings.version).toBe(1)
  })

  test('that somebody else changed meanwhile are shown before they are overwritten', async () => {
    const { user, measuring } = open()
    await user.clear(await eventForce())
    await user.type(await eventForce(), '20')
    measuring.settings = { changed: { massCaution: 0.05 }, version: 2, change: null }
    await user.click(saveSettings())
    await screen.findByText('mass caution: was 0.04, is now 0.05')
    expect(measuring.settings.version).toBe(2)
  })

  test('keep a chosen method while a number is changed', async () => {
    const { user, measuring } = open({
      settings: { changed: { asymmetryFormula: 'logRatio' }, version: 2, change: null },
    })
    expect(await screen.findByLabelText('Asymmetry')).toHaveValue('logRatio')
    await user.selectOptions(screen.getByLabelText('Onset of movement'), 'standard-deviations')
    await user.click(saveSettings())
    await waitFor(() =>
      expect(measuring.settings).toMatchObject({
        changed: { asymmetryFormula: 'logRatio', onsetRule: 'standard-deviations' },
        version: 3,
      }),
    )
  })

  test('are read, and not changed, by a physio; what the method fixes is shown too', async () => {
    open({}, ['physio'])
    expect(await eventForce()).toHaveAttribute('readonly')
    expect(screen.queryByRole('button', { name: 'Save the measuring settings' })).toBeNull()
    expect(screen.getByText(/^Fixed by the method \(\d+\)$/)).toBeVisible()
    expect(await screen.findByText(/^All 12 analyses were made with what holds now/)).toBeVisible()
  })
})

describe('plates and place', () => {
  test('take percent and a whole place, with decimal commas', async () => {
    const { user, measuring } = open()
    const left = await screen.findByLabelText('Left plate, %')
    expect(left).toHaveValue('0.5')
    await user.clear(left)
    await user.type(left, '0,2')
    await user.type(screen.getByLabelText('Latitude, degrees'), '60,17')
    await user.click(screen.getByRole('button', { name: 'Save plates and place' }))
    await waitFor(() =>
      expect(screen.getByLabelText('Altitude, m')).toHaveAccessibleDescription(
        /Give both, or leave both empty/,
      ),
    )
    await user.type(screen.getByLabelText('Altitude, m'), '20')
    await user.click(screen.getByRole('button', { name: 'Save plates and place' }))
    await waitFor(() =>
      expect(measuring.plates).toMatchObject({
        calibrationU: { left: 0.002, right: 0.005 },
        place: { latitudeDeg: 60.17, altitudeM: 20 },
        version: 2,
      }),
    )
  })
})

const report: RecomputeReport = {
  trials: 12,
  trialsMoved: 9,
  trialsFailed: 1,
  figures: [
    {
      metric: 'takeoffVelocity',
      of: 'both',
      moved: 9,
      medianChange: 0.0021,
      greatestChange: -0.0043,
      medianMultiple: 0.2,
      greatestMultiple: 0.41,
      uMoved: 0,
      medianUFactor: null,
      appeared: 0,
      vanished: 0,
    },
  ],
  checks: { toFail: 1, fromFail: 0, other: 2 },
  publishedSessions: [{ id: idOf('session', 1), title: 'Monthly jumps', date: '2027-02-01', trials: 4 }],
  greatest: [
    {
      trialId: idOf('trial', 1),
      athleteName: 'Mara Ostrow',
      sessionTitle: 'Monthly jumps',
      sessionDate: '2027-02-01',
      metric: 'takeoffVelocity',
      of: 'both',
      before: 2.5,
      after: 2.4957,
      multiple: 0.41,
    },
  ],
}

describe('a recompute', () => {
  test('of one athlete begins with a dry run, shows how far it is, and then what would move', async () => {
    const athlete = anAthlete(1, { name: 'Mara Ostrow' })
    const { handlers, measuring } = inventedMeasuring({ stale: 12 })
    server.use(...inventedClub({ athletes: [athlete] }).handlers, ...handlers)
    const { user } = renderApp(`/athletes/${athlete.id}`, aMe(['coach']))
    await user.click(await screen.findByRole('button', { name: 'Recompute' }))
    await screen.findByRole('dialog', { name: 'Recompute Mara Ostrow' })
    await user.click(await screen.findByRole('button', { name: 'Dry run' }))
    expect(measuring.recomputes[0]?.scope).toEqual({ kind: 'athlete', athleteId: athlete.id })
    const bar = await screen.findByRole('progressbar', { name: 'Dry run of the whole club' })
    expect(bar).toHaveAttribute('max', '12')
    const [running] = measuring.recomputes
    Object.assign(running!, { state: 'running', done: 5 })
    await screen.findByText(/^5 of 12 trials/, {}, { timeout: 4000 })
    expect(bar).toHaveAttribute('value', '5')
    Object.assign(running!, { state: 'done', done: 12 })
    measuring.reports[running!.id] = report
    await screen.findByText(/In 9 of 12 trials something would move/, {}, { timeout: 4000 })
    expect(
      screen.getByText(/3 checks would change verdict: 1 to a fail, 0 from a fail, 2 otherwise/),
    ).toBeVisible()
    const row = screen.getByRole('row', { name: /Takeoff velocity 9/ })
    expect(within(row).getByText('0.0021 m/s')).toBeVisible()
    expect(within(row).getByText('\u22120.0043 m/s')).toBeVisible()
    expect(screen.getByRole('link', { name: /^Mara Ostrow, Monthly jumps/ })).toHaveAttribute(
      'href',
      `/trials/${idOf('trial', 1)}`,
    )
    expect(screen.getByRole('link', { name: 'Monthly jumps' })).toBeVisible()
    await expectNoAxeFaults()
  }, 20_000)

  test('asks before it puts new figures in force, and can be cancelled', async () => {
    const { user, measuring } = open({ stale: 3 })
    await user.click(await screen.findByRole('button', { name: 'Recompute' }))
    expect(screen.getByText(/Athletes go on reading what was published/)).toBeVisible()
    expect(measuring.recomputes).toEqual([])
    await user.click(screen.getByRole('button', { name: 'Recompute now' }))
    await user.click(await screen.findByRole('button', { name: 'Cancel the recompute' }))
    await screen.findByText(/cancelled after 0 of 3 trials/)
    expect(measuring.recomputes[0]).toMatchObject({ dryRun: false, state: 'cancelled' })
  })
})
