import { screen } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { checkReset, finishReset, requestReset } from '../../shared/contracts/account.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer, refuse } from '../../tests/setup/msw/answer.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

const token = 'an-invented-token-of-some-length'

describe('a new password', () => {
  test('is asked for from sign-in, and the answer does not say whether the address is known', async () => {
    server.use(answer(requestReset, () => null))
    const { user } = renderApp('/sign-in', null)
    await user.click(await screen.findByRole('link', { name: 'I do not know my password' }))
    await pageTitled('Set a new password')
    await expectNoAxeFaults()
    await user.type(screen.getByLabelText('E-mail address'), 'sol@saltmarsh.example')
    await user.click(screen.getByRole('button', { name: 'Send me a link' }))
    expect(await screen.findByText(/If sol@saltmarsh.example has an account/)).toBeVisible()
  })

  test('too many tries are told to wait', async () => {
    server.use(refuse(requestReset, 'too-many-requests', 429))
    const { user } = renderApp('/reset', null)
    await user.type(await screen.findByLabelText('E-mail address'), 'sol@saltmarsh.example')
    await user.click(screen.getByRole('button', { name: 'Send me a link' }))
    expect(await screen.findByRole('alert')).toHaveTextContent('Too many tries')
  })

  test('is chosen at the link, once', async () => {
    server.use(
      answer(checkReset, () => ({ email: 'sol@saltmarsh.example' })),
      answer(finishReset, () => null),
    )
    const { user } = renderApp(`/reset/${token}`, null)
    expect(await screen.findByLabelText('E-mail address')).toHaveValue('sol@saltmarsh.example')
    await user.type(screen.getByLabelText('New password'), 'a new long password')
    await expectNoAxeFaults()
    await user.click(screen.getByRole('button', { name: 'Set the password' }))
    expect(await screen.findByText(/The new password is set/)).toBeVisible()
    expect(screen.getByRole('link', { name: 'Sign in' })).toHaveAttribute('href', '/sign-in')
  })

  test('at a link that ran out leads to a new one', async () => {
    server.use(refuse(checkReset, 'token-invalid', 410))
    renderApp(`/reset/${token}`, null)
    expect(await screen.findByRole('link', { name: 'Ask for a new link' })).toHaveAttribute('href', '/reset')
  })
})
