import { screen, waitFor, within } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { changeAthlete, createAthlete, listAthletes } from '../../shared/contracts/athletes.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer, cutOff, neverAnswers, refuse } from '../../tests/setup/msw/answer.ts'
import { inventedClub } from '../../tests/setup/msw/club.ts'
import { anAthlete, aSquad } from '../../tests/setup/msw/club-rows.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

const seniors = aSquad(1, { name: 'Senior squad', athleteIds: [idOf('athlete', 1)] })

function roster() {
  return inventedClub({
    athletes: [
      anAthlete(1, { name: 'Mara Ostrow', recordedMassKg: 74.1, squadIds: [idOf('squad', 1)], linked: true }),
      anAthlete(2, { name: 'Łucja Żółkowska', bornOn: '2004-03-12', recordedMassKg: 58.7 }),
      anAthlete(3, { name: 'Tomas Brandvold' }),
      anAthlete(4, { name: 'Ana Ek', archived: true }),
    ],
    squads: [{ ...seniors }],
  })
}

function open(path = '/athletes', roles: Parameters<typeof aMe>[0] = ['coach']) {
  const made = roster()
  server.use(...made.handlers)
  return { ...made, ...renderApp(path, aMe(roles)) }
}

const namesShown = () => screen.getAllByRole('rowheader').map((cell) => cell.textContent.trim())

describe('the roster', () => {
  test('lists active athletes by name, with squads and mass, and has no accessibility faults', async () => {
    open()
    const row = await screen.findByRole('row', { name: /Mara Ostrow/ })
    expect(within(row).getByText('Senior squad')).toBeVisible()
    expect(within(row).getByText('74.1')).toBeVisible()
    expect(namesShown()).toEqual(['Łucja Żółkowska', 'Mara Ostrow', 'Tomas Brandvold'])
    expect(screen.getByText('3 athletes')).toBeVisible()
    await expectNoAxeFaults()
  })

  test('search folds accents, and stands in the address', async () => {
    const { user, address } = open()
    await user.type(await screen.findByLabelText('Search by name'), 'zolk')
    await waitFor(() => expect(namesShown()).toEqual(['Łucja Żółkowska']))
    expect(address()).toBe('/athletes?search=zolk')
    expect(screen.getByText('1 of 3 athletes')).toBeVisible()
  })

  test('squad, archived and sorting are read from the address', async () => {
    open('/athletes?sort=-mass&show=all')
    await screen.findByRole('row', { name: /Ana Ek/ })
    expect(namesShown()[0]).not.toBe('Łucja Żółkowska')
    expect(screen.getByRole('columnheader', { name: /Recorded mass/ })).toHaveAttribute(
      'aria-sort',
      'descending',
    )
  })

  test('pressing a head sorts by it, pressing it again turns it round', async () => {
    const { user, address } = open()
    await user.click(await screen.findByRole('button', { name: 'Recorded mass, kg' }))
    await waitFor(() => expect(namesShown()).toEqual(['Łucja Żółkowska', 'Mara Ostrow', 'Tomas Brandvold']))
    await user.click(screen.getByRole('button', { name: /Recorded mass, kg/ }))
    await waitFor(() => expect(address()).toBe('/athletes?sort=-mass'))
  })

  test('a filter that nobody fits says so and offers the way back', async () => {
    const { user } = open(`/athletes?squad=${idOf('squad', 1)}&search=tomas`)
    await screen.findByText('No athlete fits')
    await user.click(screen.getByRole('button', { name: 'Show all active athletes' }))
    await screen.findByRole('row', { name: /Tomas Brandvold/ })
  })

  test('a club without athletes is told what to do first', async () => {
    server.use(...inventedClub().handlers)
    renderApp('/athletes', aMe(['coach']))
    expect(await screen.findByText('No athletes yet')).toBeVisible()
  })

  test('a failed reading says so, and can be tried again', async () => {
    const { handlers } = roster()
    server.use(refuse(listAthletes, 'internal', 500), ...handlers)
    const { user } = renderApp('/athletes', aMe(['coach']))
    expect(await screen.findByRole('alert')).toHaveTextContent('Something went wrong on our side')
    server.use(...handlers)
    await user.click(screen.getByRole('button', { name: 'Try again' }))
    await screen.findByRole('row', { name: /Mara Ostrow/ })
  })

  test('while the athletes are on their way the page says so', async () => {
    server.use(neverAnswers(listAthletes), ...roster().handlers)
    renderApp('/athletes', aMe(['coach']))
    const words = await screen.findByText('Loading the athletes…')
    await waitFor(() => expect(words).not.toHaveClass('invisible'))
  })

  test('a physio may look and open, and is offered nothing they may not do', async () => {
    open('/athletes', ['physio'])
    await screen.findByRole('link', { name: 'Mara Ostrow' })
    expect(screen.queryByRole('button', { name: 'Add an athlete' })).not.toBeInTheDocument()
    expect(screen.queryByRole('button', { name: 'Change Mara Ostrow' })).not.toBeInTheDocument()
  })
})

