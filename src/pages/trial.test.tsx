import { screen, waitFor, within } from '@testing-library/react'
import { http, HttpResponse } from 'msw'
import { describe, expect, test } from 'vitest'
import { getSession } from '../../shared/contracts/sessions.ts'
import { changeTrial, getTrial, type Trial } from '../../shared/contracts/trials.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer, refuse } from '../../tests/setup/msw/answer.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { aSheet, aTrial, measuredJump, samplesBody } from '../../tests/setup/msw/measured.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

const address = `/trials/${idOf('trial', 1)}`
const jump = measuredJump({
  shares: { stance: 0.5, unweighting: 0.5, braking: 0.5, propulsion: 0.5, landing: 0.6 },
})
const steppedOff = measuredJump({ stepOffAfterS: 0.35 }, 2)

/** A server that keeps one trial. */
function serve(trial: Trial, body = samplesBody(jump.recording)) {
  const kept = { trial, reads: 0, sheetReads: 0 }
  server.use(
    answer(getTrial, () => {
      kept.reads++
      return kept.trial
    }),
    http.get('*/api/trials/:trialId/samples', () => HttpResponse.arrayBuffer(body)),
    answer(getSession, () => {
      kept.sheetReads++
      return aSheet()
    }),
    answer(changeTrial, ({ body: change }) => {
      const { setAsideReason, athleteId } = change
      const setAside = setAsideReason ? { reason: setAsideReason, byName: 'Ines Calloway' } : null
      const athlete = aSheet().athletes.find((one) => one.athleteId === athleteId)
      kept.trial = {
        ...kept.trial,
        version: kept.trial.version + 1,
        ...(setAsideReason === undefined ? {} : { setAside }),
        ...(athleteId === undefined
          ? {}
          : { athlete: athlete ? { id: athlete.athleteId, name: athlete.name } : null }),
      }
      return kept.trial
    }),
  )
  return kept
}

async function openTrial(trial: Trial = aTrial(jump), body?: ArrayBuffer) {
  const kept = serve(trial, body)
  const app = renderApp(address, aMe([trial.mayEdit ? 'coach' : 'athlete']))
  await screen.findByRole('slider', { name: 'Read the trace' })
  return { ...app, kept }
}

