import { screen, within } from '@testing-library/react'
import { http, HttpResponse } from 'msw'
import { expect, test } from 'vitest'
import { getAthlete } from '../../shared/contracts/athletes.ts'
import { getTrial, type Trial } from '../../shared/contracts/trials.ts'
import { answer } from '../../tests/setup/msw/answer.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { aTrial, measuredJump, samplesBody } from '../../tests/setup/msw/measured.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { renderApp } from '../../tests/setup/render-app.tsx'

const shown = aTrial(measuredJump())
const otherJump = measuredJump({ takeoffVelocity: 2.2 }, 2)
const other = aTrial(otherJump, {
  id: idOf('trial', 2),
  sessionDate: '2026-10-08',
  sessionTitle: 'October jumps',
})
const bodies = {
  [shown.id]: samplesBody(measuredJump().recording),
  [other.id]: samplesBody(otherJump.recording),
}

async function openTrial(trial: Trial = shown) {
  const { athlete } = shown
  server.use(
    answer(getTrial, ({ params }) => (params.trialId === other.id ? other : trial)),
    http.get('*/api/trials/:trialId/samples', ({ params }) =>
      HttpResponse.arrayBuffer(bodies[String(params.trialId)]!),
    ),
    answer(getAthlete, () => ({
      athlete: {
        ...athlete!,
        bornOn: null,
        recordedMassKg: null,
        squadIds: [],
        linked: false,
        archived: false,
        version: 1,
      },
      results: [
        {
          sessionId: other.sessionId,
          date: other.sessionDate,
          sessionTitle: other.sessionTitle,
          test: other.test,
          trialIds: [other.id],
          means: {},
        },
      ],
    })),
  )
  const app = renderApp(`/trials/${shown.id}`, aMe([trial.mayEdit ? 'coach' : 'athlete']))
  await screen.findByRole('slider', { name: 'Read the trace' })
  return app
}

test('another trial of the athlete is laid over, named by a letter, with its figures beside', async () => {
  const { user, container } = await openTrial()
  await user.click(screen.getByRole('button', { name: 'Lay other trials over it' }))
  await user.selectOptions(
    await screen.findByLabelText('Lay over another trial'),
    '8 Oct 2026, October jumps, jump 1',
  )
  const table = await screen.findByRole('table', { name: 'The trials laid over one another' })
  const row = within(table).getByRole('row', { name: /^A: 8 Oct 2026, October jumps/ })
  const height = (100 * otherJump.analysis.metrics.jumpHeightImpulse!.value).toFixed(1)
  expect(row).toHaveTextContent(new RegExp(`${height} ±`))
  expect(within(table).getByRole('row', { name: /^This trial/ })).toBeVisible()
  expect(container.querySelector('svg text.fill-ink-2.font-semibold')).toHaveTextContent('A')
  await user.click(screen.getByRole('button', { name: 'Align at onset' }))
  expect(screen.getByRole('button', { name: 'Aligned at onset' })).toHaveAttribute('aria-pressed', 'true')
  await user.click(within(row).getByRole('button', { name: 'Take off A' }))
  expect(table).not.toBeInTheDocument()
})

test('the lines of left and right can be put away', async () => {
  const { user, container } = await openTrial()
  expect(container.querySelector('path.stroke-left')).toBeInTheDocument()
  await user.click(screen.getByRole('button', { name: 'Hide left and right' }))
  expect(container.querySelector('path.stroke-left')).not.toBeInTheDocument()
  expect(screen.getByRole('region', { name: /^Left and right/ })).toBeVisible()
})

test('an athlete sees their own trial alone', async () => {
  await openTrial({ ...shown, mayEdit: false, fileName: null, engineInputs: null })
  expect(screen.queryByRole('button', { name: 'Lay other trials over it' })).not.toBeInTheDocument()
})
