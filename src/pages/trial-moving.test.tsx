import { screen, waitFor, within } from '@testing-library/react'
import { http, HttpResponse } from 'msw'
import { expect, test } from 'vitest'
import type { BodyOf } from '../../shared/contracts/endpoint.ts'
import { getTrial, moveEvents, type Trial } from '../../shared/contracts/trials.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer, refuse } from '../../tests/setup/msw/answer.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { aTrial, measuredJump, samplesBody } from '../../tests/setup/msw/measured.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { renderApp } from '../../tests/setup/render-app.tsx'

const address = `/trials/${idOf('trial', 1)}`
const jump = measuredJump()
const takeoffS = jump.analysis.events.takeoff!.timeS
const nextSampleS = Math.floor(takeoffS * 1000 + 1) / 1000

/** A server that keeps one trial and, as the real one, analyses it anew later: here once `settle` is called. */
function serve(trial: Trial) {
  const kept = { trial, sent: [] as BodyOf<typeof moveEvents>[] }
  server.use(
    answer(getTrial, () => kept.trial),
    http.get('*/api/trials/:trialId/samples', () => HttpResponse.arrayBuffer(samplesBody(jump.recording))),
    answer(moveEvents, ({ body }) => {
      kept.sent.push(body)
      const { events, reason } = body
      const stood = Object.fromEntries(
        Object.keys({ ...events, ...kept.trial.eventMoves[0]?.events }).map((name) => [name, takeoffS]),
      )
      const move = { events, stood, reason, byName: 'Ines Calloway', at: '2026-11-12T14:02:00.000Z' }
      kept.trial = {
        ...kept.trial,
        version: kept.trial.version + 1,
        eventMoves: [move, ...kept.trial.eventMoves],
        analysis: { ...kept.trial.analysis!, movedEvents: events },
      }
      return kept.trial
    }),
  )
  return kept
}

/** Opens the trial and begins moving its events. */
async function beginMoving(trial: Trial = aTrial(jump)) {
  const kept = serve(trial)
  const app = renderApp(address, aMe(['coach']))
  await app.user.click(await screen.findByRole('button', { name: 'Move an event' }))
  const takeoff = await screen.findByRole('slider', { name: 'takeoff' })
  return { ...app, kept, takeoff }
}
const provisional = (name: string) =>
  within(screen.getByLabelText('Provisional figures')).getByText(name).nextElementSibling!

test('an event is moved by keyboard: a sample, ten, back to automatic, and undone', async () => {
  const { user, takeoff } = await beginMoving()
  expect(takeoff).toHaveAttribute('aria-valuetext', `${takeoffS.toFixed(4)} s, automatic`)
  takeoff.focus()
  await user.keyboard('{ArrowRight}')
  expect(takeoff).toHaveAttribute('aria-valuetext', `${nextSampleS.toFixed(4)} s, adjusted`)
  await user.keyboard('{Shift>}{ArrowRight}{/Shift}')
  expect(takeoff).toHaveAttribute('aria-valuetext', `${(nextSampleS + 0.01).toFixed(4)} s, adjusted`)
  await user.keyboard('{Home}')
  await waitFor(() =>
    expect(takeoff).toHaveAttribute('aria-valuetext', `${takeoffS.toFixed(4)} s, automatic`),
  )
  await user.keyboard('{ArrowLeft}{ArrowLeft}{Escape}')
  await waitFor(() =>
    expect(takeoff).toHaveAttribute('aria-valuetext', `${takeoffS.toFixed(4)} s, automatic`),
  )
  expect(screen.getByText('Nothing is moved yet.')).toBeVisible()
})

test('the figures follow, each with what it was, and the engine’s own events with them', async () => {
  const { user, takeoff } = await beginMoving()
  takeoff.focus()
  await user.keyboard('{Shift>}{ArrowLeft>3/}{/Shift}')
  const time = jump.analysis.metrics.timeToTakeoff!.value
  await waitFor(() =>
    expect(provisional('Time to takeoff')).toHaveTextContent(new RegExp(`was ${time.toFixed(3)}`)),
  )
  expect(screen.getByRole('region', { name: /^Measured/ })).toHaveTextContent(/was .* m\/s/)
  expect(screen.getByRole('table', { name: /Net impulse of each phase/ })).toHaveTextContent(/was/)
  expect(screen.getByRole('list', { name: 'Moved events' })).toHaveTextContent(
    new RegExp(`takeoff from ${takeoffS.toFixed(4)} s to`),
  )
  expect(screen.getByText(/^Provisional, computed on this device by engine/)).toBeVisible()
  await expectNoAxeFaults()
})

test('an event stops at its neighbour', async () => {
  const { user } = await beginMoving()
  const peak = screen.getByRole('slider', { name: 'landing peak' })
  const first = Math.floor(jump.analysis.events.touchdown!.timeS * 1000 + 1) / 1000
  expect(peak).toHaveAttribute('aria-valuemin', String(first))
  const samples = (jump.analysis.events.landingPeak!.timeS - first) * 1000
  peak.focus()
  await user.keyboard(`{Shift>}{ArrowLeft>${Math.ceil(samples / 10) + 1}/}{/Shift}`)
  expect(peak).toHaveAttribute('aria-valuetext', `${first.toFixed(4)} s, adjusted`)
})

