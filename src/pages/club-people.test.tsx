import { screen, waitFor, within } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { listPeople } from '../../shared/contracts/people.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { refuse } from '../../tests/setup/msw/answer.ts'
import { inventedClub } from '../../tests/setup/msw/club.ts'
import { anAthlete, anInvitation, aPerson } from '../../tests/setup/msw/club-rows.ts'
import { idOf } from '../../tests/setup/msw/ids.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { renderApp } from '../../tests/setup/render-app.tsx'

function open(path = '/club/people') {
  const made = inventedClub({
    people: [
      aPerson(1, { name: 'Ines Calloway', email: 'ines@saltmarsh.example', roles: ['admin'] }),
      aPerson(2, { name: 'Bram Oduya', roles: ['coach'] }),
      aPerson(3, { name: 'Quentin Farr', active: false }),
    ],
    invitations: [
      anInvitation(1, { name: 'Sol Abara' }),
      anInvitation(2, { name: 'Tess Wynn', expired: true, expiresAt: '2026-11-02T09:00:00.000Z' }),
    ],
    athletes: [anAthlete(1, { name: 'Mara Ostrow' }), anAthlete(2, { name: 'Lena Vogt', linked: true })],
  })
  server.use(...made.handlers)
  return { ...made, ...renderApp(path, aMe(['admin'])) }
}

describe('people', () => {
  test('lists active people and open invitations, and has no accessibility faults', async () => {
    open()
    const people = await screen.findByRole('table', { name: 'People' })
    expect(within(people).getByRole('row', { name: /Bram Oduya.*Coach/ })).toBeVisible()
    expect(within(people).queryByRole('row', { name: /Quentin/ })).not.toBeInTheDocument()
    const invitations = screen.getByRole('table', { name: 'Open invitations' })
    expect(within(invitations).getByRole('row', { name: /Tess Wynn.*run out/ })).toBeVisible()
    await expectNoAxeFaults()
  })

  test('role, state and search are read from the address', async () => {
    open('/club/people?show=all&role=coach&search=farr')
    expect(await screen.findByRole('row', { name: /Quentin Farr.*deactivated/ })).toBeVisible()
    expect(screen.queryByRole('row', { name: /Bram/ })).not.toBeInTheDocument()
  })

  test('nobody fitting leads back to everybody', async () => {
    const { user } = open('/club/people?search=zzz')
    await user.click(await screen.findByRole('button', { name: 'Show all active people' }))
    await screen.findByRole('row', { name: /Bram Oduya/ })
  })

  test('a failed reading can be tried again', async () => {
    const { handlers } = inventedClub({ people: [aPerson(1, { name: 'Ines Calloway' })] })
    server.use(refuse(listPeople, 'internal', 500), ...handlers)
    const { user } = renderApp('/club/people', aMe(['admin']))
    await screen.findByRole('alert')
    server.use(...handlers)
    await user.click(screen.getByRole('button', { name: 'Try again' }))
    await screen.findByRole('row', { name: /Ines Calloway/ })
  })
})

describe('inviting', () => {
  test('sends an invitation, which then stands among the open ones', async () => {
    const { user, club } = open()
    await user.click(await screen.findByRole('button', { name: 'Invite somebody' }))
    await user.type(screen.getByLabelText('Name'), 'Noor Haddad')
    await user.type(screen.getByLabelText('E-mail address'), 'Noor@Saltmarsh.example')
    await user.click(screen.getByLabelText('Physio'))
    await expectNoAxeFaults()
    await user.click(screen.getByRole('button', { name: 'Send the invitation' }))
    const invitations = await screen.findByRole('table', { name: 'Open invitations' })
    await within(invitations).findByRole('row', { name: /Noor Haddad.*Physio/ })
    expect(club.invitations.at(-1)).toMatchObject({ email: 'noor@saltmarsh.example', athleteId: null })
  })

  test('of an athlete wants the athlete’s record, out of those nobody signs in as', async () => {
    const { user, club } = open()
    await user.click(await screen.findByRole('button', { name: 'Invite somebody' }))
    await user.type(screen.getByLabelText('Name'), 'Mara Ostrow')
    await user.type(screen.getByLabelText('E-mail address'), 'mara@saltmarsh.example')
    await user.click(screen.getByLabelText('Athlete'))
    const record = screen.getByLabelText('Athlete’s record')
    expect(within(record).queryByText('Lena Vogt')).not.toBeInTheDocument()
    await user.click(screen.getByRole('button', { name: 'Send the invitation' }))
    await screen.findByText(/Choose the athlete’s record/)
    await user.selectOptions(record, 'Mara Ostrow')
    await user.click(screen.getByRole('button', { name: 'Send the invitation' }))
    await screen.findByText(/on its way to mara@saltmarsh.example/)
    expect(club.invitations.at(-1)!.athleteId).toBe(idOf('athlete', 1))
  })

  test('an address that the club has already is said at its field', async () => {
    const { user } = open()
    await user.click(await screen.findByRole('button', { name: 'Invite somebody' }))
    await user.type(screen.getByLabelText('Name'), 'Ines Calloway')
    await user.type(screen.getByLabelText('E-mail address'), 'ines@saltmarsh.example')
    await user.click(screen.getByLabelText('Coach'))
    await user.click(screen.getByRole('button', { name: 'Send the invitation' }))
    await screen.findByText(/Somebody of the club has this e-mail address already/)
    expect(screen.getByLabelText('E-mail address')).toHaveFocus()
  })

  test('an empty form lists what is missing', async () => {
    const { user } = open()
    await user.click(await screen.findByRole('button', { name: 'Invite somebody' }))
    await user.click(screen.getByRole('button', { name: 'Send the invitation' }))
    expect(await screen.findByRole('alert')).toHaveTextContent('3 fields need another look')
  })

  test('an invitation that ran out is sent again and works again', async () => {
    const { user } = open()
    await user.click(await screen.findByRole('button', { name: 'Send again to Tess Wynn' }))
    await screen.findByText(/A new link is on its way/)
    expect(screen.queryByText('run out')).not.toBeInTheDocument()
  })

  test('withdrawing asks, says what follows, and takes the invitation off the list', async () => {
    const { user, club } = open()
    await user.click(await screen.findByRole('button', { name: 'Withdraw the invitation of Sol Abara' }))
    const dialog = screen.getByRole('dialog', { name: 'Withdraw the invitation of Sol Abara?' })
    expect(dialog).toHaveTextContent('stops working')
    await user.click(within(dialog).getByRole('button', { name: 'Withdraw the invitation' }))
    await waitFor(() => expect(screen.queryByRole('row', { name: /Sol Abara/ })).not.toBeInTheDocument())
    expect(club.invitations).toHaveLength(1)
  })
})

