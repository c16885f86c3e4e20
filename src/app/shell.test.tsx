import { screen, waitFor, within } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { getMe } from '../../shared/contracts/account.ts'
import { changeAthlete } from '../../shared/contracts/athletes.ts'
import { roles, type Role } from '../../shared/contracts/roles.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { refuse } from '../../tests/setup/msw/answer.ts'
import { inventedClub } from '../../tests/setup/msw/club.ts'
import { anAthlete } from '../../tests/setup/msw/club-rows.ts'
import { aMe, meHandlers } from '../../tests/setup/msw/me.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

const pagesOf: Record<Role, string[]> = {
  coach: ['Sessions', 'Athletes', 'Squads', 'Settings', 'Methods'],
  physio: ['Sessions', 'Athletes', 'Landing watch', 'Settings', 'Methods'],
  admin: ['People', 'Squads', 'Seats', 'Billing', 'Settings', 'Methods'],
  athlete: ['My results', 'Methods'],
}

describe('the shell', () => {
  test.each(roles)('offers a %s the pages of that role', async (role) => {
    renderApp('/account', aMe([role]))
    await pageTitled('Your account')
    const nav = screen.queryByRole('navigation', { name: 'Pages' })
    const links = nav
      ? within(nav)
          .getAllByRole('link')
          .map((link) => link.textContent)
      : []
    expect(links).toEqual(pagesOf[role])
  })

  test('somebody with two roles is offered the pages of both, each once', async () => {
    renderApp('/account', aMe(['coach', 'admin']))
    const nav = await screen.findByRole('navigation', { name: 'Pages' })
    expect(
      within(nav)
        .getAllByRole('link')
        .map((link) => link.textContent),
    ).toEqual(['Sessions', 'Athletes', 'People', 'Squads', 'Seats', 'Billing', 'Settings', 'Methods'])
  })

  test('says that a demo club is invented, and says nothing of the kind of a real one', async () => {
    const demo = renderApp('/account', aMe(['coach']))
    expect(await screen.findByText(/Demo data, invented/)).toBeVisible()
    demo.unmount()
    const { club } = aMe(['coach'])
    renderApp('/account', aMe(['coach'], { club: { ...club, demo: false } }))
    await pageTitled('Your account')
    expect(screen.queryByText(/Demo data/)).not.toBeInTheDocument()
  })

  test('a page of another role is not opened, and says why', async () => {
    renderApp('/club/people', aMe(['coach']))
    await pageTitled('Your role does not allow this')
    await expectNoAxeFaults()
  })

  test('an address that leads nowhere says so and leads back', async () => {
    server.use(...inventedClub().handlers)
    const { user } = renderApp('/nowhere', aMe(['admin']))
    await pageTitled('There is nothing here')
    await user.click(screen.getByRole('link', { name: 'Go to the start page' }))
    await pageTitled('People')
  })

  test('a failure at the start can be tried again', async () => {
    const { user } = renderApp('/account', aMe(['coach']))
    server.use(refuse(getMe, 'internal', 500))
    expect(await screen.findByRole('alert')).toHaveTextContent('Something went wrong on our side')
    server.use(...meHandlers(aMe(['coach'])).handlers)
    await user.click(screen.getByRole('button', { name: 'Try again' }))
    await pageTitled('Your account')
  })

  test('after a change of page the focus is on the new page', async () => {
    server.use(...inventedClub().handlers)
    const { user } = renderApp('/account', aMe(['admin']))
    await user.click(await screen.findByRole('link', { name: 'Seats' }))
    await pageTitled('Seats')
    expect(screen.getByRole('main')).toHaveFocus()
  })

  test('signing out leads to sign-in and forgets what was read', async () => {
    const { user, session, address } = renderApp('/account', aMe(['coach']))
    await user.click(await screen.findByRole('button', { name: 'Sign out' }))
    await pageTitled('Sign in')
    expect(session.me).toBeNull()
    expect(address()).toBe('/sign-in')
  })
})

describe('a sign-in that ends under a page', () => {
  async function openUnderway() {
    const made = inventedClub({ athletes: [anAthlete(1, { name: 'Mara Ostrow' })] })
    server.use(...made.handlers)
    const app = renderApp('/athletes', aMe(['coach']))
    await app.user.click(await screen.findByRole('button', { name: 'Change Mara Ostrow' }))
    await app.user.type(screen.getByLabelText('Name'), '-Lind')
    return { ...app, ...made }
  }

  test('asks to sign in over the page, and what was typed is still there', async () => {
    const { user, handlers } = await openUnderway()
    server.use(refuse(changeAthlete, 'not-signed-in', 401))
    await user.click(screen.getByRole('button', { name: 'Save' }))
    const dialog = await screen.findByRole('dialog', { name: 'Your sign-in has ended' })
    expect(await within(dialog).findByLabelText('E-mail address')).toHaveValue('ines@saltmarsh.example')
    server.use(...handlers)
    await user.type(within(dialog).getByLabelText('Password'), 'a long invented password')
    await user.click(within(dialog).getByRole('button', { name: 'Sign in' }))
    await waitFor(() => expect(dialog).not.toBeInTheDocument())
    expect(screen.getByLabelText('Name')).toHaveValue('Mara Ostrow-Lind')
    await user.click(screen.getByRole('button', { name: 'Save' }))
    await screen.findByRole('row', { name: /Mara Ostrow-Lind/ })
  })
})