describe('adding an athlete', () => {
  test('puts them on the list at once, with a decimal comma understood', async () => {
    const { user, club } = open()
    await user.click(await screen.findByRole('button', { name: 'Add an athlete' }))
    const dialog = screen.getByRole('dialog', { name: 'Add an athlete' })
    await user.type(within(dialog).getByLabelText('Name'), 'Pia Marchetti')
    await user.type(within(dialog).getByLabelText(/Recorded mass/), '58,7')
    await user.click(within(dialog).getByLabelText('Senior squad'))
    await expectNoAxeFaults()
    await user.click(within(dialog).getByRole('button', { name: 'Add the athlete' }))
    const row = await screen.findByRole('row', { name: /Pia Marchetti/ })
    expect(within(row).getByText('58.7')).toBeVisible()
    expect(screen.queryByRole('dialog')).not.toBeInTheDocument()
    expect(club.athletes.at(-1)).toMatchObject({ recordedMassKg: 58.7, squadIds: [idOf('squad', 1)] })
  })

  test('refuses a mass that no person has, at its field', async () => {
    const { user } = open()
    await user.click(await screen.findByRole('button', { name: 'Add an athlete' }))
    await user.type(screen.getByLabelText('Name'), 'Pia Marchetti')
    await user.type(screen.getByLabelText(/Recorded mass/), '7')
    await user.click(screen.getByRole('button', { name: 'Add the athlete' }))
    expect(await screen.findByText('Give a body mass of 20 to 250 kg')).toBeVisible()
    expect(screen.getByLabelText(/Recorded mass/)).toHaveFocus()
  })

  test('what the server finds wrong with a field stands at that field', async () => {
    const { user } = open()
    server.use(refuse(createAthlete, 'invalid-request', 400, 'No.', { name: 'This name cannot be used' }))
    await user.click(await screen.findByRole('button', { name: 'Add an athlete' }))
    await user.type(screen.getByLabelText('Name'), 'Pia')
    await user.click(screen.getByRole('button', { name: 'Add the athlete' }))
    await waitFor(() =>
      expect(screen.getByLabelText('Name')).toHaveAccessibleDescription('This name cannot be used'),
    )
  })

  test('a second try after a cut line bears the same key, a changed one a new key', async () => {
    const { user, handlers } = open()
    await user.click(await screen.findByRole('button', { name: 'Add an athlete' }))
    await user.type(screen.getByLabelText('Name'), 'Pia')
    const keys: (string | null)[] = []
    server.events.on('request:start', ({ request }) => {
      if (request.method === 'POST') keys.push(request.headers.get('idempotency-key'))
    })
    server.use(cutOff(createAthlete))
    const add = screen.getByRole('button', { name: 'Add the athlete' })
    await user.click(add)
    await screen.findByText('The server cannot be reached')
    await user.click(add)
    await waitFor(() => expect(keys).toHaveLength(2))
    await screen.findByText('The server cannot be reached')
    await user.type(screen.getByLabelText('Name'), ' Marchetti')
    server.use(...handlers)
    await user.click(add)
    await screen.findByRole('row', { name: /Pia Marchetti/ })
    expect(keys[0]).toMatch(/^[0-9a-f]{32}$/)
    expect(keys[1]).toBe(keys[0])
    expect(keys[2]).not.toBe(keys[0])
    server.events.removeAllListeners()
  })

  test('closing with something typed asks first', async () => {
    const { user } = open()
    await user.click(await screen.findByRole('button', { name: 'Add an athlete' }))
    await user.type(screen.getByLabelText('Name'), 'Pia')
    await user.click(screen.getByRole('button', { name: 'Close' }))
    expect(screen.getByRole('alert')).toHaveTextContent('Close and lose what you typed?')
    await user.click(screen.getByRole('button', { name: 'Keep editing' }))
    expect(screen.getByLabelText('Name')).toHaveValue('Pia')
    await user.click(screen.getByRole('button', { name: 'Close' }))
    await user.click(screen.getByRole('button', { name: 'Discard it' }))
    expect(screen.queryByRole('dialog')).not.toBeInTheDocument()
  })
})