describe('roles and access', () => {
  test('a changed role shows on the list', async () => {
    const { user } = open()
    await user.click(await screen.findByRole('button', { name: 'Roles of Bram Oduya' }))
    await user.click(screen.getByLabelText('Physio'))
    await user.click(screen.getByRole('button', { name: 'Save' }))
    await screen.findByRole('row', { name: /Bram Oduya.*Coach, Physio/ })
  })

  test('the last admin keeps the role', async () => {
    const { user, club } = open()
    await user.click(await screen.findByRole('button', { name: 'Roles of Ines Calloway' }))
    await user.click(screen.getByLabelText('Coach'))
    await user.click(screen.getByLabelText('Club admin'))
    await user.click(screen.getByRole('button', { name: 'Save' }))
    expect(await screen.findByRole('alert')).toHaveTextContent('The club needs at least one active admin')
    expect(club.people[0]!.roles).toEqual(['admin'])
  })

  test('roles that somebody else changed meanwhile are shown before they are overwritten', async () => {
    const { user, club } = open()
    await user.click(await screen.findByRole('button', { name: 'Roles of Bram Oduya' }))
    Object.assign(club.people[1]!, { roles: ['physio'], version: 2 })
    await user.click(screen.getByLabelText('Club admin'))
    await user.click(screen.getByRole('button', { name: 'Save' }))
    await screen.findByText('Roles: was Coach, is now Physio')
    await user.click(screen.getByRole('button', { name: 'Save mine over it' }))
    await screen.findByRole('row', { name: /Bram Oduya.*Coach, Club admin/ })
  })

  test('deactivating asks, and letting in again brings the person back', async () => {
    const { user, club } = open('/club/people?show=all')
    await user.click(await screen.findByRole('button', { name: 'Deactivate Bram Oduya' }))
    const dialog = screen.getByRole('dialog', { name: 'Deactivate Bram Oduya?' })
    await user.click(within(dialog).getByRole('button', { name: 'Deactivate' }))
    await screen.findByRole('row', { name: /Bram Oduya.*deactivated/ })
    expect(club.people[1]!.active).toBe(false)
    await user.click(screen.getByRole('button', { name: 'Let Bram Oduya in again' }))
    await user.click(screen.getByRole('button', { name: 'Let them in again' }))
    await waitFor(() => expect(club.people[1]!.active).toBe(true))
  })

  test('deactivating oneself says what that means, and leads to the sign-in', async () => {
    const { user, club, address } = open()
    club.people[1]!.roles = ['admin']
    await user.click(await screen.findByRole('button', { name: 'Deactivate Ines Calloway' }))
    const dialog = screen.getByRole('dialog', { name: 'Deactivate yourself?' })
    expect(dialog).toHaveTextContent('only another admin can let you in again')
    await user.click(within(dialog).getByRole('button', { name: 'Deactivate myself' }))
    await waitFor(() => expect(address()).toBe('/sign-in'))
    expect(club.people[0]!.active).toBe(false)
    expect(screen.queryByRole('dialog')).not.toBeInTheDocument()
  })

  test('a refused deactivation says why and changes nothing', async () => {
    const { user } = open()
    await user.click(await screen.findByRole('button', { name: 'Deactivate Ines Calloway' }))
    await user.click(screen.getByRole('button', { name: 'Deactivate myself' }))
    expect(await screen.findByRole('alert')).toHaveTextContent('The club needs at least one active admin')
  })
})
