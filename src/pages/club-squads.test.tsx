import { screen, waitFor, within } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { listSquads } from '../../shared/contracts/squads.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { refuse } from '../../tests/setup/msw/answer.ts'
import { inventedClub } from '../../tests/setup/msw/club.ts'
import { anAthlete, aSquad } from '../../tests/setup/msw/club-rows.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { renderApp } from '../../tests/setup/render-app.tsx'

function open(path = '/club/squads') {
  const made = inventedClub({
    squads: [
      aSquad(1, { name: 'Senior squad', athleteIds: [idOf('athlete', 1)] }),
      aSquad(2, { name: 'Under 19' }),
      aSquad(3, { name: 'Last season', archived: true }),
    ],
    athletes: [anAthlete(1, { name: 'Mara Ostrow' }), anAthlete(2, { name: 'Łucja Żółkowska' })],
  })
  server.use(...made.handlers)
  return { ...made, ...renderApp(path, aMe(['coach'])) }
}

describe('squads', () => {
  test('lists squads with how many athletes they have, and has no accessibility faults', async () => {
    open()
    expect(await screen.findByRole('row', { name: /Senior squad 1/ })).toBeVisible()
    expect(screen.getByText('2 squads')).toBeVisible()
    expect(screen.getByRole('link', { name: 'Senior squad' })).toHaveAttribute(
      'href',
      `/athletes?squad=${idOf('squad', 1)}`,
    )
    await expectNoAxeFaults()
  })

  test('sorting and the archived are read from the address', async () => {
    open('/club/squads?show=all&sort=-athletes')
    await screen.findByRole('row', { name: /Last season archived/ })
    expect(screen.getAllByRole('rowheader')[0]).toHaveTextContent('Senior squad')
  })

  test('a club without squads is told what one is for', async () => {
    server.use(...inventedClub().handlers)
    renderApp('/club/squads', aMe(['coach']))
    expect(await screen.findByText('No squads yet')).toBeVisible()
  })

  test('a failed reading can be tried again', async () => {
    const { handlers } = inventedClub({ squads: [aSquad(1)] })
    server.use(refuse(listSquads, 'internal', 500), ...handlers)
    const { user } = renderApp('/club/squads', aMe(['coach']))
    await screen.findByRole('alert')
    server.use(...handlers)
    await user.click(screen.getByRole('button', { name: 'Try again' }))
    await screen.findByRole('row', { name: /Squad 1/ })
  })

  test('a new squad stands on the list; a search among the members loses nobody chosen', async () => {
    const { user, club } = open()
    await user.click(await screen.findByRole('button', { name: 'Add a squad' }))
    await user.type(screen.getByLabelText('Name'), 'Sprinters')
    await user.click(screen.getByLabelText('Mara Ostrow'))
    await user.type(screen.getByLabelText('Find an athlete'), 'zolk{Enter}')
    expect(screen.queryByLabelText('Mara Ostrow')).not.toBeInTheDocument()
    await user.click(screen.getByLabelText('Łucja Żółkowska'))
    expect(screen.getByText('2 athletes chosen')).toBeVisible()
    await user.click(screen.getByRole('button', { name: 'Add the squad' }))
    await screen.findByRole('row', { name: /Sprinters 2/ })
    expect(club.squads.at(-1)!.athleteIds).toEqual([idOf('athlete', 1), idOf('athlete', 2)])
  })

  test('a name that another squad has is said at its field', async () => {
    const { user } = open()
    await user.click(await screen.findByRole('button', { name: 'Add a squad' }))
    await user.type(screen.getByLabelText('Name'), 'Under 19')
    await user.click(screen.getByRole('button', { name: 'Add the squad' }))
    await screen.findByText(/This name is taken/)
    expect(screen.getByLabelText('Name')).toHaveFocus()
  })

  test('renamed and with other members, the list shows both', async () => {
    const { user } = open()
    await user.click(await screen.findByRole('button', { name: 'Change Senior squad' }))
    await user.type(screen.getByLabelText('Name'), ' A')
    await user.click(screen.getByLabelText('Łucja Żółkowska'))
    await user.click(screen.getByRole('button', { name: 'Save' }))
    await screen.findByRole('row', { name: /Senior squad A 2/ })
  })

  test('what somebody else changed meanwhile is shown and kept', async () => {
    const { user, club } = open()
    await user.click(await screen.findByRole('button', { name: 'Change Senior squad' }))
    Object.assign(club.squads[0]!, { athleteIds: [idOf('athlete', 2)], version: 2 })
    await user.type(screen.getByLabelText('Name'), ' A')
    await user.click(screen.getByRole('button', { name: 'Save' }))
    await screen.findByText('Members: was Mara Ostrow, is now Łucja Żółkowska')
    await user.click(screen.getByRole('button', { name: 'Save mine over it' }))
    await screen.findByRole('row', { name: /Senior squad A/ })
    expect(club.squads[0]!.athleteIds).toEqual([idOf('athlete', 2)])
  })

  test('archiving can be undone', async () => {
    const { user } = open()
    await user.click(await screen.findByRole('button', { name: 'Archive Under 19' }))
    await waitFor(() => expect(screen.queryByRole('row', { name: /Under 19/ })).not.toBeInTheDocument())
    expect(screen.getByRole('link', { name: 'Senior squad' })).toHaveFocus()
    await user.click(within(screen.getByText(/Under 19 is archived/).parentElement!).getByText('Undo'))
    await screen.findByRole('row', { name: /Under 19/ })
  })

  test('of the last squad leaves the focus on the way to all of them', async () => {
    const { user } = open('/club/squads?search=senior')
    await user.click(await screen.findByRole('button', { name: 'Archive Senior squad' }))
    expect(await screen.findByRole('button', { name: 'Show all active squads' })).toHaveFocus()
  })
})