describe('a trial, for a coach', () => {
  test('its title states the result with its uncertainty, its context who, when and which file', async () => {
    await openTrial()
    const title = await pageTitled(
      /Countermovement jump, 3\d\.\d cm ?±\s0\.\d, takeoff at 2\.\d+ ±\s0\.\d+ m\/s/,
    )
    expect(title).toBeVisible()
    expect(screen.getByText(/trial 2 of 3/)).toHaveTextContent('plate_0917.csv')
    expect(screen.getByRole('link', { name: 'Next' })).toHaveAttribute('href', `/trials/${idOf('trial', 2)}`)
    expect(screen.queryByRole('link', { name: 'Previous' })).not.toBeInTheDocument()
    expect(screen.getByRole('link', { name: 'Download original' })).toHaveAttribute(
      'href',
      `/api/uploads/${idOf('upload', 1)}/original`,
    )
    await expectNoAxeFaults()
  })

  test('the trace is read by keyboard: force of both feet and each, and momentum, at the cursor', async () => {
    const { user } = await openTrial()
    const trace = screen.getByRole('slider', { name: 'Read the trace' })
    expect(trace).toHaveAccessibleDescription(
      /Standing still: .* N\. The movement begins at .* stands still again/,
    )
    trace.focus()
    const { takeoff, onset } = jump.analysis.events
    await user.keyboard('{PageUp}')
    expect(trace).toHaveAttribute('aria-valuetext', `${onset!.timeS.toFixed(3)} s`)
    await user.keyboard('{PageUp}{PageUp}')
    expect(trace).toHaveAttribute('aria-valuetext', `${takeoff!.timeS.toFixed(3)} s`)
    const momentum = jump.analysis.metrics.takeoffMomentum!.value
    const readout = screen.getByText('both feet', { selector: 'output span' }).parentElement!
    expect(readout).toHaveTextContent(/left .* N/)
    const read = Number(/momentum \+([\d.]+)/.exec(readout.textContent ?? '')?.[1])
    expect(Math.abs(read - momentum)).toBeLessThan(0.5)
  })

  test('the trace has its figures as a table, an event a row', async () => {
    const { user } = await openTrial()
    await user.click(screen.getByText('The figures as a table'))
    const table = screen.getByRole('table', { name: 'Force and momentum at each event' })
    expect(within(table).getByRole('row', { name: /takeoff/ })).toHaveTextContent(
      `${jump.analysis.events.takeoff!.timeS.toFixed(3)} s`,
    )
  })

  test('the ledger runs from zero to the closing balance and says that the books close', async () => {
    await openTrial()
    const ledger = screen.getByRole('table', { name: /Net impulse of each phase/ })
    const heads = within(ledger)
      .getAllByRole('rowheader')
      .map((head) => head.textContent)
    expect(heads).toEqual([
      'Opening, standing still',
      'Unweighting',
      'Braking',
      'Propulsion',
      'Flight',
      'Landing',
      'Settling',
      'Closing, standing still',
    ])
    expect(
      screen.getByText(/Zero lies within the closing balance’s ± [\d.]+ N·s: the books close\./),
    ).toBeVisible()
  })

  test('a landing that was stepped off says that the balance cannot be tested', async () => {
    await openTrial(aTrial(steppedOff), samplesBody(steppedOff.recording))
    expect(
      screen.getByText(/The closing balance cannot be tested: the recording has no quiet stance/),
    ).toBeVisible()
    expect(screen.getByRole('rowheader', { name: 'Closing, still moving' })).toBeVisible()
  })

  test('checks to look at come first with limit, what they touch and what to do; the others behind one line', async () => {
    const check = (key: string, verdict: 'pass' | 'caution' | 'fail') => ({
      ...jump.analysis.checks[0]!,
      key,
      verdict,
      affects: ['landing' as const],
      measured: 14.04,
      limit: 10,
      unit: 'ms',
      sentence: `The ${key} sentence.`,
      remedy: `The ${key} remedy.`,
    })
    const analysis = {
      ...jump.analysis,
      checks: [check('a', 'pass'), check('b', 'caution'), check('c', 'fail'), check('d', 'pass')],
    }
    await openTrial(aTrial({ ...jump, analysis }))
    const panel = screen.getByRole('region', { name: 'Trial checks' })
    const items = within(panel)
      .getAllByRole('listitem')
      .map((item) => item.textContent)
    expect(items[0]).toBe('failed The c sentence.14.0 msLimit 10 ms. Takes away: landing. The c remedy.')
    expect(items[1]).toBe('look The b sentence.14.0 msLimit 10 ms. Touches: landing. The b remedy.')
    expect(within(panel).getByText('2 more, all pass')).toBeVisible()
  })

  test('figures that a failed check takes away are struck with the reason, those that are missing say why', async () => {
    const fail = {
      ...jump.analysis.checks[0]!,
      verdict: 'fail' as const,
      affects: ['landing' as const],
      sentence: 'Stepped off.',
    }
    const analysis = {
      ...jump.analysis,
      checks: [fail],
      withheld: ['landingPeakForcePerBodyWeight'],
      missing: [{ key: 'timeToStabilisation', reason: 'The athlete never stood still.' }],
    }
    await openTrial(aTrial({ ...jump, analysis }))
    const measured = screen.getByRole('region', { name: /^Measured/ })
    expect(within(measured).getByText('Stepped off.')).toBeVisible()
    const struck = within(measured).getByRole('link', { name: 'Landing peak force per body weight' })
    expect(struck).toHaveAttribute('href', '/methods/landingPeakForcePerBodyWeight')
    expect(struck.closest('dt')!.nextSibling).toHaveTextContent(/^withheld:/)
    expect(screen.getByRole('link', { name: 'Stepped off.' })).toHaveAttribute('href', `/methods/${fail.key}`)
    expect(measured).toHaveTextContent('1 figure could not be computed')
    expect(measured).toHaveTextContent('Time to stabilisation: The athlete never stood still.')
  })

  test('left and right stand beside each other with their difference, the larger side and the caution', async () => {
    await openTrial()
    const sides = screen.getByRole('region', { name: /^Left and right/ })
    const row = within(sides).getByRole('row', { name: /^Landing peak force/ })
    expect(row).toHaveTextContent(/−\d+\.\d ± \d+\.\d %left$/)
    const even = within(sides).getByRole('row', { name: /^Mean braking force/ })
    expect(even).toHaveTextContent('cannot be told from none')
    expect(within(sides).getByText(/A measurement, not a diagnosis/)).toBeVisible()
  })

  test('is set aside with a reason and taken back; the trial is fresh each time', async () => {
    const { user, kept } = await openTrial()
    await user.click(screen.getByRole('button', { name: 'Set aside' }))
    const dialog = screen.getByRole('dialog', { name: 'Set aside trial 2 of Mara Ostrow' })
    await user.type(within(dialog).getByLabelText('Reason'), 'Spoke while being weighed')
    await user.click(within(dialog).getByRole('button', { name: 'Set aside' }))
    expect(await screen.findByText('Set aside by Ines Calloway: Spoke while being weighed')).toBeVisible()
    await user.click(screen.getByRole('button', { name: 'Take back' }))
    await waitFor(() => expect(screen.queryByText(/Set aside by/)).not.toBeInTheDocument())
    expect(kept.trial.setAside).toBeNull()
    expect(screen.getByText('Taken back: trial 2 of Mara Ostrow.')).toBeVisible()
  })

  test('is moved to another athlete of its session', async () => {
    const { user } = await openTrial()
    await user.click(screen.getByRole('button', { name: 'Move to athlete' }))
    await user.selectOptions(await screen.findByLabelText('Athlete'), 'Tomas Brandvold')
    await user.click(screen.getByRole('button', { name: 'Move' }))
    expect(await screen.findByRole('link', { name: 'Tomas Brandvold' })).toBeVisible()
  })

  test('a recording cut short on the way is told, and can be fetched again', async () => {
    serve(aTrial(jump), new ArrayBuffer(8))
    const { user } = renderApp(address, aMe(['coach']))
    await user.click(await screen.findByRole('button', { name: 'Try again' }))
    expect(screen.getByRole('heading', { name: 'Impulse ledger' })).toBeVisible()
  })

  test('one that is not analysed yet says so', async () => {
    await openTrial(aTrial(jump, { analysis: null }))
    await pageTitled('Countermovement jump, being analysed')
  })

  test('one that is not there, or is somebody else’s, is told alike', async () => {
    server.use(refuse(getTrial, 'not-found', 404, 'This trial is not there.'))
    renderApp(address, aMe(['athlete']))
    expect(await screen.findByText('There is nothing here')).toBeVisible()
  })
})

describe('a trial, for its athlete', () => {
  const own = aTrial(jump, { mayEdit: false, fileName: null, nextTrialId: null })

  test('shows the result, the trace and plain sentences, and nothing to change', async () => {
    await openTrial(own)
    await pageTitled('Your jump 2 of 3')
    expect(screen.getByText(/cm, give or take 0\.\d/)).toBeVisible()
    const measured = screen.getByRole('region', { name: 'What was measured' })
    expect(measured).toHaveTextContent('How fast you were moving upwards')
    expect(screen.getByText(/A measurement, not a diagnosis/)).toBeVisible()
    expect(screen.queryByRole('button', { name: /Set aside|Move/ })).not.toBeInTheDocument()
    expect(screen.queryByRole('link', { name: 'Download original' })).not.toBeInTheDocument()
    await expectNoAxeFaults()
  })

  test('a withheld height is not shown as a result', async () => {
    const analysis = { ...jump.analysis, withheld: ['jumpHeightImpulse'] }
    await openTrial({ ...own, analysis })
    expect(screen.getByText('This jump’s height was not sure enough to be shown.')).toBeVisible()
    expect(screen.queryByText(/give or take/)).not.toBeInTheDocument()
  })
})