test('is saved with a reason, and shown as adjusted with who, when and why', async () => {
  const { user, takeoff, kept } = await beginMoving()
  takeoff.focus()
  await user.keyboard('{ArrowRight}')
  await user.click(screen.getByRole('button', { name: 'Save' }))
  const dialog = screen.getByRole('dialog', { name: 'Save the moved events' })
  await user.click(within(dialog).getByRole('button', { name: 'Save' }))
  expect(within(dialog).getByText('Say why')).toBeVisible()
  await user.click(within(dialog).getByRole('button', { name: 'The feet left one after the other' }))
  await user.click(within(dialog).getByRole('button', { name: 'Save' }))
  const notice = (await screen.findByText('Adjusted by hand')).parentElement!
  expect(notice).toHaveTextContent(
    `Ines Calloway, 12 Nov 2026, 14:02: takeoff from ${takeoffS.toFixed(4)} s to ${nextSampleS.toFixed(4)} s.`,
  )
  expect(notice).toHaveTextContent('Reason: The feet left one after the other')
  expect(kept.sent).toMatchObject([
    {
      version: 1,
      engineVersion: aTrial(jump).engineInputs?.engineVersion,
      events: { takeoff: nextSampleS },
      reason: 'The feet left one after the other',
    },
  ])
  expect(screen.queryByRole('slider', { name: 'takeoff' })).not.toBeInTheDocument()
  await user.click(screen.getByText('The figures as a table'))
  expect(screen.getByRole('rowheader', { name: 'takeoff, adjusted' })).toBeVisible()
})

const adjusted = (change: Partial<Trial> = {}) =>
  aTrial(jump, {
    analysis: { ...jump.analysis, movedEvents: { takeoff: takeoffS } },
    eventMoves: [
      {
        events: { takeoff: takeoffS },
        stood: { takeoff: takeoffS - 0.02 },
        reason: 'Noise was taken for the event',
        byName: 'Bram Oyelaran',
        at: '2026-11-12T14:02:00.000Z',
      },
    ],
    ...change,
  })

test('all moved events go back to automatic, and the history stays', async () => {
  const kept = serve(adjusted())
  const { user } = renderApp(address, aMe(['coach']))
  await user.click(await screen.findByRole('button', { name: 'Put all events back to automatic' }))
  const dialog = screen.getByRole('dialog', { name: 'Put all events back to automatic?' })
  expect(dialog).toHaveTextContent(`Moved now: takeoff at ${takeoffS.toFixed(4)} s.`)
  await user.click(within(dialog).getByRole('button', { name: 'Put them back' }))
  expect(await screen.findByText('Back to automatic')).toBeVisible()
  expect(kept.sent).toMatchObject([{ events: {}, reason: null }])
  expect(screen.getByText('1 earlier move')).toBeVisible()
  expect(screen.getByText(/Bram Oyelaran/)).toBeInTheDocument()
})

test('while the new figures are being computed the page says that the old ones stand', async () => {
  serve(adjusted({ analysis: jump.analysis }))
  renderApp(address, aMe(['coach']))
  expect(await screen.findByText(/^The figures are being computed anew/)).toBeVisible()
})

test('somebody who saved first is shown, and saved over only when asked again', async () => {
  const { user, takeoff, kept } = await beginMoving()
  takeoff.focus()
  await user.keyboard('{ArrowRight}')
  await user.click(screen.getByRole('button', { name: 'Save' }))
  const dialog = screen.getByRole('dialog', { name: 'Save the moved events' })
  await user.type(within(dialog).getByLabelText('Reason'), 'The plate was bumped')
  server.use(
    refuse(moveEvents, 'stale-version', 409, 'Somebody was first.', { newer: adjusted({ version: 4 }) }),
  )
  await user.click(within(dialog).getByRole('button', { name: 'Save' }))
  expect(await within(dialog).findByText(/Moved events: was all automatic, is now takeoff at/)).toBeVisible()
  serve({ ...kept.trial, version: 4 })
  await user.click(within(dialog).getByRole('button', { name: 'Save mine over it' }))
  expect(await screen.findByText('Adjusted by hand')).toBeVisible()
})

test('leaving with something moved and unsaved asks first', async () => {
  const { user, takeoff } = await beginMoving()
  takeoff.focus()
  await user.keyboard('{ArrowRight}')
  await user.click(screen.getByRole('link', { name: 'Next' }))
  const dialog = screen.getByRole('dialog', { name: 'Leave without saving?' })
  expect(dialog).toHaveTextContent('What you moved on this page is not saved yet.')
  await user.click(within(dialog).getByRole('button', { name: 'Stay here' }))
  expect(takeoff).toHaveAttribute('aria-valuetext', expect.stringContaining('adjusted'))
  await user.click(screen.getByRole('button', { name: 'Leave as saved' }))
  expect(await screen.findByRole('button', { name: 'Move an event' })).toBeVisible()
})

test('who may not move events is not offered it', async () => {
  serve(adjusted({ engineInputs: null }))
  renderApp(address, aMe(['physio']))
  expect(await screen.findByText('Adjusted by hand')).toBeVisible()
  expect(screen.queryByRole('button', { name: 'Move an event' })).not.toBeInTheDocument()
  expect(screen.queryByRole('button', { name: /back to automatic/ })).not.toBeInTheDocument()
})
