import { screen } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { acceptInvitation, getInvitation } from '../../shared/contracts/account.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer, refuse } from '../../tests/setup/msw/answer.ts'
import { inventedClub } from '../../tests/setup/msw/club.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

const token = 'an-invented-token-of-some-length'
const invitation = {
  clubName: 'Saltmarsh Athletic Club',
  name: 'Sol Abara',
  email: 'sol@saltmarsh.example',
  roles: ['admin' as const],
  hasAccount: false,
}

describe('an invitation', () => {
  test('is accepted with a name and a password, and leads to the first page of the role', async () => {
    const bodies: unknown[] = []
    server.use(
      ...inventedClub().handlers,
      answer(getInvitation, () => invitation),
      answer(acceptInvitation, ({ body }) => {
        bodies.push(body)
        return aMe(['admin'])
      }),
    )
    const { user } = renderApp(`/invite/${token}`, null)
    await pageTitled('Join Saltmarsh Athletic Club')
    expect(screen.getByText('Saltmarsh Athletic Club invites you as club admin.')).toBeVisible()
    await expectNoAxeFaults()
    await user.clear(screen.getByLabelText('Your name'))
    await user.type(screen.getByLabelText('Your name'), 'Solveig Abara')
    await user.type(screen.getByLabelText('Password'), 'a new long password')
    await user.click(screen.getByRole('button', { name: 'Join Saltmarsh Athletic Club' }))
    await pageTitled('People')
    expect(bodies).toEqual([{ name: 'Solveig Abara', password: 'a new long password' }])
  })

  test('of somebody with an account asks for the password it has', async () => {
    server.use(
      answer(getInvitation, () => ({ ...invitation, hasAccount: true })),
      refuse(acceptInvitation, 'wrong-credentials', 401),
    )
    const { user } = renderApp(`/invite/${token}`, null)
    await user.type(await screen.findByLabelText('Password'), 'not the password')
    expect(screen.queryByLabelText('Your name')).not.toBeInTheDocument()
    await user.click(screen.getByRole('button', { name: /^Join/ }))
    expect(await screen.findByRole('alert')).toHaveTextContent('E-mail address and password do not match')
  })

  test('that no longer works says so', async () => {
    server.use(refuse(getInvitation, 'token-invalid', 410, 'The invitation was withdrawn.'))
    renderApp(`/invite/${token}`, null)
    expect(await screen.findByRole('alert')).toHaveTextContent('This link no longer works')
    expect(screen.queryByRole('button', { name: 'Try again' })).not.toBeInTheDocument()
  })
})