describe('changing an athlete', () => {
  test('sends only what changed, over the version that was opened', async () => {
    const { user } = open()
    const bodies: unknown[] = []
    server.use(
      answer(changeAthlete, ({ body }) => {
        bodies.push(body)
        return { ...anAthlete(1, { name: 'Mara Ostrow-Lind', squadIds: [idOf('squad', 1)] }), version: 2 }
      }),
    )
    await user.click(await screen.findByRole('button', { name: 'Change Mara Ostrow' }))
    await user.type(screen.getByLabelText('Name'), '-Lind')
    await user.click(screen.getByRole('button', { name: 'Save' }))
    await screen.findByText('Mara Ostrow-Lind is saved.')
    expect(bodies).toEqual([{ version: 1, name: 'Mara Ostrow-Lind' }])
  })

  test('the profile shows a new name on the list and on itself', async () => {
    const { user, router } = open(`/athletes/${idOf('athlete', 1)}`)
    await pageTitled('Mara Ostrow')
    await user.click(screen.getByRole('button', { name: 'Change' }))
    await user.type(screen.getByLabelText('Name'), '-Lind')
    await user.click(screen.getByRole('button', { name: 'Save' }))
    await pageTitled('Mara Ostrow-Lind')
    await router.navigate('/athletes')
    await screen.findByRole('link', { name: 'Mara Ostrow-Lind' })
  })

  test('what somebody else saved meanwhile is shown, and saving keeps what they changed', async () => {
    const { user, club } = open()
    await user.click(await screen.findByRole('button', { name: 'Change Mara Ostrow' }))
    Object.assign(club.athletes[0]!, { recordedMassKg: 73, version: 2 })
    await user.type(screen.getByLabelText('Name'), '-Lind')
    await user.click(screen.getByRole('button', { name: 'Save' }))
    const notice = await screen.findByText('Recorded mass: was 74.1 kg, is now 73 kg')
    expect(notice).toBeVisible()
    expect(club.athletes[0]).toMatchObject({ name: 'Mara Ostrow', version: 2 })
    await user.click(screen.getByRole('button', { name: 'Save mine over it' }))
    await screen.findByRole('row', { name: /Mara Ostrow-Lind/ })
    expect(club.athletes[0]).toMatchObject({ name: 'Mara Ostrow-Lind', recordedMassKg: 73, version: 3 })
  })

  test('or drops what was typed and takes theirs', async () => {
    const { user, club } = open()
    await user.click(await screen.findByRole('button', { name: 'Change Mara Ostrow' }))
    Object.assign(club.athletes[0]!, { name: 'Mara Vale', version: 2 })
    await user.type(screen.getByLabelText('Name'), '-Lind')
    await user.click(screen.getByRole('button', { name: 'Save' }))
    await user.click(await screen.findByRole('button', { name: 'Drop mine, take theirs' }))
    expect(screen.getByLabelText('Name')).toHaveValue('Mara Vale')
    expect(club.athletes[0]!.version).toBe(2)
  })

  test('archiving takes an athlete off the list and can be undone', async () => {
    const { user, club } = open()
    await user.click(await screen.findByRole('button', { name: 'Archive Tomas Brandvold' }))
    await waitFor(() => expect(screen.queryByRole('row', { name: /Tomas/ })).not.toBeInTheDocument())
    expect(club.athletes[2]!.archived).toBe(true)
    await user.click(screen.getByRole('button', { name: 'Undo' }))
    await screen.findByRole('row', { name: /Tomas/ })
    expect(club.athletes[2]!.archived).toBe(false)
  })
})
