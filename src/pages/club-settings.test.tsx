import { screen, waitFor } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { getClubSettings } from '../../shared/contracts/clubs.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { refuse } from '../../tests/setup/msw/answer.ts'
import { inventedClub } from '../../tests/setup/msw/club.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { inventedMeasuring } from '../../tests/setup/msw/measuring.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

const field = () => screen.findByLabelText(/^Countermovement jump/)
const save = () => screen.getByRole('button', { name: 'Save the limits' })

function open(landingPeakLimits: { cmj?: number } = {}) {
  const made = inventedClub({ settings: { landingPeakLimits, version: 1 } })
  server.use(...made.handlers, ...inventedMeasuring().handlers)
  return { ...made, ...renderApp('/club/settings', aMe(['physio', 'admin'])) }
}

describe('landing limits', () => {
  test('none is set by default, and the caution stands beside them', async () => {
    open()
    expect(await field()).toHaveValue('')
    expect(screen.getByText(/A measurement, not a diagnosis/)).toBeVisible()
    await expectNoAxeFaults()
  })

  test('a limit is saved, and can be changed again from what was saved', async () => {
    const { user, club } = open()
    await user.type(await field(), '4,5')
    await user.click(save())
    await waitFor(() => expect(club.settings).toEqual({ landingPeakLimits: { cmj: 4.5 }, version: 2 }))
    await screen.findByText(/The limits are saved/)
    await user.clear(await field())
    await user.type(await field(), '5')
    await user.click(save())
    await waitFor(() => expect(club.settings).toEqual({ landingPeakLimits: { cmj: 5 }, version: 3 }))
  })

  test('an emptied field takes the limit away', async () => {
    const { user, club } = open({ cmj: 4.5 })
    await user.clear(await field())
    await user.click(save())
    await waitFor(() => expect(club.settings).toEqual({ landingPeakLimits: {}, version: 2 }))
  })

  test('what is no number of body weights is refused at its field', async () => {
    const { user, club } = open()
    await user.type(await field(), 'four')
    await user.click(save())
    await waitFor(async () =>
      expect(await field()).toHaveAccessibleDescription(/Give a limit of 1 to 20 body weights/),
    )
    expect(club.settings.version).toBe(1)
  })

  test('a limit that somebody else set meanwhile is shown before it is overwritten', async () => {
    const { user, club } = open()
    await user.type(await field(), '5')
    club.settings = { landingPeakLimits: { cmj: 4 }, version: 2 }
    await user.click(save())
    await screen.findByText('Countermovement jump: was no limit, is now 4 body weights')
    await user.click(screen.getByRole('button', { name: 'Drop mine, take theirs' }))
    expect(await field()).toHaveValue('4')
    expect(club.settings.version).toBe(2)
  })

  test('leaving with an unsaved limit asks first', async () => {
    const { user } = open()
    await user.type(await field(), '5')
    await user.click(screen.getByRole('link', { name: 'Seats' }))
    await screen.findByRole('dialog', { name: 'Leave without saving?' })
    await user.click(screen.getByRole('button', { name: 'Stay here' }))
    expect(await field()).toHaveValue('5')
    await user.click(screen.getByRole('link', { name: 'Seats' }))
    await user.click(await screen.findByRole('button', { name: 'Leave and lose it' }))
    await pageTitled('Seats')
  })

  test('a failed reading can be tried again', async () => {
    const { handlers } = inventedClub()
    server.use(...inventedMeasuring().handlers)
    server.use(refuse(getClubSettings, 'internal', 500), ...handlers)
    const { user } = renderApp('/club/settings', aMe(['physio']))
    await screen.findByRole('alert')
    server.use(...handlers)
    await user.click(screen.getByRole('button', { name: 'Try again' }))
    expect(await field()).toHaveValue('')
  })
})
