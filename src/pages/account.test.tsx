import { screen, waitFor } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { changePassword } from '../../shared/contracts/account.ts'
import { expectNoAxeFaults } from '../../tests/setup/axe.ts'
import { answer, refuse } from '../../tests/setup/msw/answer.ts'
import { aMe } from '../../tests/setup/msw/me.ts'
import { server } from '../../tests/setup/msw/server.ts'
import { pageTitled, renderApp } from '../../tests/setup/render-app.tsx'

describe('the account', () => {
  test('shows who one is, with no accessibility faults', async () => {
    renderApp('/account', aMe(['coach', 'admin']))
    await pageTitled('Your account')
    expect(screen.getByText('ines@saltmarsh.example')).toBeVisible()
    expect(screen.getByText('Coach, Club admin')).toBeVisible()
    await expectNoAxeFaults()
  })

  test('changes the password and empties the fields', async () => {
    const bodies: unknown[] = []
    server.use(
      answer(changePassword, ({ body }) => {
        bodies.push(body)
        return null
      }),
    )
    const { user } = renderApp('/account', aMe(['coach']))
    await user.type(await screen.findByLabelText('Present password'), 'the old password')
    await user.type(screen.getByLabelText('New password'), 'a new long password')
    await user.click(screen.getByRole('button', { name: 'Change the password' }))
    await screen.findByText('Your password is changed.')
    expect(bodies).toEqual([{ current: 'the old password', next: 'a new long password' }])
    expect(screen.getByLabelText('Present password')).toHaveValue('')
  })

  test('a wrong present password is said at its field, and no sign-in is asked for', async () => {
    server.use(refuse(changePassword, 'wrong-credentials', 401))
    const { user } = renderApp('/account', aMe(['coach']))
    await user.type(await screen.findByLabelText('Present password'), 'not the password')
    await user.type(screen.getByLabelText('New password'), 'a new long password')
    await user.click(screen.getByRole('button', { name: 'Change the password' }))
    await screen.findByText('This is not your present password')
    expect(screen.getByLabelText('Present password')).toHaveFocus()
    expect(screen.queryByRole('dialog')).not.toBeInTheDocument()
  })

  test('a short new password is refused before it is sent', async () => {
    const { user } = renderApp('/account', aMe(['coach']))
    await user.type(await screen.findByLabelText('Present password'), 'the old password')
    await user.type(screen.getByLabelText('New password'), 'short')
    await user.click(screen.getByRole('button', { name: 'Change the password' }))
    await screen.findByText('Use at least 12 characters')
  })

  test('a theme is shown at once, remembered, and given back to the device', async () => {
    const { user } = renderApp('/account', aMe(['coach']))
    await user.click(await screen.findByRole('radio', { name: 'Dark' }))
    expect(document.documentElement).toHaveAttribute('data-theme', 'dark')
    expect(localStorage.getItem('underfoot-theme')).toBe('dark')
    await user.click(screen.getByRole('radio', { name: 'As the device is set' }))
    await waitFor(() => expect(document.documentElement).not.toHaveAttribute('data-theme'))
    expect(localStorage.getItem('underfoot-theme')).toBeNull()
  })
})
