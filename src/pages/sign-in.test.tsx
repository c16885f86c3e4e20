import { screen } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { signIn } from '../../shared/contracts/account.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { cutOff } from '../../tests/setup/msw/answer.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

async function fillIn(user: ReturnType<typeof renderApp>['user'], email: string, password: string) {
  await user.type(await screen.findByLabelText('E-mail address'), email)
  await user.type(screen.getByLabelText('Password'), password)
  await user.click(screen.getByRole('button', { name: 'Sign in' }))
}

describe('sign-in', () => {
  test('a person who is not signed in is asked to, and then comes to the page they asked for', async () => {
    const { user, address } = renderApp('/no-such-page?x=1', null)
    await pageTitled('Sign in')
    expect(address()).toBe('/sign-in?from=%2Fno-such-page%3Fx%3D1')
    await expectNoAxeFaults()
    await fillIn(user, 'ines@saltmarsh.example', 'a long invented password')
    await pageTitled('There is nothing here')
    expect(address()).toBe('/no-such-page?x=1')
  })

  test('a wrong password is said at the head of the form, the address stays, the password is emptied', async () => {
    const { user } = renderApp('/sign-in', null)
    await fillIn(user, 'ines@saltmarsh.example', 'not the password')
    expect(await screen.findByRole('alert')).toHaveTextContent('E-mail address and password do not match')
    expect(screen.getByLabelText('E-mail address')).toHaveValue('ines@saltmarsh.example')
    expect(screen.getByLabelText('Password')).toHaveValue('')
  })

  test('empty fields are refused before anything is sent, each at its field', async () => {
    const { user } = renderApp('/sign-in', null)
    await user.click(await screen.findByRole('button', { name: 'Sign in' }))
    expect(await screen.findByText('Give an e-mail address')).toBeVisible()
    expect(screen.getByLabelText('E-mail address')).toHaveAccessibleDescription('Give an e-mail address')
    expect(screen.getByLabelText('E-mail address')).toHaveFocus()
    expect(screen.getByLabelText('Password')).toBeInvalid()
  })

  test('an unreachable server is told from a wrong password', async () => {
    const { user } = renderApp('/sign-in', null)
    server.use(cutOff(signIn))
    await fillIn(user, 'ines@saltmarsh.example', 'a long invented password')
    expect(await screen.findByRole('alert')).toHaveTextContent('The server cannot be reached')
  })

  test('the password can be looked at', async () => {
    const { user } = renderApp('/sign-in', null)
    await user.type(await screen.findByLabelText('Password'), 'seen')
    await user.click(screen.getByRole('button', { name: 'Show password' }))
    expect(screen.getByLabelText('Password')).toHaveAttribute('type', 'text')
  })
})
